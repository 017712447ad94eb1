import { formatInstant, type Instant, type RecordEntryRequest } from '@stubpost/shared';

type Content<Request> = Request extends RecordEntryRequest
  ? Omit<Request, 'id' | 'observedAt' | 'source' | 'saidBy' | 'clockOffsetMilliseconds'>
  : never;

/** What is to be recorded, before it has an id and a time. */
export type EntryDraft = Content<RecordEntryRequest>;

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
  return {
    ...draft,
    id,
    observedAt: formatInstant(earlier ?? now),
    source: earlier === null ? 'by-hand' : 'entered-later',
    // Zero minus, so that a clock without a fault gives 0 and not -0, which JSON and the log would tell apart.
    clockOffsetMilliseconds: 0 - Math.round(serverAheadMilliseconds),
  };
}
