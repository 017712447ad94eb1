import type { Instant } from '@stubpost/shared';
import type { StepNow, TurnNow } from '../../../lib/turn/turn-now';
import { departureOf, type Stretch } from '../../../lib/turn/turn-times';

/** A step still to do, where it lies in its row. */
export interface SqueezeStep {
  step: StepNow;
  stretch: Stretch;
}

/**
 * The squeeze of a turn: the work that starts with the arrival, the work that is pinned to the departure, and the time
 * between, as the timetable has them and as they stand now.
 */
export interface Squeeze {
  arrivesAt: Instant;
  leavesAt: Instant;
  scheduled: { after: Stretch; before: Stretch };
  /** Work after the arrival that is recorded: from the arrival to the last record; null before the arrival. */
  done: Stretch | null;
  /** From the last record to now, while something is still open: nobody said what was done. */
  unrecorded: Stretch | null;
  after: SqueezeStep[];
  before: SqueezeStep[];
  /** End of the work after the arrival less begin of the work before the departure: negative when they overlap. */
  spareSeconds: number;
  /** The minutes that both kinds of work claim. */
  overlap: Stretch | null;
}

const holds = (step: StepNow): boolean => step.holdsDeparture && step.state !== 'not-needed';
const seconds = (milliseconds: number): number => Math.floor(milliseconds / 1000);

/** The squeeze at `now`; null where there is none: no arrival, no departure, gone or annulled, or no forecast yet. */
export function squeezeOf(turn: TurnNow, typicalOf: (key: string) => number, now: Instant): Squeeze | null {
  const leavesAt = departureOf(turn);
  const { scheduledArrivalAt, scheduledDepartureAt } = turn;
  if (leavesAt === null || scheduledArrivalAt === null || scheduledDepartureAt === null) return null;
  if (turn.departedAt !== null || turn.annulled !== null) return null;
  const inward = turn.steps.filter((step) => holds(step) && step.anchor === 'arrival');
  const outward = turn.steps.filter((step) => holds(step) && step.anchor === 'departure');
  if (inward.length === 0 || outward.length === 0) return null;
  const length = (step: StepNow): number => typicalOf(step.key) * 1000;
  const total = (steps: readonly StepNow[]): number => steps.reduce((sum, step) => sum + length(step), 0);

  const after = inward.flatMap((step) => openStretch(step, now));
  const before = pinned(
    outward.filter((step) => step.doneAt === null),
    length,
  );
  const recorded = inward.flatMap((step) => (step.doneAt === null ? [] : [step.doneAt]));
  const lastRecord = recorded.length === 0 ? turn.arrivedAt : Math.max(...recorded);
  const workEnds = after.at(-1)?.stretch.to ?? lastRecord ?? now;
  const workBegins = before[0]?.stretch.from ?? leavesAt;
  const spare = workBegins - Math.max(workEnds, before.length > 0 ? now : workEnds);
  return {
    arrivesAt: turn.arrivedAt ?? Math.max(scheduledArrivalAt, turn.expectedArrivalAt ?? 0),
    leavesAt,
    scheduled: {
      after: { from: scheduledArrivalAt, to: scheduledArrivalAt + total(inward) },
      before: { from: scheduledDepartureAt - total(outward), to: scheduledDepartureAt },
    },
    done: turn.arrivedAt === null || lastRecord === null ? null : { from: turn.arrivedAt, to: lastRecord },
    unrecorded:
      turn.arrivedAt !== null && lastRecord !== null && after.length > 0 && lastRecord < now
        ? { from: lastRecord, to: now }
        : null,
    after,
    before,
    spareSeconds: seconds(spare),
    overlap: spare < 0 ? { from: workBegins, to: Math.max(workEnds, now) } : null,
  };
}

function openStretch(step: StepNow, now: Instant): SqueezeStep[] {
  if (step.doneAt !== null || step.finishAt === null) return [];
  const from = Math.max(now, step.startAt ?? now);
  return [{ step, stretch: { from, to: Math.max(from, step.finishAt) } }];
}

/** Steps pinned to the departure: each ends at its latest finish. */
function pinned(steps: readonly StepNow[], length: (step: StepNow) => number): SqueezeStep[] {
  return steps
    .flatMap((step) => {
      if (step.latestFinishAt === null) return [];
      return [{ step, stretch: { from: step.latestFinishAt - length(step), to: step.latestFinishAt } }];
    })
    .sort((a, b) => a.stretch.from - b.stretch.from);
}

/** One sentence under the heading: "3 min more work than there is time", "8 min to spare". */
export function squeezeWords(spareSeconds: number): string {
  const minutes = Math.floor(spareSeconds / 60);
  return minutes < 0 ? `${-minutes} min more work than there is time` : `${minutes} min to spare`;
}
