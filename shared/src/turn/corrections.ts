import type { Instant } from '../lib/instant';
import type { Approvals, Decision, RecordChange } from './approvals';
import type { Entry, EntryAuthor, Reading } from './entry';
import { compareEntries, correct, correctionsByTarget, ofKind, type EntryOf } from './standing-entries';
import { rootOf } from './withdrawals';

/** A change of the record that needs somebody else's yes: *waiting*, *approved* or *declined*. */
export const CORRECTION_STATES = ['waiting', 'approved', 'declined'] as const;
export type CorrectionState = (typeof CORRECTION_STATES)[number];

/** A correction or withdrawal asked for after the departure, old and new side by side. */
export interface RecordCorrection {
  entryId: string;
  target: string;
  kind: 'corrected' | 'withdrawn';
  /** Key of the step that the target tells of, else the kind of the target. */
  what: string;
  /** What the target says without this change and with those that took effect before it. */
  oldAt: Instant;
  oldReading: Reading | null;
  /** What it is to say; null where this change leaves it, and for a withdrawal. */
  newAt: Instant | null;
  newReading: Reading | null;
  by: EntryAuthor | null;
  reason: string;
  askedAt: Instant;
  state: CorrectionState;
  decision: Decision | null;
}

/**
 * The changes of the record that need an approval, in the order in which they were asked for. Those that name no
 * entry of this turn are left out; they are a finding.
 */
export function correctionsIn(kept: readonly Entry[], approvals: Approvals): RecordCorrection[] {
  if (approvals.needed.size === 0) return [];
  const byId = new Map(kept.map((entry) => [entry.id, entry]));
  const corrections = ofKind(kept, 'corrected');
  const targets = new Map(corrections.map((each) => [each.id, each.target]));
  const effective = correctionsByTarget(corrections.filter((each) => !approvals.idle.has(each.id)));
  return [...corrections, ...ofKind(kept, 'withdrawn')]
    .filter((change) => approvals.needed.has(change.id))
    .sort(compareEntries)
    .flatMap((change) => {
      const target = byId.get(rootOf(change.target, targets));
      if (target === undefined) return [];
      const before = (effective.get(target.id) ?? []).filter((each) => compareEntries(each, change) < 0);
      return [correctionOf(change, correct(target, before), approvals.decisions.get(change.id) ?? null)];
    });
}

function correctionOf(change: RecordChange, old: Entry, decision: Decision | null): RecordCorrection {
  return {
    entryId: change.id,
    target: change.target,
    kind: change.kind,
    what: old.kind === 'step-done' ? old.step : old.kind,
    oldAt: old.observedAt,
    oldReading: old.kind === 'step-done' ? (old.reading ?? null) : null,
    ...newOf(change),
    by: change.by,
    reason: change.reason,
    askedAt: change.observedAt,
    state: stateOf(decision),
    decision,
  };
}

function newOf(change: EntryOf<'corrected'> | EntryOf<'withdrawn'>) {
  if (change.kind === 'withdrawn') return { newAt: null, newReading: null };
  return { newAt: change.correctedObservedAt ?? null, newReading: change.reading ?? null };
}

function stateOf(decision: Decision | null): CorrectionState {
  if (decision === null) return 'waiting';
  return decision.isApproved ? 'approved' : 'declined';
}
