import {
  addSeconds,
  forecastTurn,
  secondsBetween,
  shortestTurnSeconds,
  type Instant,
  type PlanStep,
} from '@stubpost/shared';

/** Latest finish of one step, in seconds from the departure; negative before it. */
export interface LatestFinish {
  key: string;
  secondsFromDeparture: number;
}

/** What a plan comes to at typical durations. */
export interface PlanFigures {
  /** The shortest turn, arrival to departure. */
  shortestSeconds: number;
  /** In the order of the steps; null while the steps wait for one another in a circle. */
  latestFinishes: LatestFinish[] | null;
}

/** Any departure and an arrival well before it: latest finishes do not depend on either. */
const departureAt: Instant = 1_000_000_000_000;
const hour = 3600;

/** The figures of a plan, by the core's own sums: shortest turn and backward pass. */
export function planFigures(steps: readonly PlanStep[], hasProblems: boolean): PlanFigures {
  const shortestSeconds = shortestTurnSeconds(steps);
  if (hasProblems) return { shortestSeconds, latestFinishes: null };
  const arrivalAt = addSeconds(departureAt, -4 * hour);
  const forecast = forecastTurn(
    {
      kind: 'turn',
      steps,
      scheduledArrivalAt: arrivalAt,
      expectedArrivalAt: null,
      actualArrivalAt: arrivalAt,
      scheduledDepartureAt: departureAt,
      heldUntil: null,
      actualDepartureAt: null,
      doneAt: {},
    },
    arrivalAt,
  );
  const latestFinishes = forecast.steps.map(({ key, latestFinishAt }) => ({
    key,
    secondsFromDeparture: secondsBetween(departureAt, latestFinishAt),
  }));
  return { shortestSeconds, latestFinishes };
}
