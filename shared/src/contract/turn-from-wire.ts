import { forecastTurn, type Forecast } from '../forecast/forecast';
import type { ForecastInput } from '../forecast/forecast-input';
import type { AssessedStep, AssessedTurn } from '../lateness/assessed-turn';
import { formatInstant, parseInstant, type Instant } from '../lib/instant';
import type { PlanStep } from '../plan/step-plan';
import { rolesOf } from '../plan/step-roles';
import { shortestTurnSeconds, stepsFor } from '../plan/steps-for-turn';
import { attendanceAt } from '../turn/attendance';
import type { TurnFacts } from '../turn/facts';
import { openStepState } from '../turn/life';
import type { StepState } from '../turn/turn';
import type { WireSecurement, WireStep, WireTurn } from './turns';

function instantOf(text: string | null | undefined): Instant | null {
  return text === null || text === undefined ? null : parseInstant(text);
}

/**
 * What the forecast needs, from a turn as the service gave it and the steps of its plan (`GET /api/plans/:id`, all
 * of them). With it the browser reckons slack and ready-by anew each second, by the server's own function.
 */
export function forecastInputOfWire(turn: WireTurn, planSteps: readonly PlanStep[]): ForecastInput {
  const { inbound, outbound } = turn;
  return {
    kind: turn.kind,
    steps: stepsFor(planSteps, turn),
    scheduledArrivalAt: instantOf(inbound?.scheduledArrivalAt),
    expectedArrivalAt: instantOf(inbound?.expectedArrivalAt),
    actualArrivalAt: instantOf(inbound?.actualArrivalAt),
    scheduledDepartureAt: instantOf(outbound?.scheduledDepartureAt),
    heldUntil: instantOf(outbound?.heldUntil),
    actualDepartureAt: instantOf(outbound?.actualDepartureAt),
    doneAt: doneAtOf(turn.steps),
  };
}

function doneAtOf(steps: readonly WireStep[]): Record<string, Instant> {
  const doneAt: Record<string, Instant> = {};
  for (const step of steps) {
    const at = instantOf(step.doneAt);
    if (at !== null) doneAt[step.key] = at;
  }
  return doneAt;
}

/** The forecast of a wire turn at `now`. */
export function forecastOfWire(turn: WireTurn, planSteps: readonly PlanStep[], now: Instant): Forecast {
  return forecastTurn(forecastInputOfWire(turn, planSteps), now);
}

/**
 * A wire turn as `assess` and `healthOf` look at it, with the forecast at `now` from `forecastOfWire`. What the wire
 * does not carry is left open: the outbound train's next stop. *Unsecured* is as the service last said.
 */
export function assessedTurnOfWire(
  turn: WireTurn,
  planSteps: readonly PlanStep[],
  forecast: Forecast,
): AssessedTurn {
  const steps = stepsFor(planSteps, turn);
  const { blueSignal, securement } = turn;
  const since = instantOf(blueSignal?.since);
  return {
    kind: turn.kind,
    state: turn.state,
    practice: false,
    crew: turn.crew,
    scheduledArrivalAt: instantOf(turn.inbound?.scheduledArrivalAt),
    expectedArrivalAt: instantOf(turn.inbound?.expectedArrivalAt),
    arrivalAt: instantOf(turn.inbound?.actualArrivalAt),
    scheduledDepartureAt: instantOf(turn.outbound?.scheduledDepartureAt),
    departureAt: instantOf(turn.outbound?.actualDepartureAt),
    steps: assessedSteps(turn, steps, forecast),
    forecast,
    shortestTurnSeconds: shortestTurnSeconds(steps),
    handbrakes: securement ?? { set: null, released: null, carsStillSet: [] },
    unsecuredSince: instantOf(securement?.unsecuredSince),
    blueSignal: blueSignal === null || since === null ? null : { since, by: blueSignal.by },
    lastHeardAt: instantOf(turn.lastHeardAt),
    nextStopAt: null,
  };
}

function assessedSteps(turn: WireTurn, steps: readonly PlanStep[], forecast: Forecast): AssessedStep[] {
  const { afterDeparture, manCab } = rolesOf(steps);
  return steps.flatMap((step, index): AssessedStep[] => {
    const times = forecast.steps[index];
    const wire = turn.steps.find((each) => each.key === step.key);
    if (times === undefined) return [];
    const { key, label, shortLabel, kind, doer, holdsDeparture } = step;
    const { dueAt, latestFinishAt, finishAt } = times;
    return [
      {
        ...{ key, label, shortLabel, kind, doer, holdsDeparture, dueAt, latestFinishAt, finishAt },
        isAfterDeparture: afterDeparture.has(key),
        mansCab: manCab.includes(step),
        doneAt: instantOf(wire?.doneAt),
        cannotDo: wire?.state === 'blocked' ? (wire.remarks[0] ?? null) : null,
      },
    ];
  });
}

/** States of a step that only an entry changes; the other three change with the clock. */
const settledStates: readonly StepState[] = ['done', 'not-needed', 'blocked', 'withdrawn', 'in-question'];

/**
 * The state of each step of a wire turn at `now`, by key: what the service said, or *not due*, *due* and *overdue*
 * worked out anew. `forecast` is the one of `forecastOfWire` at `now`.
 */
export function stepStatesOfWire(
  turn: WireTurn,
  planSteps: readonly PlanStep[],
  forecast: Forecast,
  now: Instant,
): Record<string, StepState> {
  const steps = stepsFor(planSteps, turn);
  const facts = {
    steps,
    arrivalAt: instantOf(turn.inbound?.actualArrivalAt),
    departureAt: instantOf(turn.outbound?.actualDepartureAt),
    doneAt: doneAtOf(turn.steps),
  };
  const states: Record<string, StepState> = {};
  for (const wire of turn.steps) {
    const index = steps.findIndex((step) => step.key === wire.key);
    const step = steps[index];
    const times = forecast.steps[index];
    const isSettled = settledStates.includes(wire.state) || step === undefined || times === undefined;
    states[wire.key] = isSettled ? wire.state : openStepState({ step, times, ...facts }, now);
  }
  return states;
}

/** The handbrake records of a turn as the wire carries them, at `now`. */
export function wireSecurementOf(facts: TurnFacts, now: Instant): WireSecurement {
  const { set, released, carsStillSet } = facts.handbrakes;
  const { unsecuredSince } = attendanceAt(facts, now);
  return {
    set,
    released,
    carsStillSet,
    unsecuredSince: unsecuredSince === null ? null : formatInstant(unsecuredSince),
  };
}
