import { spareFigure, spareWords } from './spare-figure';

describe('the figure of time to spare', () => {
  it.each([
    [230, '+3'],
    [180, '+3'],
    [179, '+2'],
    [59, '+0'],
    [0, '+0'],
    [-1, '−1'],
    [-10, '−1'],
    [-60, '−1'],
    [-61, '−2'],
    [1299, '+21'],
  ])('%i s is %s: whole minutes, rounded down', (seconds, figure) => {
    expect(spareFigure(seconds)).toBe(figure);
  });

  it.each([
    [600, '10 minutes to spare'],
    [60, '1 minute to spare'],
    [30, '0 minutes to spare'],
    [-30, 'short by 1 minute'],
    [-170, 'short by 3 minutes'],
  ])('%i s is read out as "%s"', (seconds, words) => {
    expect(spareWords(seconds)).toBe(words);
  });
});
