import { millisecondsInSecond } from '../lib/instant';
import { arrivalEvent, departureEvent, orderSteps, stepsAfterDeparture } from '../plan/step-network';
import type { PlanStep } from '../plan/step-plan';
import { scheduleNetwork } from './network';

/** What the forecast needs to know about one step, worked out once for each list of steps. Milliseconds. */
export interface PreparedStep {
  key: string;
  /** Place in the list of steps it came from. */
  place: number;
  fromArrival: boolean;
  isAfterDeparture: boolean;
  holds: boolean;
  offset: number;
  typical: number;
  long: number;
  /** Counted from the departure; −Infinity where the step may start at any time. */
  notBefore: number;
  /** Places of its predecessors in the prepared order. */
  before: readonly number[];
  /** Whether it waits for the arrival, directly or because it waits for nothing else. */
  waitsForArrival: boolean;
  /** Latest finish counted from the departure; null where no step that holds the departure depends on it. */
  latestFinish: number | null;
  /** Its key and those of the successors that leave it the least time, up to the departure. */
  chain: readonly string[];
}

const known = new WeakMap<readonly PlanStep[], readonly PreparedStep[]>();

/**
 * The steps in an order in which each stands after all its predecessors, with places instead of keys and the backward
 * pass already done: latest finishes depend on the departure alone. Worked out once for each list. Throws for steps
 * that go in a circle, which `checkPlan` does not let into a plan.
 */
export function prepareSteps(steps: readonly PlanStep[]): readonly PreparedStep[] {
  const found = known.get(steps);
  if (found !== undefined) return found;
  const prepared = prepare(steps);
  known.set(steps, prepared);
  return prepared;
}

function prepare(steps: readonly PlanStep[]): PreparedStep[] {
  const ordered = orderSteps(steps);
  if (ordered === null) throw new Error('Steps that wait for one another have no forecast.');
  const places = new Map(ordered.map((step, index) => [step.key, index]));
  const afterDeparture = stepsAfterDeparture(steps);
  const latest = latestFinishes(ordered, afterDeparture);
  return ordered.map((step): PreparedStep => {
    const before = step.after.flatMap((key) => places.get(key) ?? []);
    const waitsForEvent = step.after.includes(arrivalEvent) || step.after.includes(departureEvent);
    return {
      key: step.key,
      place: steps.indexOf(step),
      fromArrival: step.anchor === 'arrival',
      isAfterDeparture: afterDeparture.has(step.key),
      holds: step.holdsDeparture && !afterDeparture.has(step.key),
      offset: step.offsetSeconds * millisecondsInSecond,
      typical: step.typicalSeconds * millisecondsInSecond,
      long: step.longSeconds * millisecondsInSecond,
      notBefore: step.notBeforeSeconds === null ? -Infinity : step.notBeforeSeconds * millisecondsInSecond,
      before,
      waitsForArrival: step.after.includes(arrivalEvent) || (before.length === 0 && !waitsForEvent),
      latestFinish: latest.get(step.key) ?? null,
      chain: chainFrom(step, ordered, latest),
    };
  });
}

/** Backward pass from a departure at 0 through the steps that hold it and all that come before them. */
function latestFinishes(
  ordered: readonly PlanStep[],
  afterDeparture: ReadonlySet<string>,
): ReadonlyMap<string, number> {
  const leading = new Set<string>();
  for (const step of [...ordered].reverse()) {
    if (afterDeparture.has(step.key)) continue;
    const isWaitedFor = ordered.some((other) => leading.has(other.key) && other.after.includes(step.key));
    if (step.holdsDeparture || isWaitedFor) leading.add(step.key);
  }
  const activities = ordered
    .filter((step) => leading.has(step.key))
    .map(({ key, typicalSeconds, after }) => ({
      id: key,
      duration: typicalSeconds * millisecondsInSecond,
      after: after.filter((before) => leading.has(before)),
    }));
  const schedule = scheduleNetwork(activities, 0);
  if (!schedule.ok) throw new Error(`No schedule: ${schedule.error.code}`);
  return new Map(schedule.value.activities.map(({ id, latestFinish }) => [id, latestFinish]));
}

/** From a step along the first successor whose latest start is the latest finish before it. */
function chainFrom(
  from: PlanStep,
  ordered: readonly PlanStep[],
  latest: ReadonlyMap<string, number>,
): string[] {
  const chain: string[] = [];
  for (let step: PlanStep | undefined = from; step !== undefined;) {
    const { key } = step;
    chain.push(key);
    const finish = latest.get(key);
    step = ordered.find((next) => {
      const nextFinish = latest.get(next.key);
      if (nextFinish === undefined || !next.after.includes(key)) return false;
      return nextFinish - next.typicalSeconds * millisecondsInSecond === finish;
    });
  }
  return chain;
}
