import type { LoadFigures } from '@stubpost/shared';
import { describe, expect, it } from 'vitest';
import { yardsticksOf, type MeasuredDesk } from './yardsticks';

const load = (parts: Partial<LoadFigures>): LoadFigures => ({
  periods: 300,
  alerts: 60,
  histogram: [240, 60],
  mean: 0.2,
  median: 0,
  ninetyFifth: 1,
  most: 1,
  shareInBurst: 0,
  ...parts,
});

const asked = (parts: Partial<MeasuredDesk> = {}): MeasuredDesk => ({
  alerts: 60,
  load: { all: load({}), peak: load({}) },
  sources: { sourceCount: 40, share: 0.05 },
  stale: 0,
  repeaters: { chattering: 0, cameBack: 0, fleeting: 0 },
  ...parts,
});
const verdicts = (parts: Partial<MeasuredDesk> = {}): (boolean | null)[] =>
  yardsticksOf(asked(parts)).map(({ isMet }) => isMet);

describe('the yardsticks of a desk', () => {
  it('are all met at the very limit', () => {
    const peak = load({ median: 1, ninetyFifth: 2, mean: 2 });
    const all = load({ most: 10, shareInBurst: 0.0099 });
    expect(verdicts({ load: { all, peak } })).toEqual(new Array(10).fill(true));
  });

  it('are missed just past it', () => {
    const peak = load({ median: 1.5, ninetyFifth: 2.05, mean: 2.01 });
    const all = load({ most: 11, shareInBurst: 0.01 });
    expect(
      verdicts({
        load: { all, peak },
        sources: { sourceCount: 40, share: 0.051 },
        repeaters: { chattering: 1, cameBack: 1, fleeting: 1 },
      }),
    ).toEqual([false, false, false, false, false, false, true, false, false, false]);
  });

  it('say nothing of few periods, of ten sources or fewer, and of what only has to be explained', () => {
    const few = load({ periods: 29, median: 4, most: 11, shareInBurst: 1 });
    expect(verdicts({ load: { all: few, peak: few } }).slice(0, 5)).toEqual(new Array(5).fill(null));
    expect(verdicts({ sources: { sourceCount: 10, share: 1 } })[5]).toBeNull();
    expect(verdicts({ alerts: 29 })[5]).toBeNull();
    expect(verdicts({ stale: 3 })[6]).toBeNull();
    expect(verdicts({ alerts: 0 }).slice(7)).toEqual([null, null, null]);
  });
});
