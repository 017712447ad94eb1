import { describe, expect, it } from 'vitest';
import { groupOnTime } from './grouping';
import {
  delaySecondsOf,
  isOnTime,
  measureOnTime,
  nameOfRule,
  type Departure,
  type OnTimeRule,
} from './on-time';

const rule = (overrides: Partial<OnTimeRule> = {}): OnTimeRule => ({
  thresholdSeconds: 59,
  inclusive: true,
  early: 'on-time',
  annulled: 'left-out',
  ...overrides,
});

const scheduledDepartureAt = Date.parse('2026-03-03T22:40:00Z');
const left = (delaySeconds: number | null, overrides: Partial<Departure> = {}): Departure => ({
  serviceDate: '2026-03-03',
  train: '1742',
  scheduledDepartureAt,
  actualDepartureAt: delaySeconds === null ? null : scheduledDepartureAt + delaySeconds * 1000,
  annulled: false,
  ...overrides,
});
const many = (count: number, departure: Departure): Departure[] =>
  Array.from({ length: count }, () => departure);

// Published punctuality rules: a commuter rule of 5:59, a contract rule of 4:59, five minutes inclusive, to the
// minute, and an inter-city rule of 15 minutes inclusive.
const boundaries: ReadonlyArray<[string, Partial<OnTimeRule>, number, boolean]> = [
  ['late from 6:00', { thresholdSeconds: 360, inclusive: false }, 359, true],
  ['late from 6:00', { thresholdSeconds: 360, inclusive: false }, 360, false],
  ['late from 6:00', { thresholdSeconds: 360, inclusive: false }, -30, true],
  ['late from 5:00', { thresholdSeconds: 300, inclusive: false }, 299, true],
  ['late from 5:00', { thresholdSeconds: 300, inclusive: false }, 300, false],
  ['up to 5:00', { thresholdSeconds: 300 }, 300, true],
  ['up to 5:00', { thresholdSeconds: 300 }, 301, false],
  ['to the minute', { thresholdSeconds: 60, inclusive: false }, 59, true],
  ['to the minute', { thresholdSeconds: 60, inclusive: false }, 60, false],
  ['to the minute', { thresholdSeconds: 60, inclusive: false }, -120, true],
  ['up to 15:00', { thresholdSeconds: 900 }, 900, true],
  ['up to 15:00', { thresholdSeconds: 900 }, 901, false],
  ['up to 0:59', {}, 59, true],
  ['up to 0:59', {}, 60, false],
  ['early does not count', { early: 'not-on-time' }, -1, false],
  ['early does not count', { early: 'not-on-time' }, 0, true],
];

describe('on-time measure', () => {
  it.each(boundaries)('%s: %o at %d s is %s', (_, overrides, delaySeconds, expected) => {
    expect(isOnTime(delaySeconds, rule(overrides))).toBe(expected);
  });

  it('compares whole seconds that are cut before they are compared', () => {
    expect(delaySecondsOf(left(59.9))).toBe(59);
    expect(delaySecondsOf(left(-0.5))).toBe(-1);
  });

  it('counts 100 scheduled, 2 late, 1 annulled as 97.0 when annulled is not on time and 97.98 when it is left out', () => {
    const day = [...many(97, left(0)), ...many(2, left(300)), left(null, { annulled: true })];
    const strict = measureOnTime(day, rule({ annulled: 'not-on-time' }));
    expect(strict).toMatchObject({ scheduled: 100, counted: 100, onTime: 97, annulled: 1, share: 0.97 });
    const lenient = measureOnTime(day, rule());
    expect(lenient).toMatchObject({ scheduled: 100, counted: 99, onTime: 97, annulled: 1 });
    expect(lenient.share).toBeCloseTo(0.9798, 4);
  });

  it('shows a departure without a record and counts it neither way', () => {
    const figures = measureOnTime([left(0), left(null)], rule());
    expect(figures).toMatchObject({ scheduled: 2, counted: 1, noRecord: 1, share: 1 });
  });

  it('gives no share, interval or delay for nothing', () => {
    expect(measureOnTime([], rule())).toMatchObject({ counted: 0, share: null, interval: null });
    expect(measureOnTime([], rule()).delaySeconds).toEqual({ mean: null, p50: null, p80: null, p95: null });
  });

  it('says its rule in words', () => {
    expect(nameOfRule(rule())).toBe('left within 0:59 of schedule; early is on time; annulled left out');
    expect(
      nameOfRule(
        rule({ thresholdSeconds: 360, inclusive: false, early: 'not-on-time', annulled: 'not-on-time' }),
      ),
    ).toBe('left less than 6:00 after schedule; early is not on time; annulled not on time');
  });

  it('groups by the hour of the schedule on the terminal’s clock, past midnight under the evening’s date', () => {
    const late = left(0, {
      scheduledDepartureAt: Date.parse('2026-03-04T05:30:00Z'),
      actualDepartureAt: Date.parse('2026-03-04T05:30:00Z'),
    });
    const groups = groupOnTime([left(0), late], rule(), 'hour', 'America/New_York');
    expect(groups.map((group) => [group.key, group.label])).toEqual([
      ['17', '17:00'],
      ['24', '00:00 next day'],
    ]);
  });

  it('splits without losing or doubling a departure', () => {
    const all = [left(0), left(90), left(null), left(20, { serviceDate: '2026-03-08', train: '1744' })];
    for (const grouping of ['hour', 'weekday', 'date', 'train'] as const) {
      const groups = groupOnTime(all, rule(), grouping, 'America/New_York');
      expect(groups.reduce((sum, group) => sum + group.scheduled, 0)).toBe(all.length);
    }
    expect(groupOnTime(all, rule(), 'weekday', 'America/New_York').map((group) => group.label)).toEqual([
      'Tuesday',
      'Sunday',
    ]);
  });
});
