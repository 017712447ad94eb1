import type { PlanStep } from './step-plan';
import { arrivalEvent, departureEvent, orderSteps, stepsAfterDeparture } from './step-network';

/** Every reason why a plan cannot be used. */
export const PLAN_PROBLEMS = [
  'plan.no_steps',
  'plan.duplicate_key',
  'plan.reserved_key',
  'plan.unknown_predecessor',
  'plan.cycle',
  'plan.durations',
  'plan.not_before',
  'plan.after_departure_holds',
  'plan.arrival_after_departure',
] as const;
export type PlanProblemCode = (typeof PLAN_PROBLEMS)[number];

/** One thing that is wrong with a plan. `step` is a step's key, null when it concerns the plan as a whole. */
export interface PlanProblem {
  code: PlanProblemCode;
  step: string | null;
  message: string;
}

/**
 * Everything that is wrong with the steps of a plan, in the order of its steps; an empty list means that it can be
 * used. Asked: at least one step; keys that differ and are not the words `arrival` and `departure`; predecessors
 * that exist and do not go in a circle; 0 ≤ short ≤ typical ≤ long in whole seconds; a not-before time only on a
 * step counted from the departure; a step after the departure holds nothing and is counted from the departure.
 */
export function checkPlan(steps: readonly PlanStep[]): PlanProblem[] {
  if (steps.length === 0) return [{ code: 'plan.no_steps', step: null, message: 'The plan has no steps.' }];
  const afterDeparture = stepsAfterDeparture(steps);
  return [
    ...checkKeys(steps),
    ...checkPredecessors(steps),
    ...steps.flatMap((step) => checkTimes(step)),
    ...steps.filter((step) => afterDeparture.has(step.key)).flatMap((step) => checkAfterDeparture(step)),
  ];
}

function checkKeys(steps: readonly PlanStep[]): PlanProblem[] {
  return steps.flatMap((step, index): PlanProblem[] => {
    if (step.key === arrivalEvent || step.key === departureEvent) {
      return [
        problem('plan.reserved_key', step, `"${step.key}" is the word for the train's own ${step.key}.`),
      ];
    }
    if (steps.findIndex((other) => other.key === step.key) === index) return [];
    return [problem('plan.duplicate_key', step, `The key "${step.key}" is used twice.`)];
  });
}

function checkPredecessors(steps: readonly PlanStep[]): PlanProblem[] {
  const known = new Set([arrivalEvent, departureEvent, ...steps.map((step) => step.key)]);
  const problems = steps.flatMap((step) =>
    step.after
      .filter((key) => !known.has(key))
      .map((key) =>
        problem('plan.unknown_predecessor', step, `${step.label} waits for "${key}", which is no step.`),
      ),
  );
  if (orderSteps(steps) === null) {
    const message = `${circle(steps)
      .map((step) => step.label)
      .join(', ')}: these steps wait for one another.`;
    problems.push({ code: 'plan.cycle', step: circle(steps)[0]?.key ?? null, message });
  }
  return problems;
}

/** The steps that cannot be placed because they wait for one another. */
function circle(steps: readonly PlanStep[]): PlanStep[] {
  let left = [...steps];
  for (let shrunk = true; shrunk;) {
    const keys = new Set(left.map((step) => step.key));
    const waitedFor = new Set(left.flatMap((step) => step.after));
    const kept = left.filter((step) => waitedFor.has(step.key) && step.after.some((key) => keys.has(key)));
    shrunk = kept.length < left.length;
    left = kept;
  }
  return left;
}

function checkTimes(step: PlanStep): PlanProblem[] {
  const { shortSeconds, typicalSeconds, longSeconds } = step;
  const problems: PlanProblem[] = [];
  const whole = [shortSeconds, typicalSeconds, longSeconds].every((seconds) => Number.isInteger(seconds));
  if (!whole || shortSeconds < 0 || typicalSeconds < shortSeconds || longSeconds < typicalSeconds) {
    const message = `${step.label}: durations must be whole seconds with short ≤ typical ≤ long.`;
    problems.push(problem('plan.durations', step, message));
  }
  if (step.notBeforeSeconds !== null && step.anchor !== 'departure') {
    const message = `${step.label}: only a step counted from the departure can have a not-before time.`;
    problems.push(problem('plan.not_before', step, message));
  }
  return problems;
}

function checkAfterDeparture(step: PlanStep): PlanProblem[] {
  const problems: PlanProblem[] = [];
  if (step.holdsDeparture) {
    const message = `${step.label} comes after the departure and cannot hold it.`;
    problems.push(problem('plan.after_departure_holds', step, message));
  }
  if (step.anchor === 'arrival') {
    const message = `${step.label} comes after the departure and cannot be counted from the arrival.`;
    problems.push(problem('plan.arrival_after_departure', step, message));
  }
  return problems;
}

function problem(code: PlanProblemCode, step: PlanStep, message: string): PlanProblem {
  return { code, step: step.key, message };
}
