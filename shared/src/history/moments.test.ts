import fc from 'fast-check';
import { mean as secondMean, sampleStandardDeviation } from 'simple-statistics';
import { describe, expect, it } from 'vitest';
import { mean, standardDeviation } from './moments';

const alternating = (middle: number): number[] => [
  middle,
  ...Array.from({ length: 1000 }, (_, index) => middle + (index % 2 === 0 ? -0.1 : 0.1)),
];

// NIST Statistical Reference Datasets, univariate summary statistics, certified values.
const certified: ReadonlyArray<[string, number[], number, number, number]> = [
  ['NumAcc1', [10_000_001, 10_000_003, 10_000_002], 10_000_002, 1, 1e-9],
  ['NumAcc2', alternating(1.2), 1.2, 0.1, 1e-9],
  ['NumAcc3', alternating(1_000_000.2), 1_000_000.2, 0.1, 1e-7],
  ['NumAcc4', alternating(10_000_000.2), 10_000_000.2, 0.1, 1e-7],
];

describe('mean and standard deviation', () => {
  it.each(certified)(
    'agree with the certified values of %s',
    (_, values, expectedMean, expectedSd, tolerance) => {
      expect(Math.abs((mean(values) ?? 0) / expectedMean - 1)).toBeLessThan(1e-12);
      expect(Math.abs((standardDeviation(values) ?? 0) / expectedSd - 1)).toBeLessThan(tolerance);
    },
  );

  it('agree with a general statistics library on random delays', () => {
    fc.assert(
      fc.property(
        fc.array(fc.integer({ min: -900, max: 7200 }), { minLength: 2, maxLength: 80 }),
        (values) => {
          expect(mean(values)).toBeCloseTo(secondMean(values), 8);
          expect(standardDeviation(values)).toBeCloseTo(sampleStandardDeviation(values), 8);
        },
      ),
      { seed: 20260304, numRuns: 200 },
    );
  });

  it('of too few values are none', () => {
    expect(mean([])).toBeNull();
    expect(standardDeviation([3])).toBeNull();
  });
});
