import type { Instant } from '../lib/instant';
import type { ForecastInput } from './forecast-input';
import { prepareSteps, type PreparedStep } from './prepared-steps';

/** The forward pass over one turn. By place in the prepared order; steps after the departure are left out. */
export interface ForwardPass {
  plan: readonly PreparedStep[];
  /** The moment of the forecast; once the train has left, the departure, for nothing before it moves any more. */
  now: Instant;
  arrivalAt: Instant | null;
  departureAt: Instant | null;
  /** Latest finish of the predecessors, the arrival among them; −Infinity where there is none. */
  freeAt: Float64Array;
  /** Recorded or expected finish. */
  finishAt: Float64Array;
  isDone: Uint8Array;
}

/**
 * One pass is kept and filled anew: making buffers for each turn took more than the sums themselves. What
 * `runForward` returns is therefore only good until it is called again, and never leaves this folder.
 */
const pass: ForwardPass = {
  plan: [],
  now: 0,
  arrivalAt: null,
  departureAt: null,
  freeAt: new Float64Array(32),
  finishAt: new Float64Array(32),
  isDone: new Uint8Array(32),
};

/** Fills the pass for one turn at `now`; the rules stand at `forecastTurn`. */
export function runForward(input: ForecastInput, now: Instant): ForwardPass {
  const plan = prepareSteps(input.steps);
  if (plan.length > pass.finishAt.length) growTo(plan.length);
  const { actualDepartureAt } = input;
  pass.plan = plan;
  pass.now = actualDepartureAt === null || now < actualDepartureAt ? now : actualDepartureAt;
  pass.arrivalAt = arrivalAnchor(input, pass.now);
  pass.departureAt = departureAnchor(input);
  const { freeAt, finishAt, isDone } = pass;
  for (let place = 0; place < plan.length; place += 1) {
    const step = plan[place];
    if (step === undefined || step.isAfterDeparture) continue;
    const recorded = input.doneAt[step.key];
    freeAt[place] = predecessorsFinish(step, pass);
    isDone[place] = recorded === undefined ? 0 : 1;
    finishAt[place] = recorded ?? expectedFinish(step, startOf(pass, place), pass.now);
  }
  return pass;
}

function growTo(size: number): void {
  pass.freeAt = new Float64Array(size);
  pass.finishAt = new Float64Array(size);
  pass.isDone = new Uint8Array(size);
}

function arrivalAnchor(input: ForecastInput, now: Instant): Instant | null {
  if (input.kind === 'first-out') return null;
  if (input.actualArrivalAt !== null) return input.actualArrivalAt;
  return Math.max(input.scheduledArrivalAt ?? now, input.expectedArrivalAt ?? now, now);
}

function departureAnchor({ kind, scheduledDepartureAt, heldUntil }: ForecastInput): Instant | null {
  if (kind === 'tie-up' || scheduledDepartureAt === null) return null;
  return heldUntil === null ? scheduledDepartureAt : Math.max(scheduledDepartureAt, heldUntil);
}

function predecessorsFinish(step: PreparedStep, { arrivalAt, finishAt }: ForwardPass): number {
  let latest = step.waitsForArrival && arrivalAt !== null ? arrivalAt : -Infinity;
  for (let index = 0; index < step.before.length; index += 1) {
    const finish = finishAt[step.before[index] ?? 0] ?? -Infinity;
    if (finish > latest) latest = finish;
  }
  return latest;
}

/** When a step could start: its predecessors' finish, its not-before time, else so that it ends when it is due. */
export function startOf({ plan, arrivalAt, departureAt, freeAt }: ForwardPass, place: number): number {
  const step = plan[place];
  const free = freeAt[place] ?? -Infinity;
  if (step === undefined) return free;
  const notBefore = departureAt === null ? -Infinity : departureAt + step.notBefore;
  const start = free > notBefore ? free : notBefore;
  if (start !== -Infinity) return start;
  return (departureAt ?? arrivalAt ?? 0) + step.offset - step.typical;
}

/** When a step that could start at `start` will be finished, as far as can be said at `now`. Whole milliseconds. */
export function expectedFinish(step: PreparedStep, start: number, now: Instant): number {
  const elapsed = now - start;
  if (elapsed <= step.typical) return start + step.typical;
  if (elapsed < step.long) return now + Math.round((step.long - elapsed) / 3);
  return now;
}
