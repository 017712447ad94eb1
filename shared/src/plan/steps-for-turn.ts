import type { PlanStep } from './step-plan';
import { arrivalEvent, departureEvent, orderSteps, stepsAfterDeparture } from './step-network';

/** What decides which steps of a plan a turn has. `kind` is the turn's kind, `reverses` null when unknown. */
export interface StepsQuestion {
  kind: 'turn' | 'first-out' | 'tie-up';
  reverses: boolean | null;
}

const known = new WeakMap<readonly PlanStep[], Map<string, PlanStep[]>>();

/**
 * The steps of a plan that belong to a turn, in the plan's order. A first-out has the steps counted from the
 * departure, without predecessors that are not among them. A tie-up has the steps that secure the train, and they
 * hold nothing but themselves. A pair that is known not to reverse has none: it is no push-pull turn. Unknown is
 * read as reversing. The same plan and question give the same list, so it may serve as a key.
 */
export function stepsFor(planSteps: readonly PlanStep[], question: StepsQuestion): PlanStep[] {
  const answers = known.get(planSteps) ?? new Map<string, PlanStep[]>();
  known.set(planSteps, answers);
  const asked = question.reverses === false ? 'none' : question.kind;
  const answer = answers.get(asked) ?? selectSteps(planSteps, asked);
  answers.set(asked, answer);
  return answer;
}

function selectSteps(planSteps: readonly PlanStep[], asked: StepsQuestion['kind'] | 'none'): PlanStep[] {
  switch (asked) {
    case 'turn':
      return [...planSteps];
    case 'first-out':
      return within(
        planSteps.filter((step) => step.anchor === 'departure'),
        departureEvent,
      );
    case 'tie-up':
      return within(
        planSteps.filter((step) => step.kind === 'securement' && step.anchor === 'arrival'),
        arrivalEvent,
      );
    case 'none':
      return [];
  }
}

/** Drops predecessors that are neither among the steps nor the one event the turn has. */
function within(steps: PlanStep[], event: string): PlanStep[] {
  const kept = new Set([event, ...steps.map((step) => step.key)]);
  return steps.map((step) => ({ ...step, after: step.after.filter((key) => kept.has(key)) }));
}

/**
 * The shortest turn in whole seconds: the longest path at typical durations from the arrival through the steps that
 * hold the departure. Not-before times do not count, for a short turn waits for none. 520 for the default plan; 0
 * when no step holds the departure or the steps go in a circle.
 */
export function shortestTurnSeconds(steps: readonly PlanStep[]): number {
  const afterDeparture = stepsAfterDeparture(steps);
  const finish = new Map<string, number>();
  let longest = 0;
  for (const step of orderSteps(steps) ?? []) {
    if (afterDeparture.has(step.key)) continue;
    const start = Math.max(0, ...step.after.map((key) => finish.get(key) ?? 0));
    finish.set(step.key, start + step.typicalSeconds);
    if (step.holdsDeparture) longest = Math.max(longest, start + step.typicalSeconds);
  }
  return longest;
}
