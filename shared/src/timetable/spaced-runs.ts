import type { DraftWindow } from './draft';

/** Runs that one trip may be multiplied into: one a minute for a day and more is no railroad (our choice). */
export const mostRunsOfOneTrip = 2_000;

/**
 * Starts, in seconds of the service day, of the runs of a trip with exact spacing: from each window's beginning on,
 * as long as they are before its end. Null when they are more than a railroad can mean.
 *
 * A window from 6:00 to 7:00 every 1,800 s gives 6:00 and 6:30.
 */
export function spacedStarts(windows: readonly DraftWindow[]): number[] | null {
  const starts = new Set<number>();
  for (const window of windows) {
    for (let start = window.fromSeconds; start < window.toSeconds; start += window.headwaySeconds) {
      starts.add(start);
      if (starts.size > mostRunsOfOneTrip) return null;
    }
  }
  return [...starts].sort((one, other) => one - other);
}
