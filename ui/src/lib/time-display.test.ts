import { describe, expect, test } from 'vitest';
import {
  formatClock,
  formatDuration,
  formatLateness,
  formatLatenessMinutes,
  formatRelative,
  formatServiceTime,
  formatSince,
  formatSlack,
  formatSlackWords,
  formatStamp,
  formatTime,
  formatTimeAndRelative,
  formatTimeWithDay,
} from './time-display';

const newYork = 'America/New_York';
const at = (text: string): number => Date.parse(text);

describe('a time at the terminal', () => {
  test('is shown in the terminal’s own zone', () => {
    expect(formatClock('2026-03-03T22:22:41Z', newYork)).toBe('17:22:41');
    expect(formatStamp('2026-03-03T22:22:41Z', newYork)).toBe('Tue 3 Mar 17:22:41 EST');
    expect(formatStamp('2026-07-03T21:22:41Z', newYork)).toBe('Fri 3 Jul 17:22:41 EDT');
  });

  test('of another day of the terminal names its weekday', () => {
    const now = at('2026-03-03T22:22:41Z');
    expect(formatTimeWithDay('2026-03-03T05:00:00Z', newYork, now)).toBe('00:00');
    expect(formatTimeWithDay('2026-03-03T04:59:59Z', newYork, now)).toBe('Mon 23:59');
  });

  test('of plan or forecast has its seconds cut off, not rounded', () => {
    expect(formatTime('2026-03-03T22:37:59Z', newYork)).toBe('17:37');
  });

  test('is 00 and not 24 at midnight', () => {
    expect(formatClock('2026-03-03T05:00:00Z', newYork)).toBe('00:00:00');
  });

  test.each([
    ['2026-11-01T05:12:00Z', '01:12 first (EDT)'],
    ['2026-11-01T06:12:00Z', '01:12 second (EST)'],
    ['2026-11-01T04:12:00Z', '00:12'],
    ['2026-11-01T07:12:00Z', '02:12'],
    ['2026-03-08T06:59:00Z', '01:59'],
    ['2026-03-08T07:00:00Z', '03:00'],
  ])('in the nights when clocks change: %s is %s', (instant, words) => {
    expect(formatTime(instant, newYork)).toBe(words);
  });

  test('does not name the zone twice in the hour that comes twice', () => {
    expect(formatStamp('2026-11-01T05:12:03Z', newYork)).toBe('Sun 1 Nov 01:12:03 first (EDT)');
  });

  test('after midnight names the night of its service day', () => {
    expect(formatServiceTime('2026-03-04T05:40:00Z', newYork, '2026-03-03')).toBe('00:40 (Tue night)');
    expect(formatServiceTime('2026-03-04T04:40:00Z', newYork, '2026-03-03')).toBe('23:40');
  });

  test('that is no instant is a fault of the caller', () => {
    expect(() => formatTime('2026-03-04', newYork)).toThrow(RangeError);
  });
});

describe('how far away something is', () => {
  const now = at('2026-03-03T22:27:30Z');
  test.each([
    ['2026-03-03T22:40:00Z', 'in 12 min'],
    ['2026-03-03T22:28:29Z', 'in 59 s'],
    ['2026-03-03T22:28:30Z', 'in 1 min'],
    ['2026-03-03T22:27:30Z', 'now'],
    ['2026-03-03T22:24:00Z', '3 min ago'],
    ['2026-03-03T20:22:00Z', '2 h 5 min ago'],
    ['2026-03-01T00:00:00Z', '2 days ago'],
  ])('%s is %s', (instant, words) => {
    expect(formatRelative(instant, now)).toBe(words);
  });

  test('stands beside the time, never alone', () => {
    expect(formatTimeAndRelative('2026-03-03T22:40:00Z', newYork, now)).toBe('17:40, in 12 min');
  });

  test('of something that was is never in the future', () => {
    expect(formatSince('2026-03-03T22:27:45Z', now)).toBe('now');
  });
});

describe('lateness', () => {
  test.each([
    [200, '3 min 20 s late', '3.3'],
    [59, '59 s late', '0.9'],
    [60, '1 min late', '1.0'],
    [-20, '20 s early', '−0.3'],
    [-5, '5 s early', '0.0'],
    [0, 'on the second', '0.0'],
  ])('of %i s is "%s", in a table %s', (seconds, words, minutes) => {
    expect(formatLateness(seconds)).toBe(words);
    expect(formatLatenessMinutes(seconds)).toBe(minutes);
  });
});

describe('slack', () => {
  test.each([
    [230, '+3', '3 minutes to spare'],
    [60, '+1', '1 minute to spare'],
    [0, '+0', '0 minutes to spare'],
    [-10, '−1', 'short by 1 minute'],
    [-180, '−3', 'short by 3 minutes'],
    [null, '–', 'no forecast'],
  ])('of %s s is %s, rounded down', (seconds, figure, words) => {
    expect(formatSlack(seconds)).toBe(figure);
    expect(formatSlackWords(seconds)).toBe(words);
  });
});

test.each([
  [0, '0 s'],
  [45, '45 s'],
  [200, '3 min 20 s'],
  [720, '12 min'],
  [3900, '1 h 5 min'],
])('%i s in words is %s', (seconds, words) => {
  expect(formatDuration(seconds)).toBe(words);
});
