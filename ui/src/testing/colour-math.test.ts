import { describe, expect, test } from 'vitest';
import { ciede2000, contrast, parseHex, seenBy, toLab } from './colour-math';

describe('the sums of the colour check', () => {
  // Pairs 1, 7, 13, 17, 24 and 34 of the supplementary data of Sharma, Wu and Dalal.
  test.each([
    [[50, 2.6772, -79.7751], [50, 0, -82.7485], 2.0425],
    [[50, 0, 0], [50, -1, 2], 2.3669],
    [[50, -0.001, 2.49], [50, 0.0011, -2.49], 4.7461],
    [[50, 2.5, 0], [73, 25, -18], 27.1492],
    [[50, 2.5, 0], [50, 3.2592, 0.335], 1.0],
    [[2.0776, 0.0795, -1.135], [0.9033, -0.0636, -0.5514], 0.9082],
  ] as const)('CIEDE2000 of %j and %j is %f', (one, other, distance) => {
    expect(ciede2000(one, other)).toBeCloseTo(distance, 4);
    expect(ciede2000(other, one)).toBeCloseTo(distance, 4);
  });

  test('contrast of black on white is 21, of a colour on itself 1', () => {
    expect(contrast(parseHex('#000'), parseHex('#fff'))).toBeCloseTo(21, 5);
    expect(contrast(parseHex('#5b3a78'), parseHex('#5b3a78'))).toBe(1);
  });

  test('L*a*b* of sRGB red is the published one', () => {
    const [l, a, b] = toLab(parseHex('#ff0000'));
    expect([l, a, b].map((value) => Math.round(value * 10) / 10)).toEqual([53.2, 80.1, 67.2]);
  });

  test('grey stays grey for everybody', () => {
    for (const vision of ['protan', 'deutan', 'tritan'] as const) {
      for (const channel of seenBy(vision, parseHex('#808080'))) expect(channel).toBeCloseTo(128 / 255, 2);
    }
  });
});
