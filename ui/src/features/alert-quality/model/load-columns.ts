import { publishedBurstRule, type LoadFigures, type WireAlertQuality } from '@stubpost/shared';

/** One column of the histogram of load: a number of alerts in 10 minutes, or everything above the last one. */
export interface LoadColumn {
  label: string;
  /** How many periods had it, and their share of all of them, 0 to 1. */
  allPeriods: number;
  all: number;
  peakPeriods: number;
  peak: number;
}

const lastSingle = publishedBurstRule.startsAbove;

function periodsAt({ histogram }: LoadFigures, alerts: number): number {
  if (alerts <= lastSingle) return histogram[alerts] ?? 0;
  return histogram.slice(alerts).reduce((sum, periods) => sum + periods, 0);
}

/** Columns 0 to 10 and "more": always the same, so that the shape of two ranges can be compared. */
export function columnsOf({ all, peak }: Pick<WireAlertQuality['load'], 'all' | 'peak'>): LoadColumn[] {
  const share = (periods: number, of: LoadFigures): number => (of.periods === 0 ? 0 : periods / of.periods);
  return Array.from({ length: lastSingle + 2 }, (_, alerts) => {
    const allPeriods = periodsAt(all, alerts);
    const peakPeriods = periodsAt(peak, alerts);
    return {
      label: alerts > lastSingle ? `> ${lastSingle}` : String(alerts),
      allPeriods,
      all: share(allPeriods, all),
      peakPeriods,
      peak: share(peakPeriods, peak),
    };
  });
}
