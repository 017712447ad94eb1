import { describe, expect, it } from 'vitest';
import { afterwardsWords, amount, countedWords, percent, warningWords } from './quality-words';

describe('words of the quality of alerts', () => {
  it('never make a nought of nothing', () => {
    const nothing = { count: 0, counted: 0, share: null, interval: null };
    expect([percent(null), amount(null), warningWords(null), countedWords(nothing)]).toEqual([
      '–',
      '–',
      '–',
      'nothing to count',
    ]);
    expect([percent(0), amount(0)]).toEqual(['0.0 %', '0']);
  });

  it('say shares with their n and interval, and warning that came too late as such', () => {
    const interval = { low: 0.3876, high: 0.8366, confidence: 0.95 };
    expect(countedWords({ count: 9, counted: 1400, share: 9 / 1400, interval })).toBe(
      '9 of 1,400, interval 38.8 to 83.7 %',
    );
    expect(amount(2.5999999)).toBe('2.6');
    expect([warningWords(430), warningWords(-30)]).toEqual(['7 min 10 s', '30 s after the departure']);
  });

  it('tell what was entered afterwards, counted or not, and nothing where nothing was', () => {
    const some = { unwatchedTurns: 2, unseenAlerts: 1 };
    expect(afterwardsWords({ ...some, afterwards: 'left-out' })).toBe(
      'Left out: 2 turns of these days were entered only when over, and 1 alert worked out from their entries. Nobody could have acted on them.',
    );
    expect(afterwardsWords({ ...some, afterwards: 'counted' })).toMatch(/^Counted here: 2 turns/);
    expect(afterwardsWords({ unwatchedTurns: 0, unseenAlerts: 0, afterwards: 'counted' })).toBeNull();
  });
});
