import { describe, expect, it } from 'vitest';
import {
  addDays,
  boardRule,
  fromPickerDate,
  readHistorySearch,
  toPickerDate,
  writeHistorySearch,
} from './history-search';

const zone = 'America/New_York';
// 22:30 on Tuesday 3 March at the terminal, already Wednesday in UTC.
const now = Date.parse('2026-03-04T03:30:00Z');

describe('what the history page is about', () => {
  it('is the four weeks up to yesterday on the terminal’s calendar unless the address says more', () => {
    expect(readHistorySearch(new URLSearchParams(), now, zone)).toEqual({
      from: '2026-02-03',
      to: '2026-03-02',
      rule: boardRule,
    });
  });

  it('comes back from the address as it was written', () => {
    const search = {
      from: '2026-01-05',
      to: '2026-02-27',
      rule: { thresholdSeconds: 359, inclusive: false, early: 'not-on-time', annulled: 'not-on-time' },
    } as const;
    const written = writeHistorySearch(new URLSearchParams('terminal=HBR'), search);
    expect(written.get('terminal')).toBe('HBR');
    expect(readHistorySearch(written, now, zone)).toEqual(search);
  });

  it('takes the usual value for what cannot be read', () => {
    const bad = new URLSearchParams('from=yesterday&to=2026-13-40&limit=-5');
    expect(readHistorySearch(bad, now, zone)).toEqual(readHistorySearch(new URLSearchParams(), now, zone));
  });

  it('moves through both clock changes by whole days', () => {
    expect(addDays('2026-03-07', 1)).toBe('2026-03-08');
    expect(addDays('2026-11-01', 1)).toBe('2026-11-02');
    expect(addDays('2026-03-01', -1)).toBe('2026-02-28');
  });

  it('hands days to the date picker and back unchanged', () => {
    for (const day of ['2026-03-08', '2026-11-01', '2028-02-29'])
      expect(fromPickerDate(toPickerDate(day))).toBe(day);
  });
});
