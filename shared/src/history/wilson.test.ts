import { describe, expect, it } from 'vitest';
import { wilsonInterval } from './wilson';

// Newcombe, Statistics in Medicine 17 (1998) 857-872, table I, method 3; the last rows recomputed from its formula.
const published: ReadonlyArray<[number, number, number, number]> = [
  [81, 263, 0.2553, 0.3662],
  [15, 148, 0.0624, 0.1605],
  [0, 20, 0, 0.1611],
  [1, 29, 0.0061, 0.1718],
  [0, 10, 0, 0.2775],
  [10, 10, 0.7225, 1],
  [97, 100, 0.9155, 0.9897],
  [9, 10, 0.5958, 0.9821],
  [9, 14, 0.3876, 0.8366],
];

describe('wilsonInterval', () => {
  it.each(published)('of %d in %d is %d to %d', (successes, counted, low, high) => {
    const interval = wilsonInterval(successes, counted);
    expect(Math.abs((interval?.low ?? -1) - low)).toBeLessThanOrEqual(5e-5);
    expect(Math.abs((interval?.high ?? -1) - high)).toBeLessThanOrEqual(5e-5);
    expect(interval?.confidence).toBe(0.95);
  });

  it('of nothing counted is no interval', () => {
    expect(wilsonInterval(0, 0)).toBeNull();
  });

  it('solves the equation it comes from: both ends lie z standard errors from the share', () => {
    for (const [successes, counted] of [
      [3, 40],
      [700, 740],
    ] as const) {
      const interval = wilsonInterval(successes, counted);
      for (const end of [interval?.low ?? 0, interval?.high ?? 0]) {
        const distance = Math.abs(successes / counted - end) / Math.sqrt((end * (1 - end)) / counted);
        expect(distance).toBeCloseTo(1.959963984540054, 9);
      }
    }
  });
});
