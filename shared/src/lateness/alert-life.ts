import { secondsBetween, type Instant } from '../lib/instant';
import type { Finding } from './finding';

/** Hold times of a late departure, in whole seconds. */
export interface AlertHoldTimes {
  /** Slack must have been below 0 for this long before it is raised. */
  raiseHoldSeconds: number;
  /** Slack from which it may clear. */
  clearSlackSeconds: number;
  /** Slack must have been enough for this long before it is cleared. */
  clearHoldSeconds: number;
}

/** 30 s below 0 to raise, 10 s at 60 s or more to clear. */
export const shippedHoldTimes: AlertHoldTimes = {
  raiseHoldSeconds: 30,
  clearSlackSeconds: 60,
  clearHoldSeconds: 10,
};

/**
 * What has to be remembered about one cause on one subject between two looks. Plain data, kept in a table, so that a
 * pause or a restart of the server loses nothing and doubles nothing.
 */
export interface AlertMemory {
  /** Whether an alert stands. */
  standing: boolean;
  /** Since when slack has been below 0 without a break; null while it is not, or an alert stands. */
  shortSince: Instant | null;
  /** Since when slack has been enough without a break; null while it is not, or no alert stands. */
  enoughSince: Instant | null;
  /** What was last told about the alert, to see whether there is news. */
  told: string | null;
}

/** The memory of a cause that was never seen. */
export const noAlertMemory: AlertMemory = {
  standing: false,
  shortSince: null,
  enoughSince: null,
  told: null,
};

/** What one look at a turn showed about one cause. */
export interface AlertObservation {
  /** The finding of `assess` for this cause; null when there is none. */
  finding: Finding | null;
  /**
   * For a late departure the slack that decides about it, from `lateSlackSeconds`. Null for every other cause, and for a turn that has
   * left, is annulled or is closed.
   */
  slackSeconds: number | null;
}

/** What to do about the alert after a look. */
export interface AlertStep {
  memory: AlertMemory;
  action: 'none' | 'raise' | 'update' | 'clear';
}

/**
 * Decides about one cause on one subject after a look at `now`. A late departure is raised when slack has been below 0
 * for 30 s and cleared when it has been 60 s or more for 10 s; in between it stands as it was told last. Every other
 * cause is raised at the first look that finds it and cleared at the first that does not; so is a late departure when
 * there is no slack any more, for then the train has left, or the turn is annulled or closed. A standing alert is
 * updated when its words change. The same look twice does nothing the second time.
 */
export function nextAlertStep(
  memory: AlertMemory,
  observation: AlertObservation,
  now: Instant,
  holds: AlertHoldTimes = shippedHoldTimes,
): AlertStep {
  const { finding, slackSeconds } = observation;
  if (slackSeconds === null)
    return finding === null ? clearOrNothing(memory) : raiseOrUpdate(memory, finding);
  return memory.standing
    ? whileStanding(memory, slackSeconds, finding, now, holds)
    : whileClear(memory, slackSeconds, finding, now, holds);
}

function clearOrNothing(memory: AlertMemory): AlertStep {
  return { memory: noAlertMemory, action: memory.standing ? 'clear' : 'none' };
}

function raiseOrUpdate(memory: AlertMemory, finding: Finding): AlertStep {
  const told = JSON.stringify(finding);
  const next: AlertMemory = { standing: true, shortSince: null, enoughSince: null, told };
  if (!memory.standing) return { memory: next, action: 'raise' };
  return { memory: next, action: told === memory.told ? 'none' : 'update' };
}

function whileClear(
  memory: AlertMemory,
  slackSeconds: number,
  finding: Finding | null,
  now: Instant,
  holds: AlertHoldTimes,
): AlertStep {
  if (slackSeconds >= 0 || finding === null) return { memory: noAlertMemory, action: 'none' };
  const shortSince = memory.shortSince ?? now;
  if (secondsBetween(shortSince, now) >= holds.raiseHoldSeconds) return raiseOrUpdate(memory, finding);
  return { memory: { ...noAlertMemory, shortSince }, action: 'none' };
}

function whileStanding(
  memory: AlertMemory,
  slackSeconds: number,
  finding: Finding | null,
  now: Instant,
  holds: AlertHoldTimes,
): AlertStep {
  if (slackSeconds >= holds.clearSlackSeconds) {
    const enoughSince = memory.enoughSince ?? now;
    if (secondsBetween(enoughSince, now) >= holds.clearHoldSeconds) return clearOrNothing(memory);
    return { memory: { ...memory, enoughSince }, action: 'none' };
  }
  if (finding === null) return { memory: { ...memory, enoughSince: null }, action: 'none' };
  return raiseOrUpdate(memory, finding);
}
