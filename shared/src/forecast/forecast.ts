import { millisecondsInSecond, type Instant } from '../lib/instant';
import type { ForecastInput } from './forecast-input';
import { expectedFinish, runForward, startOf, type ForwardPass } from './forward-pass';
import type { PreparedStep } from './prepared-steps';

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

/** The outlook of a turn at one moment: the forecast without its single steps. */
export interface Outlook {
  /** Null for a first-out. */
  arrivalAnchorAt: Instant | null;
  /** Scheduled departure or the hold, whichever is later; null for a tie-up. */
  departureAnchorAt: Instant | null;
  /** When the last step that holds the departure will be finished; null where there is no departure. */
  readyAt: Instant | null;
  /** The later of departure anchor and `readyAt`; once the train has left, when it did. */
  expectedDepartureAt: Instant | null;
  /** How long the work may still wait before it costs the departure; null where nothing can cost it any more. */
  slackSeconds: number | null;
  /** The next step that decides the slack and the chain of steps behind it; empty when no work is left. */
  criticalSteps: readonly string[];
}

/** Planned times, forecast and slack of a turn at one moment. */
export interface Forecast extends Outlook {
  /** In the order of the plan. */
  steps: readonly StepForecast[];
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
  const pass = runForward(input, now);
  const outlook = outlookFrom(pass, input);
  // Written out: spreading the outlook takes four times as long as all the sums.
  return {
    arrivalAnchorAt: outlook.arrivalAnchorAt,
    departureAnchorAt: outlook.departureAnchorAt,
    readyAt: outlook.readyAt,
    expectedDepartureAt: outlook.expectedDepartureAt,
    slackSeconds: outlook.slackSeconds,
    criticalSteps: outlook.criticalSteps,
    steps: stepForecasts(pass, input, outlook.expectedDepartureAt ?? now, now),
  };
}

/** As `forecastTurn` without the single steps: what a board asks for every turn each second. */
export function outlookOf(input: ForecastInput, now: Instant): Outlook {
  return outlookFrom(runForward(input, now), input);
}

function outlookFrom(pass: ForwardPass, { actualDepartureAt }: ForecastInput): Outlook {
  const { arrivalAt, departureAt } = pass;
  const readyAt = departureAt === null ? null : readyTime(pass);
  const isOpen = departureAt !== null && readyAt !== null && actualDepartureAt === null;
  const decidedBy = isOpen ? decidingStep(pass, departureAt) : -1;
  const deciding = pass.plan[decidedBy];
  let slackSeconds: number | null = null;
  if (isOpen) {
    const slack = deciding === undefined ? departureAt - readyAt : nextSlack(pass, departureAt, decidedBy);
    slackSeconds = Math.floor(slack / millisecondsInSecond);
  }
  return {
    arrivalAnchorAt: arrivalAt,
    departureAnchorAt: departureAt,
    readyAt,
    expectedDepartureAt: actualDepartureAt ?? laterOf(departureAt, readyAt),
    slackSeconds,
    criticalSteps: deciding?.chain ?? noKeys,
  };
}

function laterOf(a: Instant | null, b: Instant | null): Instant | null {
  if (a === null || b === null) return a ?? b;
  return a > b ? a : b;
}

/** Latest finish of the steps that hold the departure; without any, the arrival. */
function readyTime({ plan, arrivalAt, finishAt }: ForwardPass): Instant | null {
  let ready = -Infinity;
  for (let place = 0; place < plan.length; place += 1) {
    const finish = finishAt[place] ?? ready;
    if (plan[place]?.holds === true && finish > ready) ready = finish;
  }
  return ready === -Infinity ? arrivalAt : ready;
}

/** The place of the step with the least slack among those that could be next; −1 when no work is left. */
function decidingStep(pass: ForwardPass, departureAt: Instant): number {
  let least = Infinity;
  let decidedBy = -1;
  for (let place = 0; place < pass.plan.length; place += 1) {
    const step = pass.plan[place];
    if (step === undefined || !step.holds || !couldBeNext(pass, step, place)) continue;
    const slack = nextSlack(pass, departureAt, place);
    if (slack >= least) continue;
    least = slack;
    decidedBy = place;
  }
  return decidedBy;
}

function couldBeNext({ isDone }: ForwardPass, step: PreparedStep, place: number): boolean {
  if (isDone[place] === 1) return false;
  for (let index = 0; index < step.before.length; index += 1) {
    if (isDone[step.before[index] ?? 0] !== 1) return false;
  }
  return true;
}

/** Slack in milliseconds of a step that could be next; it may wait for its not-before time without losing any. */
function nextSlack(
  { plan, now, freeAt, finishAt }: ForwardPass,
  departureAt: Instant,
  place: number,
): number {
  const step = plan[place];
  if (step === undefined) return Infinity;
  const free = freeAt[place] ?? -Infinity;
  const notBefore = departureAt + step.notBefore;
  const waitsForClock = now < notBefore && free < notBefore;
  const finish = waitsForClock ? (now > free ? now : free) + step.typical : (finishAt[place] ?? now);
  return departureAt + (step.latestFinish ?? 0) - finish;
}

function stepForecasts(
  pass: ForwardPass,
  input: ForecastInput,
  leavesAt: Instant,
  now: Instant,
): StepForecast[] {
  const forecasts = new Array<StepForecast>(pass.plan.length);
  for (let place = 0; place < pass.plan.length; place += 1) {
    const step = pass.plan[place];
    if (step === undefined) continue;
    forecasts[step.place] = step.isAfterDeparture
      ? stepForecast(pass, step, leavesAt, input.doneAt[step.key] ?? expectedFinish(step, leavesAt, now))
      : stepForecast(pass, step, startOf(pass, place), pass.finishAt[place] ?? now);
  }
  return forecasts;
}

function stepForecast(
  pass: ForwardPass,
  step: PreparedStep,
  startAt: Instant,
  finishAt: Instant,
): StepForecast {
  const { arrivalAt, departureAt } = pass;
  const anchor = (step.fromArrival ? arrivalAt : departureAt) ?? departureAt ?? arrivalAt ?? pass.now;
  const dueAt = anchor + step.offset;
  const hasLatest = step.latestFinish !== null && departureAt !== null;
  const latestFinishAt = hasLatest ? departureAt + (step.latestFinish ?? 0) : dueAt;
  const slackSeconds = Math.floor((latestFinishAt - finishAt) / millisecondsInSecond);
  return { key: step.key, dueAt, startAt, finishAt, latestFinishAt, slackSeconds };
}
