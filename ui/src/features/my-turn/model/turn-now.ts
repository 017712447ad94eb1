import {
  forecastTurn,
  formatInstant,
  openStepState,
  parseInstant,
  type Forecast,
  type ForecastInput,
  type Health,
  type Instant,
  type PlanStep,
  type StepForecast,
  type WireStep,
  type WireTurn,
} from '@stubpost/shared';
import { hasLeft, isSettled } from './next-act';

const instant = (text: string | null | undefined): Instant | null =>
  text === null || text === undefined ? null : parseInstant(text);
const text = (at: Instant | null): string | null => (at === null ? null : formatInstant(at));

function inputOf(turn: WireTurn, steps: readonly PlanStep[]): ForecastInput {
  const done = turn.steps.flatMap((step): [string, Instant][] => {
    const at = instant(step.doneAt);
    return at === null ? [] : [[step.key, at]];
  });
  return {
    kind: turn.kind,
    steps,
    scheduledArrivalAt: instant(turn.inbound?.scheduledArrivalAt),
    expectedArrivalAt: instant(turn.inbound?.expectedArrivalAt),
    actualArrivalAt: instant(turn.inbound?.actualArrivalAt),
    scheduledDepartureAt: instant(turn.outbound?.scheduledDepartureAt),
    heldUntil: instant(turn.outbound?.heldUntil),
    actualDepartureAt: instant(turn.outbound?.actualDepartureAt),
    doneAt: Object.fromEntries(done),
  };
}

/** Slack from which a turn is no longer *Tight*, in seconds. */
const tightSeconds = 60;

/**
 * How a turn stands by its slack at this second. *No word* is kept from the service, which alone knows what it has not
 * heard; an entry of this phone ends it at once.
 */
function healthAt(turn: WireTurn, forecast: Forecast, now: Instant, hasOwnWord: boolean): Health {
  if (turn.annulled !== null || hasLeft(turn)) return 'on-plan';
  const leaves = forecast.departureAnchorAt;
  if (leaves !== null && now > leaves) return 'late';
  if (turn.health === 'no-word' && !hasOwnWord) return 'no-word';
  const slack = forecast.slackSeconds;
  if (slack === null || slack >= tightSeconds) return 'on-plan';
  return slack < 0 ? 'short' : 'tight';
}

/**
 * The turn with its times, step states, forecast and health of this second. `steps` are those of the turn; the sums are
 * the core's own. `hasOwnWord`: an entry of this phone is under way.
 */
export function turnAt(
  turn: WireTurn,
  steps: readonly PlanStep[],
  now: Instant,
  hasOwnWord: boolean,
): WireTurn {
  const input = inputOf(turn, steps);
  const forecast = forecastTurn(input, now);
  const byKey = new Map(forecast.steps.map((each) => [each.key, each]));
  return {
    ...turn,
    health: healthAt(turn, forecast, now, hasOwnWord),
    steps: turn.steps.map((step) => stepAt(step, byKey.get(step.key), input, now)),
    forecast: {
      ...turn.forecast,
      readyAt: text(forecast.readyAt),
      slackSeconds: forecast.slackSeconds,
      criticalSteps: [...forecast.criticalSteps],
    },
  };
}

/** States that only an entry ends, not the clock. */
const standing: readonly WireStep['state'][] = ['blocked', 'withdrawn'];

function stepAt(
  step: WireStep,
  forecast: StepForecast | undefined,
  input: ForecastInput,
  now: Instant,
): WireStep {
  const planned = input.steps.find((each) => each.key === step.key);
  if (forecast === undefined || planned === undefined || isSettled(step)) return step;
  const { actualArrivalAt: arrivalAt, actualDepartureAt: departureAt, doneAt, steps } = input;
  const open = { step: planned, steps, times: forecast, arrivalAt, departureAt, doneAt };
  return {
    ...step,
    dueAt: text(forecast.dueAt),
    latestFinishAt: text(forecast.latestFinishAt),
    forecastFinishAt: text(forecast.finishAt),
    state: standing.includes(step.state) ? step.state : openStepState(open, now),
  };
}
