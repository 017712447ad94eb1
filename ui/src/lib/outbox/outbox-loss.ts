import { formatInstant, type Instant, type RecordEntryRequest } from '@stubpost/shared';
import { v5 as idFrom } from 'uuid';
import { entryFor } from './outbox-entry';
import type { OutboxStore } from './outbox-store';
import { missingFrom, type TallyBook, type TalliedEntry } from './outbox-tally';

/** What finding a loss needs from outside. */
export interface LossOutside {
  store: OutboxStore;
  tally: TallyBook;
  now: () => Instant;
  deviceNow: () => Instant;
  /** Ids of the entries the service has of a turn; null when it cannot be asked now. */
  entryIdsOf: (turnId: string) => Promise<ReadonlySet<string> | null>;
}

/** Namespace of the ids of notes about losses: our own, made once. */
const noteNamespace = '2f9d6c1e-54b3-4f0a-9c57-1d0e8a6b7f43';

/**
 * Compares the outbox with the count kept apart. What the service has after all is only closed in the count; what is
 * nowhere is lost: the person is told, and the desk by a note on the turn of the last of them. Without an answer of the
 * service nothing is claimed; the comparison comes back with the next start. Answers whether anything changed.
 */
export async function findLost(outside: LossOutside, personId: string): Promise<boolean> {
  const { store, tally } = outside;
  const kept = await store.load(personId).catch(() => null);
  if (kept === null) return false;
  tally.closed(
    personId,
    kept.sent.map(({ id }) => id),
  );
  tally.opened(personId, kept.waiting);
  const missing = missingFrom(tally.read(personId), kept);
  if (missing.length === 0) return false;

  const lost: TalliedEntry[] = [];
  for (const entry of missing) {
    const atService = await outside.entryIdsOf(entry.turn);
    if (atService === null) return false;
    if (atService.has(entry.id)) tally.closed(personId, [entry.id]);
    else lost.push(entry);
  }
  const last = lost.at(-1);
  if (last === undefined) return true;
  await store.add(noteOf(outside, personId, { lost, last })).then(
    (note) => tally.opened(personId, [note]),
    () => undefined,
  );
  tally.missed(
    personId,
    lost.map(({ id }) => id),
    outside.now(),
  );
  return true;
}

/** The note for the desk. Its id follows from the entries it is about, so that two pages make one note. */
function noteOf(
  { now, deviceNow }: LossOutside,
  personId: string,
  { lost, last }: { lost: readonly TalliedEntry[]; last: TalliedEntry },
) {
  const [at, deviceTime] = [now(), deviceNow()];
  const clockOffset = Math.round(deviceTime - at);
  const payload: RecordEntryRequest = {
    id: idFrom(lost.map(({ id }) => id).join(' '), noteNamespace),
    kind: 'note',
    note: lossWords(lost),
    observedAt: formatInstant(at),
    source: 'by-hand',
    clockOffsetMilliseconds: clockOffset,
  };
  return entryFor({
    personId,
    turn: last.turn,
    about: last.about,
    label: 'Note to the desk: entries lost',
    payload,
    deviceTime,
    clockOffset,
    clockBasis: 'compared',
    tzOffset: new Date(deviceTime).getTimezoneOffset(),
  });
}

/** Longest list in a note; more are counted. */
const namedInNote = 6;

function lossWords(lost: readonly TalliedEntry[]): string {
  const named = lost.slice(0, namedInNote).map(({ label, observedAt }) => `${label}, ${observedAt}`);
  const rest = lost.length - named.length;
  const count = lost.length === 1 ? '1 entry was' : `${lost.length} entries were`;
  return `${count} lost on a phone before being sent: ${named.join('; ')}${rest > 0 ? `; and ${rest} more` : ''}. Ask who made them.`;
}
