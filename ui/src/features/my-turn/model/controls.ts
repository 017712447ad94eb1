import {
  barredAtTheControls,
  parseInstant,
  rolesOf,
  type Instant,
  type PlanStep,
  type WireStep,
  type WireTurn,
} from '@stubpost/shared';
import type { NextAct } from './next-act';

/**
 * Why the engineer's own phone records nothing: the act is one that is never taken from it, or the engineer is at
 * the controls since `since` (whose record said so: `by`). While at the controls the page shows no facts to read on.
 */
export type ControlsBar = { kind: 'own-act' } | { kind: 'at-controls'; since: Instant; by: string | null };

/** What decides whether a phone is an engineer's at the controls. */
export interface ControlsQuestion {
  turn: WireTurn;
  steps: readonly PlanStep[];
  personId: string;
  act: NextAct;
  now: Instant;
  /** The next recorded arrival of a train with this person as its engineer; null when there is none yet. */
  nextArrivalAt: Instant | null;
}

/** Whether this phone must record nothing now; null when it may. The rule itself is `barredAtTheControls`. */
export function controlsBar({
  turn,
  steps,
  personId,
  act,
  now,
  nextArrivalAt,
}: ControlsQuestion): ControlsBar | null {
  const isEngineerOfTurn = turn.crew.some(
    (member) => member.as === 'engineer' && member.personId === personId,
  );
  const manned = mannedStep(turn, steps);
  const from = manned === null || manned.doneAt === null ? null : parseInstant(manned.doneAt);
  const question = { isEngineerOfTurn, source: 'by-hand', observedAt: now, receivedAt: now } as const;
  const atControls = from === null ? null : { from, until: nextArrivalAt };
  if (from !== null && barredAtTheControls({ ...question, atControls })) {
    return { kind: 'at-controls', since: from, by: manned?.by ?? null };
  }
  const step = act.kind === 'step' ? act.step.key : undefined;
  return barredAtTheControls({ ...question, step, atControls: null }) ? { kind: 'own-act' } : null;
}

/** The step that brought the engineer into the leaving cab, when it is recorded. */
function mannedStep(turn: WireTurn, steps: readonly PlanStep[]): WireStep | null {
  const keys = rolesOf(steps).manCab.map((step) => step.key);
  return turn.steps.find((step) => keys.includes(step.key) && step.doneAt !== null) ?? null;
}

/** The first arrival after `since` among turns that a person has as engineer. */
export function nextArrivalAsEngineer(
  turns: readonly WireTurn[],
  personId: string,
  since: WireTurn,
): Instant | null {
  const left = parseInstant(since.outbound?.scheduledDepartureAt ?? since.computedAt) ?? 0;
  const arrivals = turns
    .filter(
      (turn) =>
        turn.id !== since.id &&
        turn.crew.some((member) => member.as === 'engineer' && member.personId === personId),
    )
    .map((turn) => parseInstant(turn.inbound?.actualArrivalAt ?? ''))
    .filter((at): at is Instant => at !== null && at > left);
  return arrivals.length === 0 ? null : Math.min(...arrivals);
}
