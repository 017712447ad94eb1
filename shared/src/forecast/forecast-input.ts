import type { Instant } from '../lib/instant';
import type { PlanStep } from '../plan/step-plan';
import type { TurnFacts } from '../turn/facts';
import type { TurnKind } from '../turn/turn';

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

/** What the forecast needs from the facts of a turn. */
export function forecastInputOf(facts: TurnFacts): ForecastInput {
  const { planned } = facts;
  return {
    kind: planned.kind,
    steps: facts.steps,
    scheduledArrivalAt: planned.scheduledArrivalAt,
    expectedArrivalAt: facts.expectedArrivalAt,
    actualArrivalAt: facts.arrivalAt,
    scheduledDepartureAt: planned.scheduledDepartureAt,
    heldUntil: facts.heldUntil,
    actualDepartureAt: facts.departureAt,
    doneAt: facts.doneAt,
  };
}
