import { describe, expect, test } from 'vitest';
import { instantOfWallTime, nearestInstantOfTime, readTimeOfDay } from './time-entry';

const newYork = 'America/New_York';
const iso = (instant: number): string => new Date(instant).toISOString();

test.each([
  ['17:40', 63_600],
  ['1740', 63_600],
  ['17.40', 63_600],
  ['7:05', 25_500],
  ['17:40:30', 63_630],
  ['25:35', 92_100],
  [' 00:00 ', 0],
  ['17:60', null],
  ['48:00', null],
  ['now', null],
  ['', null],
])('"%s" typed as a time is %s seconds of the day', (text, seconds) => {
  expect(readTimeOfDay(text)).toBe(seconds);
});

describe('the instant of a time on a day', () => {
  test.each([
    ['2026-03-03', '17:40', '2026-03-03T22:40:00.000Z'],
    ['2026-07-03', '17:40', '2026-07-03T21:40:00.000Z'],
    ['2026-03-03', '25:35', '2026-03-04T06:35:00.000Z'],
    // Clocks go forward at 02:00: 02:30 does not come, and is taken half an hour past the gap.
    ['2026-03-08', '02:30', '2026-03-08T07:30:00.000Z'],
    ['2026-03-08', '01:30', '2026-03-08T06:30:00.000Z'],
    ['2026-03-08', '03:30', '2026-03-08T07:30:00.000Z'],
    // Clocks go back at 02:00: 01:30 comes twice, the first one is meant.
    ['2026-11-01', '01:30', '2026-11-01T05:30:00.000Z'],
    ['2026-11-01', '02:30', '2026-11-01T07:30:00.000Z'],
  ])('%s %s is %s', (date, time, instant) => {
    expect(iso(instantOfWallTime(date, readTimeOfDay(time) ?? -1, newYork))).toBe(instant);
  });

  test('near midnight is the nearest one, also of the other day', () => {
    const justAfterMidnight = Date.parse('2026-03-04T05:05:00Z');
    expect(iso(nearestInstantOfTime(readTimeOfDay('23:58') ?? -1, newYork, justAfterMidnight))).toBe(
      '2026-03-04T04:58:00.000Z',
    );
  });
});
