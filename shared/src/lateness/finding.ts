import type { Instant } from '../lib/instant';

/** Why an alert stands. One cause on one subject is one alert. */
export const ALERT_CAUSES = [
  'late-departure',
  'unsecured',
  'no-required-record',
  'running-test',
  'blue-signal',
  'no-word',
  'crew',
  'feed',
  'sweep',
] as const;
export type AlertCause = (typeof ALERT_CAUSES)[number];

/** Falling order of urgency. */
export const PRIORITIES = ['act-now', 'act-soon', 'watch'] as const;
export type Priority = (typeof PRIORITIES)[number];

/** What has become of an alert; taking and clearing are independent of one another. */
export const ALERT_STATES = ['raised', 'taken', 'set-aside', 'cleared', 'closed'] as const;
export type AlertState = (typeof ALERT_STATES)[number];

/** Something about a turn that a named person can act on in time. */
export interface Finding {
  cause: AlertCause;
  priority: Priority;
  /** What is wrong, as a fact: "Cab brake check not recorded, latest 17:24". Times in the terminal's zone are put in by the caller's formatter. */
  text: string;
  /** What to do. */
  action: string;
  /** Who acts, by role and, where known, name. */
  actor: string;
  /** By when it must be done; null when at once. */
  byWhen: Instant | null;
  /** Further facts under the same cause, one a line. */
  lines: string[];
}
