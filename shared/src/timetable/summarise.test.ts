import fc from 'fast-check';
import { medianSorted } from 'simple-statistics';
import { describe, expect, it } from 'vitest';
import { aFeed, tablesOf, type FeedParts } from '../testing/feed';
import { deriveTurns } from './derive-turns';
import { weightedMedian } from './median';
import { readTimetable } from './reading';
import { runningDates } from './service-days';
import { summarise } from './summarise';
import type { Timetable } from './timetable';

function timetableOf(parts: FeedParts = {}): Timetable {
  const outcome = readTimetable(tablesOf(aFeed(parts)));
  if (!outcome.ok) throw new Error(JSON.stringify(outcome.error));
  return outcome.value.timetable;
}

const week = [
  ['WKD', '1111100', '20260302', '20260308'],
  ['SUN', '0000001', '20260302', '20260308'],
] as const;
const parts: FeedParts = {
  calendar: week,
  trains: [
    {
      id: 'T1',
      block: 'B',
      calls: [
        ['mill', '06:00:00'],
        ['harbor-1', '06:40:00'],
      ],
    },
    {
      id: 'T2',
      block: 'B',
      calls: [
        ['harbor-1', '06:47:00'],
        ['mill', '07:20:00'],
      ],
    },
    {
      id: 'T3',
      block: 'B',
      calls: [
        ['stonecrop', '08:00:00'],
        ['harbor-1', '08:40:00'],
      ],
    },
    {
      id: 'T4',
      block: 'B',
      calls: [
        ['harbor-1', '09:00:00'],
        ['stonecrop', '09:40:00'],
      ],
    },
    {
      id: 'S1',
      service: 'SUN',
      block: 'S',
      calls: [
        ['mill', '06:00:00'],
        ['harbor-2', '06:40:00'],
      ],
    },
    {
      id: 'S2',
      service: 'SUN',
      block: 'S',
      calls: [
        ['harbor-2', '07:00:00'],
        ['mill', '07:40:00'],
      ],
    },
  ],
};

describe('the summary of a timetable', () => {
  const { summary, problems } = summarise(timetableOf(parts), 520);

  it('counts trips, blocks and the turns of all days', () => {
    expect(summary).toMatchObject({
      trips: 6,
      blocks: 2,
      turns: 11,
      guessedTurns: 0,
      zone: 'America/New_York',
      agency: 'Cove Line',
    });
  });

  it('spans the days on which trains run', () => {
    expect(summary).toMatchObject({
      firstDate: '2026-03-02',
      lastDate: '2026-03-08',
      busiestDate: '2026-03-02',
    });
  });

  it('describes each station at which trains begin or end, most turns first', () => {
    expect(summary.stations.map((station) => [station.name, station.turns])).toEqual([
      ['Harbor Terminal', 11],
      ['Mill Road', 0],
      ['Stonecrop', 0],
    ]);
    expect(summary.stations[0]).toMatchObject({
      medianLayoverSeconds: 1200,
      shortByDesign: 5,
      platforms: ['1', '2'],
      turnsOnBusiestDay: 2,
      layovers: [
        { minutes: 7, turns: 1 },
        { minutes: 20, turns: 1 },
      ],
    });
    expect(summary.stations[1]?.medianLayoverSeconds).toBeNull();
  });

  it('names where trains change stations without running', () => {
    expect(summary.gaps).toEqual([{ fromStationId: 'mill', toStationId: 'stonecrop', pairs: 5 }]);
  });

  it('names turns that are short by design once a station', () => {
    expect(problems.map(({ severity, code, message }) => [severity, code, message])).toEqual([
      [
        'note',
        'turn.short_by_design',
        'Harbor Terminal: 5 turns on all days are short by design. They stand less than the 520 s that the steps need.',
      ],
    ]);
  });

  it('agrees with the turns of every single date', () => {
    const timetable = timetableOf({ ...parts, transfers: [['T4', 'T1', '4']] });
    const turns = runningDates(timetable).flatMap((date) => deriveTurns(timetable, date));
    const harbor = turns.filter((turn) => turn.stationId === 'harbor').map((turn) => turn.layoverSeconds);
    const counted = summarise(timetable, 520).summary;
    expect(counted.turns).toBe(turns.length);
    expect(counted.stations[0]?.medianLayoverSeconds).toBe(
      medianSorted(harbor.sort((one, other) => one - other)),
    );
  });

  it('counts guesses apart', () => {
    const loose = parts.trains?.map((train) => ({ ...train, block: '' }));
    const guessed = summarise(timetableOf({ ...parts, trains: loose ?? [] }), 520).summary;
    expect(guessed).toMatchObject({ turns: 0, blocks: 0, guessedTurns: 6 });
  });
});

describe('the median of values that stand several times', () => {
  it('is that of a statistics library over the values written out', () => {
    const weighted = fc.record({
      value: fc.integer({ min: -50, max: 50 }),
      weight: fc.integer({ min: 0, max: 5 }),
    });
    fc.assert(
      fc.property(fc.array(weighted, { maxLength: 20 }), (values) => {
        const all = values.flatMap(({ value, weight }) => Array.from({ length: weight }, () => value));
        const sorted = all.sort((one, other) => one - other);
        expect(weightedMedian(values)).toBe(sorted.length === 0 ? null : medianSorted(sorted));
      }),
      { seed: 71 },
    );
  });
});
