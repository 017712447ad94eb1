import type { Burst } from '../lateness/alert-load';
import { mean } from './moments';
import { quantileOfSorted } from './quantile';

/** How many alerts came in the periods of 10 minutes of a desk. */
export interface LoadFigures {
  /** Periods counted. */
  periods: number;
  alerts: number;
  /** How many periods had 0, 1, 2 … alerts, up to the most there were. */
  histogram: number[];
  /** Alerts per period; null without periods. Quantiles are of type 7. */
  mean: number | null;
  median: number | null;
  ninetyFifth: number | null;
  most: number | null;
  /** Share of the periods that lie in a burst; null without periods. */
  shareInBurst: number | null;
}

/** The load of a desk over all of its watched periods, and over those of its peak. */
export interface DeskLoad {
  all: LoadFigures;
  peak: LoadFigures;
  /** A period belongs to the peak from this many turns on hand on; null without watched periods. */
  peakFromTurns: number | null;
}

/** What a desk had in each period of 10 minutes, by the same index. */
export interface DeskPeriods {
  /** Alerts raised. */
  alerts: readonly number[];
  /** Turns that stood at the terminal, or should have, while they were watched. */
  turnsOnHand: readonly number[];
  bursts: readonly Burst[];
}

/** Peak periods are those with as many turns on hand as the busiest quarter has. Our choice. */
const peakQuantile = 0.75;

/**
 * The load of a desk. Only watched periods count, those with a turn on hand or an alert: a desk without trains is no
 * proof of good rules. The peak is made of the periods with at least as many turns on hand as the 75th percentile of
 * the watched ones (type 7).
 */
export function measureLoad(periods: DeskPeriods): DeskLoad {
  const { alerts, turnsOnHand, bursts } = periods;
  const inBurst = new Set<number>();
  for (const { firstPeriod, endPeriod } of bursts) {
    for (let period = firstPeriod; period < endPeriod; period += 1) inBurst.add(period);
  }
  const watched = alerts
    .map((count, period) => ({
      count,
      turns: turnsOnHand[period] ?? 0,
      inBurst: inBurst.has(period),
    }))
    .filter(({ count, turns }) => count > 0 || turns > 0);
  const turns = watched.map((period) => period.turns).sort((a, b) => a - b);
  const peakFromTurns = quantileOfSorted(turns, peakQuantile);
  const peak = peakFromTurns === null ? [] : watched.filter((period) => period.turns >= peakFromTurns);
  return { all: figuresOf(watched), peak: figuresOf(peak), peakFromTurns };
}

function figuresOf(periods: readonly { count: number; inBurst: boolean }[]): LoadFigures {
  const counts = periods.map(({ count }) => count).sort((a, b) => a - b);
  const most = counts.at(-1) ?? null;
  const histogram = new Array<number>(most === null ? 0 : most + 1).fill(0);
  for (const count of counts) histogram[count] = (histogram[count] ?? 0) + 1;
  return {
    periods: counts.length,
    alerts: counts.reduce((sum, count) => sum + count, 0),
    histogram,
    mean: mean(counts),
    median: quantileOfSorted(counts, 0.5),
    ninetyFifth: quantileOfSorted(counts, 0.95),
    most,
    shareInBurst:
      counts.length === 0 ? null : periods.filter(({ inBurst }) => inBurst).length / counts.length,
  };
}
