import { ms } from '../testing/a-wire-turn';
import { minutesAgo, momentOfClock } from './entered-later';

const zone = 'America/New_York';
const utc = (text: string): number => Date.parse(`${text}Z`);

describe('a time typed for an act that was before', () => {
  it.each([
    ['17:22', ms('17:22')],
    ['1722', ms('17:22')],
    ['17:22:05', ms('17:22:05')],
    ['17.22', ms('17:22')],
    ['9:05', ms('9:05')],
  ])('reads %s as today in the terminal’s zone', (typed, expected) => {
    expect(momentOfClock(typed, zone, ms('17:30:15'))).toBe(expected);
  });

  it('takes a time later than now for that of the day before', () => {
    expect(momentOfClock('23:50', zone, ms('0:10'))).toBe(ms('23:50') - 24 * 3600 * 1000);
  });

  it.each(['', '25:00', '17:61', 'noon', '17:22 pm'])('reads nothing from %j', (typed) => {
    expect(momentOfClock(typed, zone, ms('17:30'))).toBeNull();
  });

  it('is right across both clock changes', () => {
    // 8 March 2026, 02:00 EST becomes 03:00 EDT; 1 November 2026, 02:00 EDT becomes 01:00 EST.
    expect(momentOfClock('1:55', zone, utc('2026-03-08T07:05:00'))).toBe(utc('2026-03-08T06:55:00'));
    expect(momentOfClock('0:50', zone, utc('2026-11-01T06:20:00'))).toBe(utc('2026-11-01T04:50:00'));
    expect(momentOfClock('1:10', zone, utc('2026-11-01T06:20:00'))).toBe(utc('2026-11-01T06:10:00'));
  });

  it('does not take a time of the evening before for one the clocks skipped this night', () => {
    expect(momentOfClock('2:30', zone, utc('2026-03-08T07:35:00'))).toBe(utc('2026-03-07T07:30:00'));
  });

  it('counts minutes back from now', () => {
    expect(minutesAgo(ms('17:22:41'), 2)).toBe(ms('17:20:41'));
  });
});
