import { axisLabel, axisStep, clocksChangeNear, isFullHour, isUnderClock } from './axis-labels';

const zone = 'America/New_York';
const at = (text: string): number => Date.parse(text);

describe('labels of the axis', () => {
  it('are bare times on an ordinary day', () => {
    expect(axisLabel(at('2026-03-03T22:30:00Z'), zone)).toBe('17:30');
    expect(isFullHour(at('2026-03-03T23:00:00Z'), zone)).toBe(true);
    expect(isFullHour(at('2026-03-03T22:30:00Z'), zone)).toBe(false);
  });

  it('tell the two passes of the hour apart in the night when clocks go back', () => {
    const hours = ['04:00', '05:00', '06:00', '07:00'].map((hour) =>
      axisLabel(at(`2026-11-01T${hour}:00Z`), zone),
    );
    expect(hours).toEqual(['00:00 EDT', '01:00 EDT', '01:00 EST', '02:00 EST']);
  });

  it('skip the hour that is not there in the night when clocks go forward', () => {
    const hours = ['05:00', '06:00', '07:00', '08:00'].map((hour) =>
      axisLabel(at(`2026-03-08T${hour}:00Z`), zone),
    );
    expect(hours).toEqual(['00:00 EST', '01:00 EST', '03:00 EDT', '04:00 EDT']);
  });

  it('carry letters only round the change', () => {
    expect(clocksChangeNear(at('2026-11-01T20:00:00Z'), zone)).toBe(false);
    expect(clocksChangeNear(at('2026-11-01T12:00:00Z'), zone)).toBe(true);
    expect(clocksChangeNear(at('2026-11-01T12:00:00Z'), 'America/Phoenix')).toBe(false);
  });

  it.each([
    [18.4, { scale: 'minute', step: 5 }],
    [9.2, { scale: 'minute', step: 10 }],
    [4.6, { scale: 'minute', step: 20 }],
    [2.3, { scale: 'minute', step: 30 }],
    [0.8, { scale: 'hour', step: 2 }],
  ])('stand apart enough at %d px a minute', (pixels, step) => {
    expect(axisStep(pixels)).toEqual(step);
  });

  it('give way to the clock on the now line', () => {
    const now = at('2026-03-03T22:26:40Z');
    expect(isUnderClock(at('2026-03-03T22:20:00Z'), now, 9.2)).toBe(true);
    expect(isUnderClock(at('2026-03-03T22:30:00Z'), now, 9.2)).toBe(true);
    expect(isUnderClock(at('2026-03-03T22:40:00Z'), now, 9.2)).toBe(false);
    expect(isUnderClock(at('2026-03-03T22:10:00Z'), now, 9.2)).toBe(false);
  });
});
