import { describe, expect, it } from 'vitest';
import { clockWords } from './clock-words';

describe('the words for a wrong clock', () => {
  it.each([
    [0, null],
    [2000, null],
    [-2000, null],
    [2001, '2.0 s slow'],
    [2400, '2.4 s slow'],
    [-90_000, '90 s fast'],
    [3_600_000, '3,600 s slow'],
  ])('with the server ahead by %d ms are %s', (ahead, words) => {
    expect(clockWords(ahead)).toBe(words);
  });
});
