import { serviceDateAt, serviceDatesOf } from './service-dates';

const zone = 'America/New_York';
const at = (text: string): number => Date.parse(text);

describe('service dates of a window', () => {
  it('is one at midday', () => {
    const window = { from: at('2026-03-03T17:00:00Z'), to: at('2026-03-03T19:00:00Z') };
    expect(serviceDatesOf(window, zone)).toEqual(['2026-03-03']);
  });

  it('takes in the day before in the small hours, whose last trains run after midnight', () => {
    const window = { from: at('2026-03-04T05:40:00Z'), to: at('2026-03-04T07:40:00Z') };
    expect(serviceDatesOf(window, zone)).toEqual(['2026-03-03', '2026-03-04']);
  });

  it('takes in both days of an evening that runs past midnight', () => {
    const window = { from: at('2026-03-04T04:30:00Z'), to: at('2026-03-04T06:30:00Z') };
    expect(serviceDatesOf(window, zone)).toEqual(['2026-03-03', '2026-03-04']);
  });

  it('takes in every day of a long window', () => {
    const window = { from: at('2026-03-03T12:00:00Z'), to: at('2026-03-05T12:00:00Z') };
    expect(serviceDatesOf(window, zone)).toEqual(['2026-03-03', '2026-03-04', '2026-03-05']);
  });

  it.each([
    ['2026-03-04T07:59:00Z', '2026-03-03'],
    ['2026-03-04T08:00:00Z', '2026-03-04'],
    ['2026-03-08T06:30:00Z', '2026-03-07'],
    ['2026-11-01T07:30:00Z', '2026-10-31'],
  ])('at %s the service date is %s', (text, date) => {
    expect(serviceDateAt(at(text), zone)).toBe(date);
  });
});
