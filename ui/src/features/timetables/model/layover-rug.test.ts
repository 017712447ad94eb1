import { describe, expect, it } from 'vitest';
import { mostTurnsInAMinute, rugHeight, rugStrokes, rugWidth, rugWords } from './layover-rug';

describe('the rug of layovers', () => {
  it('has a stroke a minute, as high as turns stand so long', () => {
    const strokes = rugStrokes(
      [
        { minutes: 15, turns: 1 },
        { minutes: 30, turns: 3 },
      ],
      3,
    );
    expect(strokes).toEqual([
      { x: rugWidth / 4, height: 4 },
      { x: rugWidth / 2, height: rugHeight },
    ]);
  });

  it('gathers what is longer than its axis at the end', () => {
    const strokes = rugStrokes(
      [
        { minutes: 60, turns: 1 },
        { minutes: 300, turns: 1 },
      ],
      2,
    );
    expect(strokes).toEqual([{ x: rugWidth, height: rugHeight }]);
  });

  it('is measured by the station with most turns in a minute', () => {
    expect(
      mostTurnsInAMinute([{ layovers: [{ turns: 2 }] }, { layovers: [{ turns: 7 }, { turns: 1 }] }]),
    ).toBe(7);
    expect(mostTurnsInAMinute([])).toBe(1);
  });

  it.each([
    [[], 'no turns'],
    [[{ minutes: 12, turns: 1 }], '1 turn, 12 minutes'],
    [
      [
        { minutes: 12, turns: 2 },
        { minutes: 30, turns: 1 },
      ],
      '3 turns, 12 to 30 minutes',
    ],
  ])('is told in words', (layovers, words) => expect(rugWords(layovers)).toBe(words));
});
