import { describe, expect, it } from 'vitest';
import { logFileName, readLogDays, writeLogDay } from './log-days';

const now = Date.parse('2026-03-03T22:20:00Z');
const read = (text: string) => readLogDays(new URLSearchParams(text), now);

describe('the days of the log in the address', () => {
  it('are the two weeks up to today in UTC unless it says otherwise', () => {
    expect(read('')).toEqual({ from: '2026-02-18', to: '2026-03-03' });
    expect(read('from=2026-03-01&to=2026-03-02')).toEqual({ from: '2026-03-01', to: '2026-03-02' });
    expect(read('to=2026-02-01')).toEqual({ from: '2026-01-19', to: '2026-02-01' });
  });

  it('never run backwards and never are no days', () => {
    expect(read('from=2026-03-03&to=2026-03-01')).toEqual({ from: '2026-03-01', to: '2026-03-01' });
    expect(read('from=soon&to=2026-99-01')).toEqual({ from: '2026-02-18', to: '2026-03-03' });
  });

  it('are written back beside what else is there', () => {
    const written = writeLogDay(new URLSearchParams('terminal=HBR&from=2026-01-01'), 'from', '2026-02-02');
    expect(written.toString()).toBe('terminal=HBR&from=2026-02-02');
    expect(writeLogDay(written, 'from', '').toString()).toBe('terminal=HBR');
  });

  it('name the file', () => {
    expect(logFileName({ from: '2026-03-01', to: '2026-03-02' })).toBe(
      'stubpost-log-2026-03-01-2026-03-02.ndjson',
    );
  });
});
