import { addSeconds, secondsBetween, type Instant } from '../lib/instant';

/** Where the lateness of one departure came from; whole or fractional seconds, none negative. */
export interface DelaySplit {
  delaySeconds: number;
  /** Brought in by the late arrival: the turn could not have been shorter. */
  inheritedSeconds: number;
  /** Added while standing here. */
  causedHereSeconds: number;
  /** Late arrival that the turn made good. */
  recoveredSeconds: number;
  /** How much too soon it left; never set off against lateness. */
  earlySeconds: number;
}

/** What the split looks at. `minimumTurnSeconds` is the plan's longest path at typical durations, as in force that day. */
export interface DelayQuestion {
  scheduledDepartureAt: Instant;
  actualDepartureAt: Instant;
  /** Null for a first train out: nothing can be inherited. */
  actualArrivalAt: Instant | null;
  minimumTurnSeconds: number;
}

/**
 * Splits a departure's delay into inherited and caused here, exactly: with d = max(0, actual − scheduled) and
 * R = max(scheduled, arrival + minimum turn), inherited = min(d, R − scheduled), caused here = d − inherited,
 * recovered = max(0, (R − scheduled) − d). Our own definition.
 *
 * Arrived 08:14, due out 08:20, minimum turn 12 min, left 08:29: 9 min late, 6 inherited, 3 caused here.
 */
export function splitDelay(question: DelayQuestion): DelaySplit {
  const lateness = secondsBetween(question.scheduledDepartureAt, question.actualDepartureAt);
  const delaySeconds = Math.max(0, lateness);
  const earliest =
    question.actualArrivalAt === null
      ? question.scheduledDepartureAt
      : Math.max(
          question.scheduledDepartureAt,
          addSeconds(question.actualArrivalAt, question.minimumTurnSeconds),
        );
  const unavoidable = secondsBetween(question.scheduledDepartureAt, earliest);
  const inheritedSeconds = Math.min(delaySeconds, unavoidable);
  return {
    delaySeconds,
    inheritedSeconds,
    causedHereSeconds: delaySeconds - inheritedSeconds,
    recoveredSeconds: Math.max(0, unavoidable - delaySeconds),
    earlySeconds: Math.max(0, -lateness),
  };
}
