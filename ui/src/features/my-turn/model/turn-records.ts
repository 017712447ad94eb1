import type { EntrySource, WireEntry, WireReading, WireStep, WireTurn } from '@stubpost/shared';
import { hasLeft } from './next-act';

/** One thing that is recorded about a turn: a step, the arrival or the departure, by the entry that counts. */
export interface TurnRecord {
  /** Key of the step, or the word `arrival` or `departure`. */
  key: string;
  entryId: string;
  label: string;
  at: string;
  source: EntrySource;
  /** Who wrote it; null for a feed, and while the entries are on their way. */
  by: { id: string; name: string } | null;
  saidBy: string | null;
  reading: WireReading | null;
}

/** Everything recorded about a turn, in the order of time. */
export function recordsOf(turn: WireTurn, entries: readonly WireEntry[]): TurnRecord[] {
  const steps = turn.steps.flatMap((step) => stepRecord(step, entries));
  const arrival = movementRecord('arrival', turn.inbound?.actualArrivalAt ?? null, entries);
  const departure = movementRecord('departure', turn.outbound?.actualDepartureAt ?? null, entries);
  return [...arrival, ...steps, ...departure].sort((a, b) => Date.parse(a.at) - Date.parse(b.at));
}

/** What is recorded under one key; null when nothing is. */
export function recordOf(turn: WireTurn, entries: readonly WireEntry[], key: string): TurnRecord | null {
  return recordsOf(turn, entries).find((record) => record.key === key) ?? null;
}

function stepRecord(step: WireStep, entries: readonly WireEntry[]): TurnRecord[] {
  const { doneAt, source, entryId } = step;
  if (doneAt === null || source === null || entryId === null) return [];
  const by = entries.find(({ id }) => id === entryId)?.by ?? null;
  const { key, shortLabel: label, saidBy, reading } = step;
  return [{ key, entryId, label, at: doneAt, source, by, saidBy, reading }];
}

/** The name of a step, the arrival or the departure by its key. */
export function labelOf(turn: WireTurn, key: string): string {
  if (key === 'arrival' || key === 'departure') return movementLabels[key];
  return turn.steps.find((step) => step.key === key)?.shortLabel ?? key;
}

const movementLabels = { arrival: 'Stopped at marker', departure: 'Departed' } as const;

/** The movement's entry is the standing one of its time; a corrected time is looked for under the entry it corrects. */
function movementRecord(
  key: 'arrival' | 'departure',
  at: string | null,
  entries: readonly WireEntry[],
): TurnRecord[] {
  if (at === null) return [];
  const gone = new Set(entries.filter(({ kind }) => kind === 'withdrawn').map(({ target }) => target));
  const standing = entries.filter((entry) => entry.kind === key && !gone.has(entry.id));
  const isCorrectedTo = (entry: WireEntry): boolean =>
    entries.some(
      ({ kind, target, observedAt }) =>
        kind === 'corrected' && target === entry.id && sameTime(observedAt, at),
    );
  const entry = standing.find((each) => sameTime(each.observedAt, at)) ?? standing.find(isCorrectedTo);
  if (entry === undefined) return [];
  const { id, source, by, saidBy } = entry;
  return [
    { key, entryId: id, label: movementLabels[key], at, source, by, saidBy: saidBy ?? null, reading: null },
  ];
}

const sameTime = (a: string | undefined, b: string): boolean =>
  a !== undefined && Date.parse(a) === Date.parse(b);

/**
 * What its writer may do with a record: take it back until the train has left, ask for a correction afterwards; null
 * for a record of somebody else. The departure itself can always be taken back: without it there is no "after".
 */
export function wayBack(record: TurnRecord, turn: WireTurn, personId: string): 'withdraw' | 'ask' | null {
  if (record.by?.id !== personId) return null;
  return hasLeft(turn) && record.key !== 'departure' ? 'ask' : 'withdraw';
}
