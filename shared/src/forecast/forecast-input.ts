import type { TurnFacts } from '../turn/facts';
import type { ForecastInput } from './forecast';

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
