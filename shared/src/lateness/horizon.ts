import { addSeconds, secondsBetween, type Instant } from '../lib/instant';
import { firstOutHorizonSeconds, inboundHorizonSeconds } from '../turn/life';
import type { AssessedTurn } from './assessed-turn';

/**
 * Whether a turn is assessed at `now`: from 30 min before its arrival as scheduled or expected (a first-out: from
 * 60 min before its departure) until it is *Closed*. Annulled and practice turns never are.
 */
export function isAssessed(turn: AssessedTurn, now: Instant): boolean {
  if (turn.practice || turn.state === 'annulled' || turn.state === 'closed') return false;
  if (turn.arrivalAt !== null || turn.departureAt !== null) return true;
  const { departureAnchorAt } = turn.forecast;
  const arrives = arrivalDueAt(turn);
  if (arrives !== null) return now >= addSeconds(arrives, -inboundHorizonSeconds);
  return departureAnchorAt !== null && now >= addSeconds(departureAnchorAt, -firstOutHorizonSeconds);
}

/** When the train is to come in: scheduled or expected, whichever is later; null for a first-out. */
export function arrivalDueAt(turn: AssessedTurn): Instant | null {
  if (turn.kind === 'first-out') return null;
  const { scheduledArrivalAt, expectedArrivalAt } = turn;
  if (scheduledArrivalAt === null || expectedArrivalAt === null)
    return scheduledArrivalAt ?? expectedArrivalAt;
  return Math.max(scheduledArrivalAt, expectedArrivalAt);
}

/**
 * How much shorter than the plan's shortest turn the scheduled layover is, in seconds; 0 where it is long enough or
 * there is no layover. A turn of 480 s under the default plan is 40 s short by design.
 */
export function shortByDesignSeconds(
  turn: Pick<AssessedTurn, 'kind' | 'scheduledArrivalAt' | 'scheduledDepartureAt' | 'shortestTurnSeconds'>,
): number {
  const { kind, scheduledArrivalAt, scheduledDepartureAt } = turn;
  if (kind !== 'turn' || scheduledArrivalAt === null || scheduledDepartureAt === null) return 0;
  return Math.max(0, turn.shortestTurnSeconds - secondsBetween(scheduledArrivalAt, scheduledDepartureAt));
}

/**
 * The slack that decides about a late departure: that of the forecast, plus what is missing by design, so that a turn
 * that is short on paper raises only when it is worse than its own schedule. Null when nothing can be late any more.
 */
export function lateSlackSeconds(turn: AssessedTurn): number | null {
  const { slackSeconds } = turn.forecast;
  return slackSeconds === null ? null : slackSeconds + shortByDesignSeconds(turn);
}
