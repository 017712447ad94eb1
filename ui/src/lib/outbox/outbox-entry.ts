import { formatInstant, type EntrySource, type Instant, type RecordEntryRequest } from '@stubpost/shared';

/** What the phone's clock was worth at a touch: compared with the server's since the app was opened, or by an earlier comparison. */
export type ClockBasis = 'compared' | 'remembered';

/** A no of the service that no later try would change. */
export interface Refusal {
  code: string;
  message: string;
}

/** One entry made on this phone that has no receipt yet. Its id never changes, so that a retry is not a second record. */
export interface OutboxEntry {
  id: string;
  /** Who made it. Nobody else's sign-in ever sends it. */
  personId: string;
  turn: string;
  step: string | null;
  kind: RecordEntryRequest['kind'];
  /** The touch by the phone's own clock. */
  deviceTime: Instant;
  /** Milliseconds by which the phone's clock was ahead of the server's, as far as known at the touch. */
  clockOffset: number;
  clockBasis: ClockBasis;
  /** Minutes to add to the phone's wall clock to get UTC. */
  tzOffset: number;
  source: EntrySource;
  /** Place among the entries of this phone. */
  seq: number;
  /** What is sent, byte for byte the same with every try. */
  payload: RecordEntryRequest;
  tries: number;
  /** What was recorded, in the words of the bar. */
  label: string;
  /** The train it is about, as far as it was known. */
  about: string;
  /** Set when the service said no for good; the entry stays until the person has read why. */
  refusal: Refusal | null;
}

/** An entry that has left the outbox: with its receipt, or refused and read. */
export interface SentEntry {
  id: string;
  personId: string;
  turn: string;
  label: string;
  about: string;
  source: EntrySource;
  observedAt: string;
  /** By the server's clock, as well as the phone knows it. */
  leftAt: Instant;
  /** Number in the log; null for an entry that was refused. */
  sequence: number | null;
  refusal: Refusal | null;
}

/** What the recorder knows of a touch. */
export interface NewEntry {
  personId: string;
  turn: string;
  label: string;
  about: string;
  payload: RecordEntryRequest;
  deviceTime: Instant;
  clockOffset: number;
  clockBasis: ClockBasis;
  tzOffset: number;
}

/** The entry of a touch, before the store gives it its place. */
export function entryFor(touch: NewEntry): OutboxEntry {
  const { payload } = touch;
  return {
    ...touch,
    id: payload.id,
    kind: payload.kind,
    step: 'step' in payload ? payload.step : null,
    source: payload.source,
    seq: 0,
    tries: 0,
    refusal: null,
  };
}

/** Entries in the order in which they were made. */
export function inOrder(entries: readonly OutboxEntry[]): OutboxEntry[] {
  return [...entries].sort(
    (a, b) => a.seq - b.seq || a.deviceTime - b.deviceTime || a.id.localeCompare(b.id),
  );
}

/** Entries that still have to be sent, in lanes of one turn each: inside a lane order counts, between lanes it does not. */
export function lanesOf(entries: readonly OutboxEntry[]): Map<string, OutboxEntry[]> {
  const lanes = new Map<string, OutboxEntry[]>();
  for (const entry of inOrder(entries)) {
    if (entry.refusal !== null) continue;
    lanes.set(entry.turn, [...(lanes.get(entry.turn) ?? []), entry]);
  }
  return lanes;
}

/** By how much two measurements of a clock may differ and still mean the same: answers tell the time to about a second. */
const sameClockMilliseconds = 1000;

/**
 * The entry with its time set right by a comparison of clocks made after the touch. Only entries whose offset was merely
 * remembered, that were never tried, and whose time is the touch itself: a time the person gave stays as given.
 */
export function withComparedClock(entry: OutboxEntry, clockOffset: number): OutboxEntry {
  if (entry.clockBasis === 'compared' || entry.tries > 0) return entry;
  if (Math.abs(entry.clockOffset - clockOffset) <= sameClockMilliseconds) {
    return { ...entry, clockBasis: 'compared' };
  }
  const payload = { ...entry.payload, clockOffsetMilliseconds: clockOffset };
  const touchedAt = formatInstant(entry.deviceTime - clockOffset);
  if (payload.kind === 'corrected') payload.madeAt = touchedAt;
  else if (payload.source === 'by-hand') payload.observedAt = touchedAt;
  return { ...entry, clockOffset, clockBasis: 'compared', payload };
}

/** When an entry happened, by its own account; for a correction, when it was made. */
export function saidAt({
  payload,
  deviceTime,
  clockOffset,
}: Pick<OutboxEntry, 'payload' | 'deviceTime' | 'clockOffset'>): string {
  const told = payload.kind === 'corrected' ? payload.madeAt : payload.observedAt;
  return told ?? formatInstant(deviceTime - clockOffset);
}

/** What is left of an entry once it has gone. */
export function sentFrom(
  entry: OutboxEntry,
  left: { at: Instant; sequence: number | null; refusal: Refusal | null },
): SentEntry {
  return {
    id: entry.id,
    personId: entry.personId,
    turn: entry.turn,
    label: entry.label,
    about: entry.about,
    source: entry.source,
    observedAt: saidAt(entry),
    leftAt: left.at,
    sequence: left.sequence,
    refusal: left.refusal,
  };
}

/** Longest wait between two tries, in seconds: a phone that comes out of a tunnel sends within a quarter of a minute. Our choice. */
export const longestWaitSeconds = 15;

/** Seconds until the next try after so many failed rounds: 1, 2, 4, 8, then 15. */
export function waitSeconds(failures: number): number {
  return Math.min(2 ** Math.max(0, failures - 1), longestWaitSeconds);
}
