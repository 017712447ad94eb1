import type { Instant } from '../lib/instant';
import type { DefectCause, Entry, LeftHandbrakes, TieUpCheck } from './entry';
import { compareEntries, latestObserved, ofKind } from './standing-entries';

/** A bad-order report. */
export interface DefectReport {
  entryId: string;
  at: Instant;
  by: string | null;
  /** Number of the car; null when it is the set as a whole, or the car is not known. */
  car: string | null;
  cause: DefectCause;
  note: string | null;
}

/** How a set was left at the end of its day, by the latest record of it. */
export interface TieUp {
  entryId: string;
  at: Instant;
  by: string | null;
  handbrakes: LeftHandbrakes;
  checks: readonly TieUpCheck[];
  offAir: boolean;
  reason: string | null;
}

const writerOf = (entry: Entry): string | null => entry.saidBy ?? entry.by?.name ?? null;

/** The bad-order reports that stand, in the order of their times. */
export function defectsIn(standing: readonly Entry[]): DefectReport[] {
  return ofKind(standing, 'defect')
    .sort(compareEntries)
    .map((entry) => ({
      entryId: entry.id,
      at: entry.observedAt,
      by: writerOf(entry),
      car: entry.car,
      cause: entry.cause,
      note: entry.note ?? null,
    }));
}

/** How the set was left, by the latest record that stands; null when it was not tied up. */
export function tieUpIn(standing: readonly Entry[]): TieUp | null {
  const entry = latestObserved(ofKind(standing, 'tied-up'));
  if (entry === null) return null;
  return {
    entryId: entry.id,
    at: entry.observedAt,
    by: writerOf(entry),
    handbrakes: entry.handbrakes,
    checks: entry.checks,
    offAir: entry.offAir ?? false,
    reason: entry.reason ?? null,
  };
}
