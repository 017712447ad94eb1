import { describe, expect, it } from 'vitest';
import { lastDays, offeredLength, readQualityRange, writeQualityRange } from './quality-range';

const today = '2026-03-10';

describe('the days of the quality page', () => {
  it('are the four weeks up to today unless the address says more', () => {
    expect(readQualityRange(new URLSearchParams(), today)).toEqual({
      from: '2026-02-11',
      to: today,
      afterwards: 'left-out',
    });
  });

  it('come back from the address as they were written, beside what else stands there', () => {
    const range = { from: '2026-01-05', to: '2026-02-01', afterwards: 'counted' } as const;
    const written = writeQualityRange(new URLSearchParams('terminal=HBR'), range);
    expect(written.get('terminal')).toBe('HBR');
    expect(readQualityRange(written, today)).toEqual(range);
    const left = writeQualityRange(written, { ...range, afterwards: 'left-out' });
    expect(left.get('afterwards')).toBeNull();
  });

  it.each(['from=2026-02-30', 'to=soon', 'from=2026-03-09&to=2026-03-08'])('are the usual for %s', (text) => {
    expect(readQualityRange(new URLSearchParams(text), today)).toMatchObject(lastDays(28, today));
  });

  it('know their length when it is one of those offered', () => {
    expect(offeredLength(lastDays(7, today), today)).toBe(7);
    expect(offeredLength(lastDays(8, today), today)).toBeNull();
    expect(offeredLength({ from: '2026-03-01', to: '2026-03-07' }, today)).toBeNull();
  });
});
