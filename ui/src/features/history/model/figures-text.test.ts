import { describe, expect, it } from 'vitest';
import { formatInterval, formatLimit, formatPercent, parseLimit, remarksOn } from './figures-text';

describe('texts of on-time figures', () => {
  it('give percent with one decimal and say when there is none', () => {
    expect(formatPercent(0.91707)).toBe('91.7');
    expect(formatPercent(null)).toBe('–');
    expect(formatInterval({ interval: { low: 0.908, high: 0.925, confidence: 0.95 } })).toBe(
      '90.8 to 92.5 %',
    );
    expect(formatInterval({ interval: null })).toBe('no interval');
  });

  it('name what is not in the share', () => {
    expect(remarksOn({ annulled: 11, noRecord: 3 })).toBe('11 annulled, 3 without a record of leaving');
    expect(remarksOn({ annulled: 0, noRecord: 0 })).toBeNull();
  });

  it.each([
    ['0:59', 59],
    ['5:59', 359],
    ['90', 90],
    ['15:00', 900],
    ['1:60', null],
    ['soon', null],
    ['', null],
  ])('read the limit %j as %s', (text, seconds) => {
    expect(parseLimit(text)).toBe(seconds);
  });

  it('write the limit as they read it', () => {
    for (const seconds of [0, 59, 60, 359, 900]) expect(parseLimit(formatLimit(seconds))).toBe(seconds);
  });
});
