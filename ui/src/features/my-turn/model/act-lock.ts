import { isInCab, parseInstant, type Instant, type PlanStep, type WireTurn } from '@stubpost/shared';
import { hasLeft, missingBefore, type NextAct } from './next-act';
import { leavesAt } from './turn-times';

/** Why the order is off: the bar is shut, says so, and asks once more. Nothing that has happened is refused. */
export type ActLock =
  | { kind: 'blue-signal'; since: string; by: string }
  | { kind: 'missing'; labels: string[] }
  | { kind: 'too-early'; notBefore: Instant }
  /** The railroad asks for the safety briefing before anything is recorded from the controlling cab. */
  | { kind: 'briefing' };

/** What an act is held against: `steps` are those of the turn; `asksBriefing` says that this person still owes the briefing. */
export interface LockQuestion {
  turn: WireTurn;
  steps: readonly PlanStep[];
  act: NextAct;
  now: Instant;
  asksBriefing: boolean;
}

/** What stands in the way of an act before it; null when nothing does. */
export function lockOf({ turn, steps, act, now, asksBriefing }: LockQuestion): ActLock | null {
  if (act.kind === 'nothing' || act.kind === 'arrival' || hasLeft(turn)) return null;
  const step = act.kind === 'step' ? steps.find((each) => each.key === act.step.key) : undefined;
  const isLeaving = act.kind === 'departure' || step?.anchor === 'departure';
  if (turn.blueSignal !== null && isLeaving) return { kind: 'blue-signal', ...turn.blueSignal };
  const labels = act.kind === 'step' ? missingBefore(turn, steps, act.step.key) : openBeforeDeparture(turn);
  if (labels.length > 0) return { kind: 'missing', labels };
  const notBefore = notBeforeOf(turn, step);
  if (notBefore !== null && now < notBefore) return { kind: 'too-early', notBefore };
  return asksBriefing && step !== undefined && isInCab(step) ? { kind: 'briefing' } : null;
}

/** Steps the train waits for that are open; asked when somebody records the departure out of order. */
function openBeforeDeparture(turn: WireTurn): string[] {
  return turn.steps
    .filter((step) => step.holdsDeparture && step.doneAt === null && step.state !== 'not-needed')
    .map((step) => step.shortLabel);
}

function notBeforeOf(turn: WireTurn, step: PlanStep | undefined): Instant | null {
  const leaves = leavesAt(turn);
  if (step === undefined || step.notBeforeSeconds === null || leaves === null) return null;
  const at = parseInstant(leaves);
  return at === null ? null : at + step.notBeforeSeconds * 1000;
}
