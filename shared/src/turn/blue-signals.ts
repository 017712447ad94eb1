import type { Instant } from '../lib/instant';
import type { Entry } from './entry';
import { compareEntries } from './standing-entries';

/** One blue signal: who put it up, from when to when; null while it stands. */
export interface BlueSignal {
  entryId: string;
  from: Instant;
  until: Instant | null;
  personId: string | null;
  by: string;
}

/**
 * The blue signals of a turn in the order in which they were put up. Each person has one of their own; taking one
 * down ends the writer's own, else the one that has stood longest. Up and down at the same time leaves it up.
 * Workers are protected as long as any stands.
 */
export function followBlueSignals(entries: readonly Entry[]): BlueSignal[] {
  const signals: BlueSignal[] = [];
  const standing = (): BlueSignal[] => signals.filter((signal) => signal.until === null);
  for (const entry of [...entries].sort(downBeforeUp)) {
    const personId = entry.by?.personId ?? null;
    const own = standing().find((signal) => signal.personId === personId);
    if (entry.kind === 'blue-signal-up' && own === undefined) {
      const by = entry.saidBy ?? entry.by?.name ?? 'feed';
      signals.push({ entryId: entry.id, from: entry.observedAt, until: null, personId, by });
    }
    if (entry.kind !== 'blue-signal-down') continue;
    const ended = own ?? standing()[0];
    if (ended !== undefined) ended.until = entry.observedAt;
  }
  return signals;
}

function downBeforeUp(a: Entry, b: Entry): number {
  const isUp = (entry: Entry): number => Number(entry.kind === 'blue-signal-up');
  return a.observedAt - b.observedAt || isUp(a) - isUp(b) || compareEntries(a, b);
}

/** Whether any signal stood at an instant; one that is put up or taken down at that very instant counts. */
export function blueSignalAt(signals: readonly BlueSignal[], instant: Instant): BlueSignal | null {
  return (
    signals.find((signal) => signal.from <= instant && (signal.until === null || signal.until >= instant)) ??
    null
  );
}
