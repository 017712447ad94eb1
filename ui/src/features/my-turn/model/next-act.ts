import { rolesOf, type PlanStep, type WireStep, type WireTurn } from '@stubpost/shared';

/** What there is to record next on a turn: one thing, or the reason why there is nothing. */
export type NextAct =
  | { kind: 'arrival' }
  | { kind: 'departure' }
  | { kind: 'step'; step: WireStep }
  | { kind: 'nothing'; why: 'annulled' | 'tied-up' | 'all-recorded' };

/** Whether a step asks for nothing more. One in question has been done; which time counts is for the desk. */
export function isSettled(step: WireStep): boolean {
  return step.state === 'done' || step.state === 'not-needed' || step.state === 'in-question';
}

/** Labels of what must be recorded before a step by the plan, and is not. */
export function missingBefore(turn: WireTurn, steps: readonly PlanStep[], key: string): string[] {
  const after = steps.find((step) => step.key === key)?.after ?? [];
  return after.flatMap((before) => {
    if (before === 'arrival') return missingArrival(turn) ? ['Stopped at marker'] : [];
    if (before === 'departure') return turn.outbound?.actualDepartureAt === null ? ['Departed'] : [];
    const step = turn.steps.find((each) => each.key === before);
    return step === undefined || isSettled(step) ? [] : [step.shortLabel];
  });
}

/** Whether a train is to come in and has not been recorded as arrived. */
export const missingArrival = (turn: WireTurn): boolean =>
  turn.inbound !== null && turn.inbound.actualArrivalAt === null;
/** Whether the departure is recorded. */
export const hasLeft = (turn: WireTurn): boolean =>
  turn.outbound !== null && turn.outbound.actualDepartureAt !== null;

const byLatestFinish = (a: WireStep, b: WireStep): number =>
  (a.latestFinishAt ?? a.dueAt ?? '').localeCompare(b.latestFinishAt ?? b.dueAt ?? '');

/**
 * The one next act by the plan (`steps` are those of the turn): the arrival, then the open step whose predecessors are recorded and whose latest
 * finish is earliest, then the departure, then what follows it. After the departure a step that was left out before
 * it comes last: it can only be entered later.
 */
export function nextAct(turn: WireTurn, steps: readonly PlanStep[]): NextAct {
  if (turn.annulled !== null) return { kind: 'nothing', why: 'annulled' };
  const open = turn.steps.filter((step) => !isSettled(step));
  const { afterDeparture } = rolesOf(steps);
  if (hasLeft(turn)) return actAfterDeparture(open, afterDeparture);
  if (missingArrival(turn)) return { kind: 'arrival' };
  const before = open.filter((step) => !afterDeparture.has(step.key));
  const ready = before
    .filter((step) => missingBefore(turn, steps, step.key).length === 0)
    .sort(byLatestFinish);
  const step = ready[0] ?? before[0];
  if (step !== undefined) return { kind: 'step', step };
  return turn.outbound === null ? { kind: 'nothing', why: 'tied-up' } : { kind: 'departure' };
}

function actAfterDeparture(open: WireStep[], afterDeparture: ReadonlySet<string>): NextAct {
  const step = open.find((each) => afterDeparture.has(each.key)) ?? open[0];
  return step === undefined ? { kind: 'nothing', why: 'all-recorded' } : { kind: 'step', step };
}

/** Names an act so that two moments can be compared: did the act under the thumb change? */
export function actKey(act: NextAct): string {
  return act.kind === 'step' ? `step:${act.step.key}` : act.kind;
}

/** The act in the words of the bar. */
export function actLabel(act: NextAct): string {
  switch (act.kind) {
    case 'arrival':
      return 'Stopped at marker';
    case 'departure':
      return 'Departed';
    case 'step':
      return act.step.shortLabel;
    case 'nothing':
      return 'Nothing open';
  }
}
