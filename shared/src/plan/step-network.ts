import type { PlanStep } from './step-plan';

/** Word for the event of the arrival among the predecessors of a step. */
export const arrivalEvent = 'arrival';
/** Word for the event of the departure among the predecessors of a step. */
export const departureEvent = 'departure';

/**
 * The steps in an order in which each stands after all its predecessors; among steps that are free at the same time
 * the plan's own order is kept. Null when the steps wait for one another in a circle. Predecessors that are no step
 * (the two events, unknown keys) are passed over.
 */
export function orderSteps(steps: readonly PlanStep[]): PlanStep[] | null {
  const keys = new Set(steps.map((step) => step.key));
  const placed = new Set<string>();
  const ordered: PlanStep[] = [];
  let waiting = [...steps];
  while (waiting.length > 0) {
    const next = waiting.find((step) => step.after.every((key) => !keys.has(key) || placed.has(key)));
    if (next === undefined) return null;
    placed.add(next.key);
    ordered.push(next);
    waiting = waiting.filter((step) => step !== next);
  }
  return ordered;
}

/**
 * Keys of the steps that come after the departure: those that wait for it, and those that wait for one of them.
 * `running-test` alone in the default plan.
 */
export function stepsAfterDeparture(steps: readonly PlanStep[]): ReadonlySet<string> {
  const found = new Set<string>();
  for (let grown = true; grown;) {
    grown = false;
    for (const step of steps) {
      if (found.has(step.key)) continue;
      if (!step.after.some((key) => key === departureEvent || found.has(key))) continue;
      found.add(step.key);
      grown = true;
    }
  }
  return found;
}
