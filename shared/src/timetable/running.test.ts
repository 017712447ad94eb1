import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { activationOn, spanOfActivation, type Activation } from './running';
import { addDays } from './service-day';

const winter = { number: 1, from: '2026-01-01' };
const spring = { number: 2, from: '2026-03-09' };

describe('the timetable that runs', () => {
  it.each([
    ['2025-12-31', null],
    ['2026-01-01', winter],
    ['2026-03-08', winter],
    ['2026-03-09', spring],
    ['2027-01-01', spring],
  ])('on %s is the latest given that has begun', (date, expected) => {
    expect(activationOn([spring, winter], date)).toEqual(expected);
  });

  it('is the one ordered last, even from an earlier date', () => {
    const repair = { number: 3, from: '2026-02-01' };
    expect(activationOn([winter, spring, repair], '2026-04-01')).toEqual(repair);
    expect(spanOfActivation([winter, spring, repair], spring)).toBeNull();
    expect(spanOfActivation([winter, spring, repair], winter)).toEqual({
      from: '2026-01-01',
      until: '2026-01-31',
    });
  });

  it('has an open end until another follows', () => {
    expect(spanOfActivation([winter], winter)).toEqual({ from: '2026-01-01', until: null });
    expect(spanOfActivation([winter, spring], winter)).toEqual({ from: '2026-01-01', until: '2026-03-08' });
  });

  it('counts on exactly the days of its span', () => {
    const date = fc.integer({ min: 0, max: 60 }).map((days) => addDays('2026-01-01', days));
    const orders = fc
      .array(date, { minLength: 1, maxLength: 8 })
      .map((dates) => dates.map((from, index): Activation => ({ number: index + 1, from })));
    fc.assert(
      fc.property(orders, date, (activations, day) => {
        const counting = activations.filter((activation) => {
          const span = spanOfActivation(activations, activation);
          return span !== null && span.from <= day && (span.until === null || day <= span.until);
        });
        const running = activationOn(activations, day);
        expect(counting).toEqual(running === null ? [] : [running]);
      }),
      { seed: 81 },
    );
  });
});
