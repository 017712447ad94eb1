import type { Priority } from '../lateness/finding';

/**
 * Published targets for the alerts of one desk. Source: EEMUA 191 and ISA-18.2, second-hand: as others quote them.
 * ISA-18.2 of 2016 is said to have dropped the count per day and to warn against means, so the distribution is shown
 * beside every mean.
 */
export const publishedAlertTargets = {
  /** Mean of alerts per 10 minutes: what is acceptable, and the most that is manageable. */
  meanAcceptable: 1,
  meanManageable: 2,
  /** Most alerts in any 10 minutes. */
  mostInPeriod: 10,
  /** Share of 10-minute periods in burst, below. */
  shareInBurst: 0.01,
  /** Share of all alerts that come from the ten busiest sources, at most. */
  topTenShare: 0.05,
  /** Alerts that come this often within this many seconds chatter; there should be none. */
  chatterTimes: 3,
  chatterSeconds: 60,
  /** An alert that stands longer is stale: few, and explained. */
  staleHours: 24,
} as const;

/** About 5 in 100 alerts of the highest priority, 15 of the middle, 80 of the lowest. Same source. */
export const publishedPriorityMix: Readonly<Record<Priority, number>> = {
  'act-now': 0.05,
  'act-soon': 0.15,
  watch: 0.8,
};

/** What we ask of our own rules at peak, in alerts per 10 minutes and desk. Our choice. */
export const ownLoadGoals = { median: 1, ninetyFifth: 2 } as const;
