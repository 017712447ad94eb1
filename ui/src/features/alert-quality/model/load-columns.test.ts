import type { LoadFigures } from '@stubpost/shared';
import { describe, expect, it } from 'vitest';
import { columnsOf } from './load-columns';

const load = (histogram: number[]): LoadFigures => ({
  periods: histogram.reduce((sum, periods) => sum + periods, 0),
  alerts: 0,
  histogram,
  mean: null,
  median: null,
  ninetyFifth: null,
  most: null,
  shareInBurst: null,
});

describe('columns of the load', () => {
  it('are always 0 to 10 and more, so that two ranges can be compared', () => {
    const columns = columnsOf({ all: load([6, 2]), peak: load([]) });
    expect(columns.map(({ label }) => label)).toEqual([
      ...Array.from({ length: 11 }, (_, alerts) => String(alerts)),
      '> 10',
    ]);
    expect(columns[0]).toEqual({ label: '0', allPeriods: 6, all: 0.75, peakPeriods: 0, peak: 0 });
  });

  it('put every period of a burst into the last one', () => {
    const histogram = [...new Array<number>(11).fill(1), 2, 0, 3];
    const columns = columnsOf({ all: load(histogram), peak: load(histogram) });
    expect(columns.at(-1)).toMatchObject({ allPeriods: 5, all: 5 / 16 });
    expect(columns.reduce((sum, { allPeriods }) => sum + allPeriods, 0)).toBe(16);
  });
});
