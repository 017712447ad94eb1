import { describe, expect, it } from 'vitest';
import { formatClock, formatDuration, formatServiceDate, formatZoneLetters } from './zone-time';

const newYork = 'America/New_York';

describe('time of day in a zone', () => {
  it('is on a 24-hour clock, without seconds unless asked', () => {
    const instant = Date.UTC(2026, 2, 3, 22, 24, 5);
    expect(formatClock(instant, newYork)).toBe('17:24');
    expect(formatClock(instant, newYork, { seconds: true })).toBe('17:24:05');
  });

  it('is cut, not rounded', () => {
    expect(formatClock(Date.UTC(2026, 2, 3, 22, 24, 59, 999), newYork)).toBe('17:24');
  });

  it('writes midnight as 00:00', () => {
    expect(formatClock(Date.UTC(2026, 2, 4, 5, 0, 0), newYork)).toBe('00:00');
  });

  it('skips the lost hour of the spring night', () => {
    expect(formatClock(Date.UTC(2026, 2, 8, 6, 59), newYork)).toBe('01:59');
    expect(formatClock(Date.UTC(2026, 2, 8, 7, 0), newYork)).toBe('03:00');
  });

  it('gives the doubled hour of the autumn night twice, told apart by the letters', () => {
    const first = Date.UTC(2026, 10, 1, 5, 12);
    const second = Date.UTC(2026, 10, 1, 6, 12);
    expect(formatClock(first, newYork)).toBe('01:12');
    expect(formatClock(second, newYork)).toBe('01:12');
    expect(formatZoneLetters(first, newYork)).toBe('EDT');
    expect(formatZoneLetters(second, newYork)).toBe('EST');
  });

  it('refuses a zone that does not exist', () => {
    expect(() => formatClock(0, 'Nowhere/Town')).toThrow(RangeError);
  });
});

describe('a service date in words', () => {
  it('has weekday, day and month and needs no zone', () => {
    expect(formatServiceDate('2026-03-03')).toBe('Tue 3 Mar');
    expect(formatServiceDate('2024-02-29')).toBe('Thu 29 Feb');
  });

  it('leaves a text alone that is no date', () => {
    expect(formatServiceDate('someday')).toBe('someday');
  });
});

describe('a length of time in words', () => {
  it.each([
    [0, '0 s'],
    [45.9, '45 s'],
    [60, '1 min'],
    [200, '3 min 20 s'],
    [-200, '3 min 20 s'],
    [3600, '1 h'],
    [3959, '1 h 5 min'],
  ])('%s s is "%s"', (seconds, words) => {
    expect(formatDuration(seconds)).toBe(words);
  });
});
