import type { TerminalThresholds } from './terminals';

/**
 * Values a terminal has until its supervisor changes them. The running test's 20 minutes and the 59 seconds are
 * shipped values that every railroad sets for itself; the rest is our choice.
 */
export const shippedThresholds: TerminalThresholds = {
  onTimeSeconds: 59,
  onTimeInclusive: true,
  runningTestMinutes: 20,
  noWordMinutes: 3,
  raiseHoldSeconds: 30,
  clearHoldSeconds: 10,
  clearSlackSeconds: 60,
};
