import {
  addSeconds,
  assessedTurnOfWire,
  forecastOfWire,
  healthOf,
  inboundHorizonSeconds,
  stepStatesOfWire,
  stepsFor,
  type Forecast,
  type Instant,
  type LatenessSettings,
  type PlanStep,
  type StepPlan,
  type StepState,
  type TurnState,
  type WireTurn,
} from '@stubpost/shared';
import { readTurn, type StepNow, type TurnNow } from './turn-now';

const read = new WeakMap<WireTurn, TurnNow>();

/** A turn as the service gave it; read once for each answer, since most turns do not change from second to second. */
function readOnce(wire: WireTurn): TurnNow {
  const known = read.get(wire);
  if (known !== undefined) return known;
  const turn = readTurn(wire);
  read.set(wire, turn);
  return turn;
}

/** What a turn is worked out with, beside its own facts. */
export interface TurnContext {
  /** The plan of the turn; while it is not there the service's own figures stand. */
  plan: Pick<StepPlan, 'steps'> | undefined;
  settings: LatenessSettings;
}

/**
 * A turn as it stands at `now`: due times, forecast, slack, step states and health worked out by the same functions as
 * on the service, from the facts on the wire and the turn's plan.
 */
export function turnAt(wire: WireTurn, { plan, settings }: TurnContext, now: Instant): TurnNow {
  const turn = readOnce(wire);
  if (plan === undefined) return turn;
  const forecast = forecastOfWire(wire, plan.steps, now);
  const assessed = assessedTurnOfWire(wire, plan.steps, forecast);
  return {
    ...turn,
    state: stateAt(turn, now),
    health: healthOf(assessed, settings, now),
    steps: liveSteps(
      turn,
      stepsFor(plan.steps, wire),
      forecast,
      stepStatesOfWire(wire, plan.steps, forecast, now),
    ),
    readyAt: forecast.readyAt,
    expectedDepartureAt: turn.departedAt === null ? forecast.expectedDepartureAt : turn.expectedDepartureAt,
    slackSeconds: turn.annulled === null ? forecast.slackSeconds : null,
    criticalSteps: forecast.criticalSteps,
  };
}

function liveSteps(
  turn: TurnNow,
  planned: readonly PlanStep[],
  forecast: Forecast,
  states: Readonly<Record<string, StepState>>,
): StepNow[] {
  return turn.steps.map((step) => {
    const place = planned.findIndex((one) => one.key === step.key);
    const [plan, times] = [planned[place], forecast.steps[place]];
    if (plan === undefined || times === undefined) return step;
    return {
      ...step,
      dueAt: times.dueAt,
      plannedDueAt: plannedDue(turn, plan),
      latestFinishAt: times.latestFinishAt,
      startAt: step.doneAt === null ? times.startAt : null,
      finishAt: step.doneAt ?? times.finishAt,
      state: states[step.key] ?? step.state,
    };
  });
}

function plannedDue(turn: TurnNow, planned: PlanStep): Instant | null {
  const anchor = planned.anchor === 'arrival' ? turn.scheduledArrivalAt : turn.scheduledDepartureAt;
  return anchor === null ? null : addSeconds(anchor, planned.offsetSeconds);
}

/** A turn comes into view by the clock alone; every later word of its life comes from an entry. */
function stateAt(turn: TurnNow, now: Instant): TurnState {
  if (turn.state !== 'scheduled' || turn.kind === 'first-out') return turn.state;
  const arrives = Math.max(turn.scheduledArrivalAt ?? -Infinity, turn.expectedArrivalAt ?? -Infinity);
  return arrives !== -Infinity && now >= addSeconds(arrives, -inboundHorizonSeconds)
    ? 'inbound'
    : 'scheduled';
}
