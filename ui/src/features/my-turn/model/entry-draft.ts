import { formatInstant, type Instant, type RecordEntryRequest } from '@stubpost/shared';

type Content<Request> = Request extends { kind: 'corrected' }
  ? never
  : Request extends RecordEntryRequest
    ? Omit<Request, 'id' | 'observedAt' | 'source' | 'saidBy' | 'clockOffsetMilliseconds'>
    : never;

type CorrectedRequest = Extract<RecordEntryRequest, { kind: 'corrected' }>;

/** A correction before it is made. The time that is to stand instead is its content, not the time of the touch. */
export interface CorrectionDraft extends Pick<CorrectedRequest, 'kind' | 'target' | 'reason'> {
  /** The time that is to stand; absent where only the reading is corrected. */
  shouldBeAt?: Instant;
  reading?: NonNullable<CorrectedRequest['reading']>;
}

/** What is to be recorded, before it has an id and a time. */
export type EntryDraft = Content<RecordEntryRequest> | CorrectionDraft;

/** How a draft becomes an entry of this phone. */
export interface Recording {
  id: string;
  /** The moment of the touch, by the server's clock as well as the phone knows it. */
  now: Instant;
  /** When it happened, if that was before the touch and the person said when. */
  earlier: Instant | null;
  /** Milliseconds by which the server's clock is ahead of the phone's. */
  serverAheadMilliseconds: number;
}

/** The entry: made by hand at the touch, or entered later with the time the person gave. Never with a planned time. */
export function requestOf(
  draft: EntryDraft,
  { id, now, earlier, serverAheadMilliseconds }: Recording,
): RecordEntryRequest {
  const base = {
    id,
    source: earlier === null ? ('by-hand' as const) : ('entered-later' as const),
    // Zero minus, so that a clock without a fault gives 0 and not -0, which JSON and the log would tell apart.
    clockOffsetMilliseconds: 0 - Math.round(serverAheadMilliseconds),
  };
  if (draft.kind === 'corrected') {
    const { shouldBeAt, ...content } = draft;
    const time = shouldBeAt === undefined ? {} : { observedAt: formatInstant(shouldBeAt) };
    return { ...content, ...base, ...time, madeAt: formatInstant(now) };
  }
  return { ...draft, ...base, observedAt: formatInstant(earlier ?? now) };
}
