import { ms } from '../testing/a-wire-turn';
import { touchCounts, undoState } from './done-window';

const recordedAt = ms('17:22:41');

describe('Undo on the bar', () => {
  it.each([
    [0, { kind: 'deaf', secondsLeft: 10 }],
    [999, { kind: 'deaf', secondsLeft: 10 }],
    [1000, { kind: 'open', secondsLeft: 9 }],
    [3400, { kind: 'open', secondsLeft: 7 }],
    [9999, { kind: 'open', secondsLeft: 1 }],
    [10_000, { kind: 'gone' }],
    [-1, { kind: 'gone' }],
  ])('%i ms after the touch', (passed, expected) => {
    expect(undoState(recordedAt, recordedAt + passed)).toEqual(expected);
  });
});

describe('a touch on the bar', () => {
  const bar = { key: 'step:ends-changed', changedAt: recordedAt, byItself: true };

  it('is ignored for a second after the act changed by itself', () => {
    expect(touchCounts(bar, { downOn: null, releasedAt: recordedAt + 999 })).toBe(false);
    expect(touchCounts(bar, { downOn: bar.key, releasedAt: recordedAt + 1000 })).toBe(true);
  });

  it('is ignored however late when the thumb came down on another act', () => {
    expect(touchCounts(bar, { downOn: 'step:cab-brake-check', releasedAt: recordedAt + 5000 })).toBe(false);
  });

  it('counts at once when the person brought the change about', () => {
    expect(touchCounts({ ...bar, byItself: false }, { downOn: bar.key, releasedAt: recordedAt + 10 })).toBe(
      true,
    );
  });
});
