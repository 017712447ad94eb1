import type { WireTimetableHead, WireTimetableSummary } from '@stubpost/shared';
import { describe, expect, it } from 'vitest';
import {
  firstToShow,
  formatBytes,
  formatDays,
  formatMedian,
  oddStart,
  readingTime,
  runningOn,
  standingWords,
  suggestFrom,
} from './timetable-words';

const today = '2026-03-03';

const head = (id: string, parts: Partial<WireTimetableHead>): WireTimetableHead => ({
  id,
  state: 'ready',
  fileName: `${id}.zip`,
  fileBytes: 1000,
  routeTypes: '2',
  uploadedAt: '2026-03-02T10:00:00.000Z',
  uploadedBy: null,
  readAt: null,
  progress: null,
  activeFrom: null,
  activeUntil: null,
  firstDate: null,
  lastDate: null,
  ...parts,
});

const winter = head('winter', { state: 'active', activeFrom: '2026-01-01', activeUntil: '2026-03-08' });
const spring = head('spring', { state: 'active', activeFrom: '2026-03-09' });
const old = head('old', { state: 'retired', activeFrom: '2025-10-01', activeUntil: '2025-12-31' });
const draft = head('draft', {});

describe('how a timetable stands', () => {
  it.each([
    [winter, 'running until Sun 8 Mar'],
    [{ ...winter, activeUntil: null }, 'running'],
    [spring, 'from Mon 9 Mar'],
    [old, 'has run'],
    [draft, 'ready'],
    [head('bad', { state: 'refused' }), 'refused'],
    [head('new', { state: 'reading' }), 'being read'],
  ])('is said in words: $id', (each, words) => expect(standingWords(each, today)).toBe(words));

  it('is running on the days of its span', () => {
    const heads = [spring, winter, old];
    expect(runningOn(heads, today)?.id).toBe('winter');
    expect(runningOn(heads, '2026-03-09')?.id).toBe('spring');
    expect(runningOn(heads, '2025-12-31')?.id).toBe('old');
    expect(runningOn(heads, '2025-01-01')).toBeUndefined();
  });
});

describe('the page opens with', () => {
  it.each([
    ['a draft that waits', [draft, winter], 'draft'],
    ['a refused file, to be mended', [head('bad', { state: 'refused' }), winter], 'bad'],
    ['one that runs from a later day', [spring, winter], 'spring'],
    ['the running one when nothing waits', [old, { ...winter, activeUntil: null }], 'winter'],
    ['the newest when none runs', [old], 'old'],
    ['nothing when there is none', [], undefined],
  ])('%s', (_, heads, id) => expect(firstToShow(heads, today)?.id).toBe(id));
});

describe('the day to begin with', () => {
  const summary = (firstDate: string, lastDate: string) => ({ firstDate, lastDate }) as WireTimetableSummary;

  it('is today, or the first day of a timetable to come', () => {
    expect(suggestFrom(summary('2026-01-01', '2026-12-31'), today)).toBe(today);
    expect(suggestFrom(summary('2026-03-09', '2026-12-31'), today)).toBe('2026-03-09');
  });

  it('is remarked on when nothing would run', () => {
    expect(oddStart(summary('2025-01-01', '2025-12-31'), today, today)).toContain('ended on Wed 31 Dec 2025');
    expect(oddStart(summary('2026-03-09', '2026-12-31'), today, today)).toContain(
      'first train runs on Mon 9 Mar 2026',
    );
    expect(oddStart(summary('2026-03-09', '2026-12-31'), '2026-03-09', today)).toBeNull();
    expect(oddStart(summary('2026-01-01', '2026-12-31'), today, today)).toBeNull();
  });
});

describe('figures', () => {
  it.each([
    [500, '1 KB'],
    [70_400, '70 KB'],
    [1_840_000, '1.8 MB'],
  ])('%i bytes read %s', (bytes, words) => expect(formatBytes(bytes)).toBe(words));

  it('days carry the year once, or twice where it differs', () => {
    expect(formatDays('2026-03-09', '2026-06-07')).toBe('Mon 9 Mar to Sun 7 Jun 2026');
    expect(formatDays('2025-12-14', '2026-06-07')).toBe('Sun 14 Dec 2025 to Sun 7 Jun 2026');
    expect(formatDays(null, null)).toBe('no day');
  });

  it('a median of nothing is a dash', () => {
    expect(formatMedian(null)).toBe('–');
    expect(formatMedian(1110)).toBe('19 min');
  });

  it('the reading time has tenths of a second', () => {
    expect(readingTime({ uploadedAt: '2026-03-03T10:00:00.000Z', readAt: '2026-03-03T10:00:03.420Z' })).toBe(
      'in 3.4 s',
    );
    expect(readingTime({ uploadedAt: '2026-03-03T10:00:00.000Z', readAt: '2026-03-03T10:02:10.000Z' })).toBe(
      'in 2 min',
    );
    expect(readingTime({ uploadedAt: '2026-03-03T10:00:00.000Z', readAt: null })).toBeNull();
  });
});
