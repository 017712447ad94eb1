import { millisecondsInSecond, type Instant } from '../lib/instant';
import type { PlanStep } from '../plan/step-plan';
import type { TurnKind } from '../turn/turn';
import { prepareSteps, type PreparedStep } from './prepared-steps';

/** The facts a forecast is made from. `steps` are those of the turn, from `stepsFor`; the same list is fastest. */
export interface ForecastInput {
  kind: TurnKind;
  steps: readonly PlanStep[];
  scheduledArrivalAt: Instant | null;
  expectedArrivalAt: Instant | null;
  actualArrivalAt: Instant | null;
  scheduledDepartureAt: Instant | null;
  heldUntil: Instant | null;
  actualDepartureAt: Instant | null;
  /** Recorded time of each step that is done. */
  doneAt: Readonly<Record<string, Instant>>;
}

/** One step of a forecast. */
export interface StepForecast {
  key: string;
  /** Anchor plus offset. */
  dueAt: Instant;
  /** When it could start or could have started. */
  startAt: Instant;
  /** Recorded time, else when it is expected to be finished. */
  finishAt: Instant;
  /** Finish by which the departure is still kept at typical durations. */
  latestFinishAt: Instant;
  /** Latest finish less finish, whole seconds, cut downwards. */
  slackSeconds: number;
}

/** Planned times, forecast and slack of a turn at one moment. */
export interface Forecast {
  /** Null for a first-out. */
  arrivalAnchorAt: Instant | null;
  /** Scheduled departure or the hold, whichever is later; null for a tie-up. */
  departureAnchorAt: Instant | null;
  /** In the order of the plan. */
  steps: readonly StepForecast[];
  /** When the last step that holds the departure will be finished; null where there is no departure. */
  readyAt: Instant | null;
  /** The later of departure anchor and `readyAt`; once the train has left, when it did. */
  expectedDepartureAt: Instant | null;
  /** How long the work may still wait before it costs the departure; null where nothing can cost it any more. */
  slackSeconds: number | null;
  /** The next step that decides the slack and the chain of steps behind it; empty when no work is left. */
  criticalSteps: readonly string[];
}

const noKeys: readonly string[] = [];

/**
 * Planned times and forecast of a turn at `now`.
 *
 * Due = anchor + offset. The arrival anchor is the actual arrival, else the latest of scheduled arrival, expected
 * arrival and now. The departure anchor D is the later of scheduled departure and hold; nothing else moves it.
 *
 * Forward: a done step has its recorded time. Another could have started at s = the latest finish of its
 * predecessors, not before its not-before time. With e = now − s it is finished at s + typical while e ≤ typical, at
 * now + (long − e) / 3 while typical < e < long (the mean remainder of a triangular duration), at now after that. A
 * step that waits for nothing starts with the arrival or, on a first-out, so that it ends when it is due.
 *
 * Backward: latest finishes run from D at typical durations. A step on which no departure depends has its due time.
 *
 * Slack of the turn = the least slack of the steps that could be next: not done, holding the departure, all
 * predecessors done (the arrival counts as done at its anchor). A step that only waits for its not-before time counts
 * as finishing at max(now, its predecessors' finish) + typical. With no such step left it is D − `readyAt`. Cut
 * downwards to whole seconds, so that −0.2 s is short. Null for a tie-up and once the train has left.
 *
 * Nothing before the departure moves any more once the train has left: open steps stand as they did then.
 */
export function forecastTurn(input: ForecastInput, now: Instant): Forecast {
  const prepared = prepareSteps(input.steps);
  const movesUntil = input.actualDepartureAt === null ? now : Math.min(now, input.actualDepartureAt);
  const arrivalAnchorAt = arrivalAnchor(input, movesUntil);
  const departureAnchorAt = departureAnchor(input);
  const passes: Passes = {
    prepared,
    input,
    now: movesUntil,
    arrivalAt: arrivalAnchorAt,
    departureAt: departureAnchorAt,
    free: [],
    finish: [],
  };
  forwardPass(passes);
  const readyAt = departureAnchorAt === null ? null : readyTime(passes);
  const expectedDepartureAt = input.actualDepartureAt ?? laterOf(departureAnchorAt, readyAt);
  const slack = turnSlack(passes, readyAt);
  return {
    arrivalAnchorAt,
    departureAnchorAt,
    steps: stepForecasts(passes, expectedDepartureAt, now),
    readyAt,
    expectedDepartureAt,
    slackSeconds: slack.seconds,
    criticalSteps: slack.decidedBy < 0 ? noKeys : criticalChain(passes, slack.decidedBy),
  };
}

