import {
  type AssessedTurn,
  type Forecast,
  type Health,
  type Instant,
  type LatenessSettings,
  type StepState,
  assessedTurnOf,
  forecastInputOf,
  forecastTurn,
  healthOf,
  stepStateOf,
} from '@stubpost/shared';
import type { TurnFile } from './turn-file';

/** All about a turn that the passing of time changes, at one moment. */
export interface TurnMoment {
  now: Instant;
  forecast: Forecast;
  assessed: AssessedTurn;
  health: Health;
  /** In the order of the steps. */
  stepStates: readonly StepState[];
}

/** Works out what a turn is like at a moment, under the rules of its terminal. */
export function turnMomentOf({ facts }: TurnFile, rules: LatenessSettings, now: Instant): TurnMoment {
  const forecast = forecastTurn(forecastInputOf(facts), now);
  const assessed = assessedTurnOf(facts, forecast, now);
  const stepStates = facts.steps.map((step, index) => {
    const times = forecast.steps[index];
    if (times === undefined) throw new Error(`step ${step.key} has no forecast`);
    return stepStateOf(facts, step, times, now);
  });
  return { now, forecast, assessed, health: healthOf(assessed, rules, now), stepStates };
}

/** A text that is the same for two moments of one file exactly when the turn looks the same at both. */
export function lookOf({ forecast, assessed, health, stepStates }: TurnMoment): string {
  const { readyAt, expectedDepartureAt, slackSeconds, criticalSteps, steps } = forecast;
  const { state, unsecuredSince } = assessed;
  const figures = [state, health, unsecuredSince, readyAt, expectedDepartureAt, slackSeconds, criticalSteps];
  const times = steps.map((step) => `${step.dueAt} ${step.latestFinishAt} ${step.finishAt}`);
  return [...figures, ...times, ...stepStates].join('|');
}
