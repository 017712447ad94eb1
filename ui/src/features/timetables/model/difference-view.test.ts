import type { WireTimetableDifference } from '@stubpost/shared';
import { describe, expect, it } from 'vitest';
import { axisMinutes, countsByDate, dateToShow, differenceWords, greatestLosses } from './difference-view';

const turn = (train: string, before: number | null, after: number | null) => {
  const part = (layoverSeconds: number) => ({
    inboundTrain: train,
    arrivalAt: '2026-03-03T22:00:00.000Z',
    outboundTrain: `${train}b`,
    departureAt: '2026-03-03T22:20:00.000Z',
    layoverSeconds,
  });
  return {
    serviceDate: '2026-03-04',
    terminal: 'HBR',
    change: before === null ? ('added' as const) : after === null ? ('removed' as const) : ('moved' as const),
    before: before === null ? null : part(before),
    after: after === null ? null : part(after),
  };
};

const date = (serviceDate: string, terminal: string, moved: number) => ({
  ...{ serviceDate, againstDate: serviceDate, terminal, moved },
  ...{ added: 1, removed: 0, same: 5 },
});

const difference: WireTimetableDifference = {
  against: { id: 'w', fileName: 'winter.zip' },
  dates: [date('2026-03-03', 'HBR', 1), date('2026-03-04', 'HBR', 4), date('2026-03-04', 'STC', 2)],
  turns: [
    turn('1', 1200, 600),
    turn('2', 1200, 900),
    turn('3', 900, 1500),
    turn('4', null, 600),
    turn('5', 600, null),
  ],
};

describe('what a timetable changes', () => {
  it('is added up over the terminals of a date', () => {
    expect(countsByDate(difference)).toEqual([
      { serviceDate: '2026-03-03', againstDate: '2026-03-03', same: 5, moved: 1, added: 1, removed: 0 },
      { serviceDate: '2026-03-04', againstDate: '2026-03-04', same: 10, moved: 6, added: 2, removed: 0 },
    ]);
  });

  it('is shown for the date that differs most', () => {
    expect(dateToShow(countsByDate(difference))?.serviceDate).toBe('2026-03-04');
    expect(dateToShow([])).toBeUndefined();
  });

  it('is said in words', () => {
    expect(differenceWords(difference)).toBe('8 turns differ, Wed 4 Mar');
    expect(differenceWords({ ...difference, against: null })).toBe('nothing to compare with');
    expect(differenceWords({ ...difference, dates: [] })).toBe('none');
    expect(differenceWords(undefined)).toBe('');
  });

  it('is drawn for the turns that lose most', () => {
    const losses = greatestLosses(difference.turns, 6);
    expect(losses.map(({ turn: { after } }) => after?.inboundTrain)).toEqual(['1', '2']);
    expect(greatestLosses(difference.turns, 1)).toHaveLength(1);
  });

  it('has an axis that holds every value and the mark', () => {
    const ticks = axisMinutes(greatestLosses(difference.turns, 6), 520);
    expect(ticks).toEqual([8, 12, 16, 20]);
    const wide = axisMinutes([{ turn: turn('9', 9000, 60), beforeSeconds: 9000, afterSeconds: 60 }], 520);
    expect(wide[0]).toBe(0);
    expect(wide.at(-1)).toBeGreaterThanOrEqual(150);
    expect(wide.length).toBeLessThan(10);
  });
});
