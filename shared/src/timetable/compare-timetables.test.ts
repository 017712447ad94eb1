import { describe, expect, it } from 'vitest';
import { aFeed, tablesOf, type FeedParts, type FeedTrain } from '../testing/feed';
import { compareTimetables } from './compare-timetables';
import { readTimetable } from './reading';
import type { Timetable } from './timetable';

function timetableOf(parts: FeedParts = {}): Timetable {
  const outcome = readTimetable(tablesOf(aFeed(parts)));
  if (!outcome.ok) throw new Error(JSON.stringify(outcome.error));
  return outcome.value.timetable;
}

/** Shuttles that come in at one minute past the hour and leave at another. */
const shuttle = (
  hour: string,
  arrives: string,
  leaves: string,
  names = [`${hour}in`, `${hour}out`],
): FeedTrain[] => [
  {
    id: `${hour}a`,
    shortName: names[0] ?? '',
    block: hour,
    calls: [
      ['mill', `${hour}:00:00`],
      ['harbor-1', `${hour}:${arrives}:00`],
    ],
  },
  {
    id: `${hour}b`,
    shortName: names[1] ?? '',
    block: hour,
    calls: [
      ['harbor-1', `${hour}:${leaves}:00`],
      ['mill', `${hour}:59:00`],
    ],
  },
];

const monday = '2026-03-02';
const old = timetableOf({
  trains: [...shuttle('06', '20', '40'), ...shuttle('07', '20', '40'), ...shuttle('08', '20', '40')],
});
const placeOf = (stationId: string): string | null => (stationId === 'harbor' ? 'HBR' : null);
const compare = (after: Timetable, before = old, dates = [monday]) =>
  compareTimetables({ before, after, dates, placeOf });

describe('two timetables', () => {
  it('that are alike differ in nothing', () => {
    expect(compare(old)).toEqual({
      dates: [
        { serviceDate: monday, againstDate: monday, place: 'HBR', same: 3, added: 0, removed: 0, moved: 0 },
      ],
      turns: [],
    });
  });

  it('differ by turns added, removed and moved', () => {
    const after = timetableOf({
      trains: [...shuttle('06', '20', '40'), ...shuttle('07', '20', '35'), ...shuttle('09', '20', '40')],
    });
    const { dates, turns } = compare(after);
    expect(dates).toMatchObject([{ same: 1, added: 1, removed: 1, moved: 1 }]);
    expect(
      turns.map(({ change, before, after: now }) => [change, before?.inboundTrain, now?.inboundTrain]),
    ).toEqual([
      ['moved', '07in', '07in'],
      ['added', undefined, '09in'],
      ['removed', '08in', undefined],
    ]);
    expect(turns[0]?.before?.layoverSeconds).toBe(1200);
    expect(turns[0]?.after?.layoverSeconds).toBe(900);
  });

  it('may call the same trains differently', () => {
    const after = timetableOf({
      trains: [
        ...shuttle('06', '20', '40', ['901', '902']),
        ...shuttle('07', '20', '40'),
        ...shuttle('08', '20', '40'),
      ],
    });
    expect(compare(after).dates).toMatchObject([{ same: 3, moved: 0 }]);
  });

  it('may pair an arrival with another departure', () => {
    const after = timetableOf({
      trains: [
        ...shuttle('06', '20', '45', ['06in', '07out']),
        ...shuttle('07', '25', '40', ['07in', '06out']),
        ...shuttle('08', '20', '40'),
      ],
    });
    expect(compare(after).dates).toMatchObject([{ same: 1, moved: 2, added: 0, removed: 0 }]);
  });

  it('are compared on a like weekday where the older one does not reach so far', () => {
    const winter = timetableOf({ calendar: [['WKD', '1111100', '20260101', '20260308']] });
    const spring = timetableOf({ calendar: [['WKD', '1111100', '20260309', '20260607']] });
    const against = (date: string): string | null | undefined =>
      compare(spring, winter, [date]).dates[0]?.againstDate;
    expect(against('2026-03-10')).toBe('2026-03-03');
    expect(against('2026-03-13')).toBe('2026-03-06');
    expect(compare(winter, spring, ['2026-01-06']).dates[0]?.againstDate).toBe('2026-03-10');
  });
});
