import type { Instant } from '../lib/instant';

/** What a terminal counts as late, silent and near, and how its times are written. All durations are whole seconds. */
export interface LatenessSettings {
  /** After the departure without a running test until it is an alert. */
  runningTestSeconds: number;
  /** After the due time of the next act without any word until it is an alert. */
  noWordSeconds: number;
  /** Before the departure from which a blue signal that is still up is an alert. */
  blueSignalSeconds: number;
  /** Short by this much or more, a late departure is *Act soon* instead of *Watch*. */
  actSoonSeconds: number;
  /** Slack below this is *Tight*. */
  tightSeconds: number;
  /** Before the departure by which the engineer must be in the leaving cab; null: the rule is off. */
  engineerAboardSeconds: number | null;
  /** A planned time in the terminal's zone, without seconds: `17:24`. */
  formatTime: (instant: Instant) => string;
  /** A recorded time in the terminal's zone, with seconds: `17:24:05`. */
  formatExactTime: (instant: Instant) => string;
}

/**
 * Values a terminal has until its supervisor changes them. 20 minutes for the running test and 3 minutes without word
 * are shipped values; 6 minutes between *Watch* and *Act soon*, and 10 minutes for a blue signal, are our choice: what
 * riders notice, and what it takes to find an inspector.
 */
export const shippedLatenessSettings: Omit<LatenessSettings, 'formatTime' | 'formatExactTime'> = {
  runningTestSeconds: 1200,
  noWordSeconds: 180,
  blueSignalSeconds: 600,
  actSoonSeconds: 360,
  tightSeconds: 60,
  engineerAboardSeconds: null,
};
