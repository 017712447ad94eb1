import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import {
  countByPeriod,
  findBursts,
  loadPeriodSeconds,
  publishedBurstRule,
  spansByPeriod,
} from './alert-load';

const minutes = 60_000;
const noon = Date.parse('2026-03-03T17:00:00Z');

/**
 * Starts above 10 in 10 minutes, ends below 5 in 10 minutes: EEMUA 191 and ISA-18.2, second-hand (as others quote
 * them). The first two rows are derived from those two numbers; seconds from the beginning of the first period.
 */
const bursts: ReadonlyArray<[why: string, counts: number[], seconds: [from: number, to: number][]]> = [
  ['eleven begin it, two end it', [11, 6, 2], [[0, 1200]]],
  ['ten begin none', [10, 10, 10], []],
  ['five keep it going, four end it', [0, 12, 5, 5, 4, 9], [[600, 2400]]],
  ['between the limits none begins', [9, 8, 7, 6, 5], []],
  [
    'a second one begins anew',
    [11, 0, 11, 4],
    [
      [0, 600],
      [1200, 1800],
    ],
  ],
  ['it may last to the end of what was counted', [3, 30, 5], [[600, 1800]]],
  ['nothing counted', [], []],
];

describe('bursts of alerts', () => {
  it.each(bursts)('%s', (_why, counts, expected) => {
    const found = findBursts(counts).map(({ firstPeriod, endPeriod }) => [
      firstPeriod * loadPeriodSeconds,
      endPeriod * loadPeriodSeconds,
    ]);
    expect(found).toEqual(expected);
  });

  it('say how many alerts they held and whether they go on', () => {
    expect(findBursts([11, 6, 2, 40])).toEqual([
      { firstPeriod: 0, endPeriod: 2, alerts: 17, isOpen: false },
      { firstPeriod: 3, endPeriod: 4, alerts: 40, isOpen: true },
    ]);
  });

  it('begin with a period above the one limit and hold none below the other', () => {
    fc.assert(
      fc.property(fc.array(fc.nat({ max: 15 }), { maxLength: 60 }), (counts) => {
        const covered = new Set<number>();
        for (const { firstPeriod, endPeriod, alerts } of findBursts(counts)) {
          const inside = counts.slice(firstPeriod, endPeriod);
          expect(inside[0]).toBeGreaterThan(publishedBurstRule.startsAbove);
          expect(Math.min(...inside)).toBeGreaterThanOrEqual(publishedBurstRule.endsBelow);
          expect(inside.reduce((sum, count) => sum + count, 0)).toBe(alerts);
          for (let period = firstPeriod; period < endPeriod; period += 1) covered.add(period);
        }
        counts.forEach((count, period) => {
          if (count > publishedBurstRule.startsAbove) expect(covered.has(period)).toBe(true);
        });
      }),
    );
  });
});

describe('counting by periods of 10 minutes', () => {
  const range = { from: noon, to: noon + 25 * minutes };

  it('takes each instant into one half-open period and leaves out what lies outside', () => {
    const at = [-1, 0, 9.99, 10, 20, 24.9, 25].map((minute) => noon + minute * minutes);
    expect(countByPeriod(at, range)).toEqual([2, 1, 2]);
  });

  it('takes spans into every period they touch', () => {
    const spans = [
      { from: noon - 60 * minutes, to: noon + 10 * minutes },
      { from: noon + 9 * minutes, to: noon + 10.5 * minutes },
      { from: noon + 24 * minutes, to: noon + 90 * minutes },
      { from: noon + 5 * minutes, to: noon + 5 * minutes },
    ];
    expect(spansByPeriod(spans, range)).toEqual([2, 1, 1]);
  });

  it('counts nothing in an empty range', () => {
    expect(countByPeriod([noon], { from: noon, to: noon })).toEqual([]);
    expect(spansByPeriod([{ from: noon, to: noon + 1 }], { from: noon, to: noon })).toEqual([]);
  });
});
