import { secondsBetween } from '../lib/instant';
import type { PastAlert } from './past-alert';
import { quantileOfSorted } from './quantile';

/** How long before the scheduled departure its alert was raised, in seconds; negative when after it. */
export interface WarningFigures {
  /** Alerts of late departures with a scheduled departure. */
  counted: number;
  /** Half of them gave at least this; quantile of type 7. */
  median: number | null;
  /** 9 in 10 gave at least this. */
  nineInTen: number | null;
  /** Raised at the scheduled departure or after it. */
  afterDeparture: number;
  /** How many gave how much, in the order of `warningEdgesMinutes`. */
  histogram: number[];
}

/**
 * Minutes of warning at which a new class of the histogram begins; the first class is everything below the first edge,
 * which is raised too late. Our choice: under 5 minutes the work of the last steps can no longer be helped.
 */
export const warningEdgesMinutes = [0, 5, 10, 15, 20, 30] as const;

/** The warning that the alerts of late departures gave. A hold gives more time than is counted here. */
export function measureWarning(alerts: readonly PastAlert[]): WarningFigures {
  const seconds = alerts
    .flatMap(({ cause, departure, raisedAt }) =>
      cause === 'late-departure' && departure !== null
        ? [secondsBetween(raisedAt, departure.scheduledAt)]
        : [],
    )
    .sort((a, b) => a - b);
  const histogram = new Array<number>(warningEdgesMinutes.length + 1).fill(0);
  for (const each of seconds) {
    const place = each <= 0 ? 0 : warningEdgesMinutes.filter((edge) => edge * 60 <= each).length;
    histogram[place] = (histogram[place] ?? 0) + 1;
  }
  return {
    counted: seconds.length,
    median: quantileOfSorted(seconds, 0.5),
    nineInTen: quantileOfSorted(seconds, 0.1),
    afterDeparture: histogram[0] ?? 0,
    histogram,
  };
}
