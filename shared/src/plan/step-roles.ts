import type { PlanStep } from './step-plan';
import { stepsAfterDeparture } from './step-network';

/**
 * What a step means for the life of a turn. The meaning comes from its kind and anchor, not from its key, so that a
 * railroad may rename and split steps: securement counted from the arrival secures, securement counted from the
 * departure releases, a step after the departure is the running test.
 */
export interface StepRoles {
  /** Steps that secure the train after its arrival, e.g. `handbrake-set`. */
  secure: readonly PlanStep[];
  /** Steps that change ends. */
  changeEnds: readonly PlanStep[];
  /** Steps that bring the engineer into the leaving cab. */
  manCab: readonly PlanStep[];
  /** Steps that take the securement off again, e.g. `handbrake-released`. */
  release: readonly PlanStep[];
  /** Steps the train waits for. */
  hold: readonly PlanStep[];
  /** Brake tests after the departure. */
  runningTest: readonly PlanStep[];
  /** Keys of all steps after the departure. */
  afterDeparture: ReadonlySet<string>;
}

const known = new WeakMap<readonly PlanStep[], StepRoles>();

/** The roles of a list of steps; worked out once for each list. */
export function rolesOf(steps: readonly PlanStep[]): StepRoles {
  const found = known.get(steps);
  if (found !== undefined) return found;
  const roles = findRoles(steps);
  known.set(steps, roles);
  return roles;
}

function findRoles(steps: readonly PlanStep[]): StepRoles {
  const afterDeparture = stepsAfterDeparture(steps);
  const before = steps.filter((step) => !afterDeparture.has(step.key));
  const after = steps.filter((step) => afterDeparture.has(step.key));
  return {
    secure: before.filter((step) => step.kind === 'securement' && step.anchor === 'arrival'),
    changeEnds: before.filter((step) => step.kind === 'ends'),
    manCab: before.filter((step) => step.kind === 'movement'),
    release: before.filter((step) => step.kind === 'securement' && step.anchor === 'departure'),
    hold: before.filter((step) => step.holdsDeparture),
    runningTest: after.filter((step) => step.kind === 'brake-test'),
    afterDeparture,
  };
}