interface Passes {
  prepared: readonly PreparedStep[];
  input: ForecastInput;
  now: Instant;
  arrivalAt: Instant | null;
  departureAt: Instant | null;
  /** By place in the prepared order: when the predecessors are finished, −Infinity when there is none. */
  free: number[];
  /** By place in the prepared order: recorded or forecast finish. Steps after the departure are left out. */
  finish: number[];
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

function laterOf(a: Instant | null, b: Instant | null): Instant | null {
  return a === null || b === null ? (a ?? b) : Math.max(a, b);
}

function forwardPass(passes: Passes): void {
  const { prepared, input, now, free, finish } = passes;
  for (let place = 0; place < prepared.length; place += 1) {
    const step = prepared[place];
    if (step === undefined || step.isAfterDeparture) continue;
    const freeAt = predecessorsFinish(passes, step);
    free[place] = freeAt;
    finish[place] = input.doneAt[step.key] ?? expectedFinish(step, startOf(passes, step, freeAt), now);
  }
}

function predecessorsFinish({ arrivalAt, finish }: Passes, step: PreparedStep): number {
  let latest = step.waitsForArrival && arrivalAt !== null ? arrivalAt : -Infinity;
  for (const place of step.before) {
    const finished = finish[place];
    if (finished !== undefined && finished > latest) latest = finished;
  }
  return latest;
}

/** When a step could start: its predecessors' finish, its not-before time, else so that it ends when it is due. */
function startOf({ arrivalAt, departureAt }: Passes, step: PreparedStep, freeAt: number): number {
  const start = departureAt === null ? freeAt : Math.max(freeAt, departureAt + step.notBefore);
  if (start !== -Infinity) return start;
  return (departureAt ?? arrivalAt ?? 0) + step.offset - step.typical;
}

function expectedFinish(step: PreparedStep, start: number, now: Instant): number {
  const elapsed = now - start;
  if (elapsed <= step.typical) return start + step.typical;
  if (elapsed < step.long) return now + Math.round((step.long - elapsed) / 3);
  return now;
}

/** Latest finish of the steps that hold the departure; without any, the arrival. */
function readyTime({ prepared, arrivalAt, finish }: Passes): Instant | null {
  let ready: Instant | null = null;
  for (let place = 0; place < prepared.length; place += 1) {
    const at = finish[place];
    if (at !== undefined && prepared[place]?.holds === true && (ready === null || at > ready)) ready = at;
  }
  return ready ?? arrivalAt;
}

/** The slack of the turn in seconds and the place of the step that decides it, −1 when no work is left. */
function turnSlack(passes: Passes, readyAt: Instant | null): { seconds: number | null; decidedBy: number } {
  const { prepared, input, departureAt } = passes;
  if (departureAt === null || readyAt === null || input.actualDepartureAt !== null) {
    return { seconds: null, decidedBy: -1 };
  }
  let least = Infinity;
  let decidedBy = -1;
  for (let place = 0; place < prepared.length; place += 1) {
    const step = prepared[place];
    if (step === undefined || !step.holds || !couldBeNext(passes, step)) continue;
    const slack = departureAt + (step.latestFinish ?? 0) - waitingFinish(passes, place);
    if (slack >= least) continue;
    least = slack;
    decidedBy = place;
  }
  const slack = decidedBy < 0 ? departureAt - readyAt : least;
  return { seconds: Math.floor(slack / millisecondsInSecond), decidedBy };
}

function couldBeNext({ prepared, input }: Passes, step: PreparedStep): boolean {
  if (input.doneAt[step.key] !== undefined) return false;
  for (const place of step.before) {
    const before = prepared[place];
    if (before !== undefined && input.doneAt[before.key] === undefined) return false;
  }
  return true;
}

/** When a next step would be finished if it were done as soon as its predecessors are, whatever its not-before time. */
function waitingFinish(passes: Passes, place: number): number {
  const { prepared, now, departureAt, free, finish } = passes;
  const step = prepared[place];
  if (step === undefined || departureAt === null) return 0;
  const waitsForClock =
    now < departureAt + step.notBefore && (free[place] ?? 0) < departureAt + step.notBefore;
  if (!waitsForClock) return finish[place] ?? now;
  return Math.max(now, free[place] ?? now) + step.typical;
}

/** From a step along the successors that leave it the least time, to the departure. */
function criticalChain({ prepared }: Passes, from: number): string[] {
  const chain: string[] = [];
  let step = prepared[from];
  while (step !== undefined) {
    chain.push(step.key);
    let tightest: PreparedStep | undefined;
    for (const place of step.next) {
      const next = prepared[place];
      if (next?.latestFinish === null || next === undefined) continue;
      const latestStart = next.latestFinish - next.typical;
      if (latestStart === step.latestFinish) tightest ??= next;
    }
    step = tightest;
  }
  return chain;
}

function stepForecasts(passes: Passes, leavesAt: Instant | null, now: Instant): StepForecast[] {
  const { prepared, departureAt, arrivalAt, free, finish } = passes;
  const forecasts = new Array<StepForecast>(prepared.length);
  for (let place = 0; place < prepared.length; place += 1) {
    const step = prepared[place];
    if (step === undefined) continue;
    const dueAt =
      ((step.fromArrival ? arrivalAt : departureAt) ?? departureAt ?? arrivalAt ?? now) + step.offset;
    const latestFinishAt =
      step.latestFinish === null || departureAt === null ? dueAt : departureAt + step.latestFinish;
    const startAt = step.isAfterDeparture
      ? (leavesAt ?? now)
      : startOf(passes, step, free[place] ?? -Infinity);
    const finishAt = step.isAfterDeparture ? finishAfter(passes, step, startAt, now) : (finish[place] ?? now);
    const slackSeconds = Math.floor((latestFinishAt - finishAt) / millisecondsInSecond);
    forecasts[step.place] = { key: step.key, dueAt, startAt, finishAt, latestFinishAt, slackSeconds };
  }
  return forecasts;
}

/** A step after the departure: its recorded time, else the departure and its typical duration, not before now. */
function finishAfter({ input }: Passes, step: PreparedStep, leavesAt: Instant, now: Instant): Instant {
  return input.doneAt[step.key] ?? expectedFinish(step, leavesAt, now);
}
