import fc from 'fast-check';
import { quantile as secondOpinion } from 'simple-statistics';
import { describe, expect, it } from 'vitest';
import { quantile } from './quantile';

// Twelve gauge readings of the NIST/SEMATECH handbook, section 7.2.6.2 (percentiles); the handbook's own answers are
// for another type of quantile, so they tell the two apart. The ninth value is from memory; it moves neither figure.
const gauge = [
  95.1772, 95.1567, 95.1937, 95.1959, 95.1442, 95.061, 95.1591, 95.1195, 95.1065, 95.0925, 95.199, 95.1682,
];

describe('quantile', () => {
  it.each([
    [0.25, 3.25],
    [0.5, 5.5],
    [0.9, 9.1],
    [0.95, 9.55],
  ])('of one to ten at %d is %d by h = (n - 1)p', (probability, expected) => {
    expect(quantile([10, 9, 8, 7, 6, 5, 4, 3, 2, 1], probability)).toBeCloseTo(expected, 12);
  });

  it.each([
    [0.1, 0],
    [0.25, 45],
    [0.5, 150],
    [0.75, 330],
    [0.85, 414],
    [0.95, 537],
  ])('of eight delays at %d is %d', (probability, expected) => {
    expect(quantile([0, 0, 60, 120, 180, 300, 420, 600], probability)).toBeCloseTo(expected, 9);
  });

  it('is type 7, not the type 6 that the handbook prints (95.1981 and 95.1896)', () => {
    expect(quantile(gauge, 0.9)).toBeCloseTo(95.19568, 6);
    expect(quantile(gauge, 0.75)).toBeCloseTo(95.181325, 6);
  });

  it('of nothing is nothing, of one value that value', () => {
    expect(quantile([], 0.5)).toBeNull();
    expect(quantile([42], 0.95)).toBe(42);
  });

  it('lies between the two order statistics that a general statistics library chooses from', () => {
    fc.assert(
      fc.property(
        fc.array(fc.integer({ min: -600, max: 3600 }), { minLength: 1, maxLength: 60 }),
        fc.double({ min: 0, max: 1, noNaN: true }),
        (values, probability) => {
          const sorted = [...values].sort((a, b) => a - b);
          const ours = quantile(values, probability) ?? Number.NaN;
          const position = (sorted.length - 1) * probability;
          expect(ours).toBeGreaterThanOrEqual(sorted[Math.floor(position)] ?? Number.NaN);
          expect(ours).toBeLessThanOrEqual(sorted[Math.ceil(position)] ?? Number.NaN);
          // At 0, ½ and 1 every type agrees.
          for (const shared of [0, 0.5, 1])
            expect(quantile(values, shared)).toBeCloseTo(secondOpinion(values, shared), 9);
        },
      ),
      { seed: 20260303, numRuns: 300 },
    );
  });
});
