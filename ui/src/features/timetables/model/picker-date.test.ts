import { describe, expect, it } from 'vitest';
import { fromPickerDate, parsePickerDate, toPickerDate } from './picker-date';

describe('a service day in the date picker', () => {
  it.each(['2026-03-08', '2026-11-01', '2024-02-29', '2026-12-31'])('comes back as it went: %s', (day) => {
    expect(fromPickerDate(toPickerDate(day))).toBe(day);
  });

  it('is read as it is typed, or not at all', () => {
    const read = parsePickerDate(' 2026-03-09 ');
    expect(read === false ? read : fromPickerDate(read)).toBe('2026-03-09');
    expect(parsePickerDate('2026-02-30')).toBe(false);
    expect(parsePickerDate('9 March')).toBe(false);
  });
});
