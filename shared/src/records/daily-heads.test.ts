import { describe, expect, it } from 'vitest';
import { HeadFinder, receiptDay, type DailyHead, type SealedPoint } from './daily-heads';

const at = (text: string): number => Date.parse(text);
const points = (...times: string[]): SealedPoint[] =>
  times.map((time, index) => ({ sequence: index + 1, hash: `h${index + 1}`, receivedAt: at(time) }));

function found(of: readonly SealedPoint[], last: DailyHead | null = null) {
  const finder = new HeadFinder(last);
  const ended = of.map((point) => finder.take(point)).filter((head) => head !== null);
  return { ended, open: finder.open() };
}

describe('daily heads', () => {
  it('are the last entries of the days of receipt in UTC; days without entries have none', () => {
    const { ended, open } = found(
      points(
        '2026-03-01T23:59:59.999Z',
        '2026-03-02T00:00:00Z',
        '2026-03-02T12:00:00Z',
        '2026-03-05T06:00:00Z',
      ),
    );
    expect(ended).toEqual([
      { date: '2026-03-01', sequence: 1, hash: 'h1', entries: 1 },
      { date: '2026-03-02', sequence: 3, hash: 'h3', entries: 2 },
    ]);
    expect(open).toEqual({ date: '2026-03-05', sequence: 4, hash: 'h4', entries: 1 });
  });

  it('never go back when a clock does', () => {
    const { ended, open } = found(
      points('2026-03-02T00:00:01Z', '2026-03-01T23:59:59Z', '2026-03-02T08:00:00Z'),
    );
    expect(ended).toEqual([]);
    expect(open).toEqual({ date: '2026-03-02', sequence: 3, hash: 'h3', entries: 3 });
  });

  it('never move: what comes in for a day that is published belongs to the next', () => {
    const published = { date: '2026-03-01', sequence: 40, hash: 'h40', entries: 40 };
    const late = { sequence: 41, hash: 'h41', receivedAt: at('2026-03-01T23:59:58Z') };
    expect(found([late], published).open).toEqual({
      date: '2026-03-02',
      sequence: 41,
      hash: 'h41',
      entries: 1,
    });
  });

  it('can be closed when a day is over and nothing came in after it', () => {
    const finder = new HeadFinder();
    for (const point of points('2026-03-01T10:00:00Z')) finder.take(point);
    expect(finder.close()).toMatchObject({ date: '2026-03-01', sequence: 1 });
    expect(finder.open()).toBeNull();
    expect(finder.close()).toBeNull();
  });

  it('know a day by UTC, not by any terminal', () => {
    expect(receiptDay(at('2026-03-03T23:30:00-05:00'))).toBe('2026-03-04');
  });
});
