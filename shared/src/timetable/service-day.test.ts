import fc from 'fast-check';
import { DateTime } from 'luxon';
import { describe, expect, it } from 'vitest';
import { formatInstant } from '../lib/instant';
import {
  addDays,
  calendarDateAt,
  datesBetween,
  daysBetween,
  formatFeedDate,
  formatServiceTime,
  isCalendarDate,
  isZone,
  parseFeedDate,
  parseServiceTime,
  secondsOfServiceDay,
  serviceInstant,
  weekdayOf,
} from './service-day';

const zones = [
  'America/New_York',
  'America/Denver',
  'America/Los_Angeles',
  'America/Phoenix',
  'America/St_Johns',
  'Europe/London',
  'Australia/Lord_Howe',
  'Asia/Kolkata',
];
const anyZone = fc.constantFrom(...zones);
const anyDate = fc.integer({ min: 0, max: 60 * 365 }).map((days) => addDays('1980-01-01', days));

// Source: GTFS reference (times run from noon minus 12 h), derived with the IANA zone database.
const conversions = [
  ['an ordinary day', '2026-07-15', '14:30:00', '2026-07-15T18:30:00.000Z'],
  ['past midnight on an ordinary day', '2026-07-15', '25:35:00', '2026-07-16T05:35:00.000Z'],
  ['the night before the spring change', '2026-03-07', '25:35:00', '2026-03-08T06:35:00.000Z'],
  ['into the missing hour', '2026-03-07', '26:30:00', '2026-03-08T07:30:00.000Z'],
  ['start of the spring day, the evening before', '2026-03-08', '00:00:00', '2026-03-08T04:00:00.000Z'],
  ['spring day, 2:30 after its start', '2026-03-08', '02:30:00', '2026-03-08T06:30:00.000Z'],
  ['spring day, 3:30 after its start', '2026-03-08', '03:30:00', '2026-03-08T07:30:00.000Z'],
  ['spring day, afternoon', '2026-03-08', '14:30:00', '2026-03-08T18:30:00.000Z'],
  ['first 1:30 of the autumn night', '2026-10-31', '25:30:00', '2026-11-01T05:30:00.000Z'],
  ['second 1:30 of the autumn night', '2026-10-31', '26:30:00', '2026-11-01T06:30:00.000Z'],
  ['start of the autumn day, at 1:00', '2026-11-01', '00:00:00', '2026-11-01T05:00:00.000Z'],
  ['autumn day, 1:30 after its start', '2026-11-01', '01:30:00', '2026-11-01T06:30:00.000Z'],
  ['autumn day, afternoon', '2026-11-01', '14:30:00', '2026-11-01T19:30:00.000Z'],
] as const;

describe('a time of the service day', () => {
  it.each(conversions)('comes out right: %s', (_, date, time, utc) => {
    const seconds = parseServiceTime(time);
    expect(seconds).not.toBeNull();
    expect(formatInstant(serviceInstant(date, seconds ?? 0, 'America/New_York'))).toBe(utc);
  });

  it('agrees with a second time-zone library on any day, in any zone', () => {
    fc.assert(
      fc.property(anyDate, anyZone, fc.integer({ min: 0, max: 200_000 }), (date, zone, seconds) => {
        const [year, month, day] = date.split('-').map(Number);
        const noon = DateTime.fromObject({ year, month, day, hour: 12 }, { zone });
        const expected = noon.toMillis() - 43_200_000 + seconds * 1000;
        expect(serviceInstant(date, seconds, zone)).toBe(expected);
      }),
      { seed: 51, numRuns: 3000 },
    );
  });

  it('is the same after writing and reading', () => {
    fc.assert(
      fc.property(fc.integer({ min: 0, max: 999 * 3600 + 3599 }), (seconds) => {
        expect(parseServiceTime(formatServiceTime(seconds))).toBe(seconds);
      }),
      { seed: 52 },
    );
  });

  it('may have one digit of hours', () => expect(parseServiceTime('5:07:09')).toBe(18_429));

  it.each(['', '25:7:00', '12:60:00', '12:00:60', '12:00', '-1:00:00', '12.00.00', '1200:00:00', '8:00:00 '])(
    'is not read from %j',
    (text) => expect(parseServiceTime(text)).toBeNull(),
  );

  it('finds its seconds again from the instant', () => {
    fc.assert(
      fc.property(anyDate, anyZone, fc.integer({ min: 0, max: 200_000 }), (date, zone, seconds) => {
        expect(secondsOfServiceDay(serviceInstant(date, seconds, zone), date, zone)).toBe(seconds);
      }),
      { seed: 53 },
    );
  });
});

describe('a calendar day', () => {
  it.each([
    ['20240229', '2024-02-29'],
    ['20260229', null],
    ['20261301', null],
    ['2026-03-08', null],
    ['', null],
  ])('of a file: %j reads as %j', (text, date) => expect(parseFeedDate(text)).toBe(date));

  it('is the same after writing and reading', () => {
    fc.assert(
      fc.property(anyDate, (date) => {
        expect(parseFeedDate(formatFeedDate(date))).toBe(date);
      }),
      { seed: 54 },
    );
  });

  it('has the weekday a second library gives it', () => {
    fc.assert(
      fc.property(anyDate, (date) => {
        expect(weekdayOf(date)).toBe(DateTime.fromISO(date).weekday - 1);
      }),
      { seed: 55 },
    );
  });

  it('counts its days between', () => {
    fc.assert(
      fc.property(anyDate, fc.integer({ min: -500, max: 500 }), (date, days) => {
        expect(daysBetween(date, addDays(date, days))).toBe(days);
        expect(datesBetween(date, addDays(date, days))).toHaveLength(Math.max(0, days + 1));
      }),
      { seed: 56 },
    );
  });

  it('is the one the clocks of the zone show', () => {
    fc.assert(
      fc.property(fc.integer({ min: 0, max: 4_000_000_000_000 }), anyZone, (instant, zone) => {
        expect(calendarDateAt(instant, zone)).toBe(DateTime.fromMillis(instant, { zone }).toISODate());
      }),
      { seed: 57 },
    );
  });

  it('must exist', () => {
    expect(isCalendarDate('2026-02-28')).toBe(true);
    expect(isCalendarDate('2026-02-30')).toBe(false);
    expect(isCalendarDate('someday')).toBe(false);
  });
});

describe('a zone', () => {
  it('is known by its IANA name', () => {
    expect(isZone('America/New_York')).toBe(true);
    expect(isZone('America/Nowhere')).toBe(false);
    expect(isZone('')).toBe(false);
  });
});
