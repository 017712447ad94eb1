/** A scale for shares in percent that need not begin at 0 because it carries points, never bars. */
export interface ShareScale {
  from: number;
  to: number;
  /** Percentages with a line and a label. */
  ticks: number[];
}

const steps = [1, 2, 5, 10, 20, 25];
const mostTicks = 6;

/**
 * The scale that just holds all interval ends (shares 0 to 1): at most six steps of 1, 2, 5, 10, 20 or 25 points,
 * never past 0 or 100. Without any value 0 to 100.
 */
export function shareScale(intervals: ReadonlyArray<{ low: number; high: number }>): ShareScale {
  const low = intervals.length === 0 ? 0 : Math.min(...intervals.map((interval) => interval.low)) * 100;
  const high = intervals.length === 0 ? 100 : Math.max(...intervals.map((interval) => interval.high)) * 100;
  for (const step of steps) {
    const to = Math.min(100, Math.max(Math.ceil(high / step), Math.floor(low / step) + 1) * step);
    const from = Math.max(0, Math.min(Math.floor(low / step) * step, to - step));
    if ((to - from) / step <= mostTicks - 1 || step === steps.at(-1)) {
      const count = Math.round((to - from) / step);
      return {
        from,
        to,
        ticks: Array.from({ length: count + 1 }, (_, index) => Math.min(100, from + index * step)),
      };
    }
  }
  return { from: 0, to: 100, ticks: [0, 25, 50, 75, 100] };
}

/** Where a share of 0 to 1 lies on the scale, 0 at its beginning and 1 at its end. */
export function placeOnScale(share: number, scale: ShareScale): number {
  return (share * 100 - scale.from) / (scale.to - scale.from);
}
