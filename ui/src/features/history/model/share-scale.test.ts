import { describe, expect, it } from 'vitest';
import { placeOnScale, shareScale } from './share-scale';

describe('scale of shares', () => {
  it('just holds the intervals, in few round steps', () => {
    expect(shareScale([{ low: 0.803, high: 0.986 }])).toEqual({
      from: 80,
      to: 100,
      ticks: [80, 85, 90, 95, 100],
    });
    expect(shareScale([{ low: 0.876, high: 0.948 }])).toEqual({
      from: 86,
      to: 96,
      ticks: [86, 88, 90, 92, 94, 96],
    });
  });

  it('never leaves 0 to 100 and has room where every share is the same', () => {
    expect(shareScale([{ low: 1, high: 1 }])).toEqual({ from: 99, to: 100, ticks: [99, 100] });
    expect(shareScale([])).toEqual({ from: 0, to: 100, ticks: [0, 20, 40, 60, 80, 100] });
  });

  it('places its own ends at 0 and 1', () => {
    const scale = shareScale([{ low: 0.7, high: 0.95 }]);
    expect(placeOnScale(scale.from / 100, scale)).toBe(0);
    expect(placeOnScale(scale.to / 100, scale)).toBe(1);
  });
});
