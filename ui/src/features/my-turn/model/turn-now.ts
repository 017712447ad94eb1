import {
  assessedTurnOfWire,
  forecastOfWire,
  formatInstant,
  healthOf,
  stepStatesOfWire,
  type Instant,
  type LatenessSettings,
  type PlanStep,
  type WireTurn,
} from '@stubpost/shared';

const text = (at: Instant | null): string | null => (at === null ? null : formatInstant(at));

/**
 * The turn with its times, step states, forecast and health of this second, all by the core's own sums. `planSteps`
 * are those of the whole plan.
 */
export function turnAt(
  turn: WireTurn,
  planSteps: readonly PlanStep[],
  settings: LatenessSettings,
  now: Instant,
): WireTurn {
  const forecast = forecastOfWire(turn, planSteps, now);
  const states = stepStatesOfWire(turn, planSteps, forecast, now);
  const times = new Map(forecast.steps.map((each) => [each.key, each]));
  return {
    ...turn,
    health: healthOf(assessedTurnOfWire(turn, planSteps, forecast), settings, now),
    steps: turn.steps.map((step) => {
      const own = times.get(step.key);
      if (own === undefined) return step;
      const { dueAt, latestFinishAt, finishAt } = own;
      return {
        ...step,
        dueAt: text(dueAt),
        latestFinishAt: text(latestFinishAt),
        forecastFinishAt: text(finishAt),
        state: states[step.key] ?? step.state,
      };
    }),
    forecast: {
      ...turn.forecast,
      readyAt: text(forecast.readyAt),
      slackSeconds: forecast.slackSeconds,
      criticalSteps: [...forecast.criticalSteps],
    },
  };
}
