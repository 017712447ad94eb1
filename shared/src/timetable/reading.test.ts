import { describe, expect, it } from 'vitest';
import { aFeed, tablesOf, type FeedParts, type FeedTexts, type FeedTrain } from '../testing/feed';
import { deriveTurns } from './derive-turns';
import { problemsKeptOfOneKind } from './problem';
import { readTimetable } from './reading';
import { parseRouteTypes } from './route-types';
import type { Timetable } from './timetable';

const monday = '2026-03-02';

function read(texts: FeedTexts) {
  const outcome = readTimetable(tablesOf(texts));
  return outcome.ok
    ? { timetable: outcome.value.timetable, problems: outcome.value.problems }
    : { timetable: null, problems: outcome.error };
}

function timetableOf(texts: FeedTexts): Timetable {
  const { timetable, problems } = read(texts);
  if (timetable === null) throw new Error(JSON.stringify(problems));
  return timetable;
}

const pairsOn = (texts: FeedTexts, date = monday): string[] =>
  deriveTurns(timetableOf(texts), date).map((turn) => `${turn.inboundTripId}>${turn.outboundTripId}`);

const codes = (texts: FeedTexts): string[] =>
  read(texts).problems.map(
    ({ severity, file, line, code }) => `${severity} ${file ?? ''}:${line ?? ''} ${code}`,
  );

const edited = (file: string, change: (text: string) => string, parts: FeedParts = {}): FeedTexts => {
  const texts = aFeed(parts);
  return { ...texts, [file]: change(texts[file] ?? '') };
};

describe('a feed as it comes', () => {
  it('is read without a problem', () => {
    expect(codes(aFeed())).toEqual([]);
    expect(pairsOn(aFeed())).toEqual(['T1>T2', 'T2>T3']);
  });

  it.each([
    ['a byte order mark', (text: string) => `\uFEFF${text}`],
    ['carriage returns', (text: string) => text.replaceAll('\n', '\r\n')],
    [
      'blanks round column names',
      (text: string) => text.replace(/^.*$/m, (line) => line.replaceAll(',', ' , ')),
    ],
    ['blanks round values', (text: string) => text.replaceAll(',', ' ,\t')],
    ['columns it does not know', (text: string) => text.replaceAll(/$(?<!^)/gm, ',more')],
    ['a blank row', (text: string) => `${text}\n\n`],
    [
      'rows in the other order',
      (text: string) => {
        const [header = '', ...rows] = text.trim().split('\n');
        return [header, ...rows.reverse()].join('\n');
      },
    ],
  ])('may have %s', (_, change) => {
    const texts = Object.fromEntries(Object.entries(aFeed()).map(([file, text]) => [file, change(text)]));
    expect(timetableOf(texts).trips).toHaveLength(3);
    expect(pairsOn(texts)).toEqual(['T1>T2', 'T2>T3']);
  });

  it('keeps blanks inside an id and drops those round it', () => {
    const texts = edited('trips.txt', (text) => text.replaceAll('B 1', '  117  1 '));
    expect(timetableOf(texts).trips.map((trip) => trip.blockId)).toEqual(['117  1', '117  1', '117  1']);
  });

  it('may have columns in another order', () => {
    const swap = (line: string): string => line.split(',').reverse().join(',');
    const texts = edited('stop_times.txt', (text) => text.split('\n').map(swap).join('\n'));
    expect(pairsOn(texts)).toEqual(['T1>T2', 'T2>T3']);
  });

  it('may name its days in calendar_dates alone', () => {
    const days = [['WKD', '20260302', '1']] as const;
    expect(pairsOn(aFeed({ calendar: [], calendarDates: days }))).toEqual(['T1>T2', 'T2>T3']);
    expect(pairsOn(aFeed({ calendar: [], calendarDates: days }), '2026-03-03')).toEqual([]);
  });

  it('runs on added days and not on removed ones', () => {
    const texts = aFeed({
      calendarDates: [
        ['WKD', '20260307', '1'],
        ['WKD', '20260302', '2'],
      ],
    });
    expect(pairsOn(texts, '2026-03-07')).toHaveLength(2);
    expect(pairsOn(texts, '2026-03-02')).toEqual([]);
    expect(pairsOn(texts, '2026-03-03')).toHaveLength(2);
  });

  it('counts first and last day of its calendar in', () => {
    const texts = aFeed({ calendar: [['WKD', '1111111', '20260302', '20260304']] });
    const days = ['2026-03-01', '2026-03-02', '2026-03-04', '2026-03-05'];
    expect(days.map((date) => pairsOn(texts, date).length)).toEqual([0, 2, 2, 0]);
  });

  it('uses the other time where one of two is blank', () => {
    const texts = edited('stop_times.txt', (text) =>
      text
        .replace('T1,3,harbor-1,06:40:00,06:40:00', 'T1,3,harbor-1,,06:40:00')
        .replace('07:00:00,07:00:00', '07:00:00,'),
    );
    expect(deriveTurns(timetableOf(texts), monday)[0]?.layoverSeconds).toBe(1200);
  });

  it('leaves buses aside, whatever is wrong with them', () => {
    const bus = { id: 'X', route: 'BUS', service: 'nobody', calls: [['harbor-2', 'soon'] as const] };
    const texts = aFeed({
      trains: [
        bus,
        {
          id: 'T1',
          calls: [
            ['mill', '06:00:00'],
            ['harbor-1', '06:40:00'],
          ],
        },
      ],
    });
    expect(codes(texts)).toEqual([]);
    expect(timetableOf(texts).trips.map((trip) => trip.tripId)).toEqual(['T1']);
  });

  it.each([
    [undefined, ['2', '100', '117'], ['3', '99', '118', '0']],
    ['0, 1', ['0', '1'], ['2', '100']],
    ['400-404', ['400', '404'], ['405', '2']],
  ])('is read for the route types %j', (types, wanted, unwanted) => {
    const kept = (type: string): boolean => {
      const tables = tablesOf(aFeed({ routes: [['R', type]] }));
      const wantedTypes = types === undefined ? undefined : (parseRouteTypes(types) ?? []);
      return readTimetable(tables, wantedTypes).ok;
    };
    expect(wanted.map(kept)).toEqual(wanted.map(() => true));
    expect(unwanted.map(kept)).toEqual(unwanted.map(() => false));
  });

  it.each(['', 'rail', '2,,3', '117-100', '2;3'])('is not read for the route types %j', (text) => {
    expect(parseRouteTypes(text)).toBeNull();
  });
});

describe('a feed is refused, with file and line,', () => {
  const without = (file: string): FeedTexts => {
    const { [file]: _, ...rest } = aFeed();
    return rest;
  };

  it.each(['agency.txt', 'stops.txt', 'routes.txt', 'trips.txt', 'stop_times.txt', 'calendar.txt'])(
    'without %s',
    (file) => expect(codes(without(file))).toContain(`refused ${file}: file.missing`),
  );

  it.each([
    ['agency.txt', 'agency_timezone'],
    ['stops.txt', 'stop_id'],
    ['routes.txt', 'route_type'],
    ['trips.txt', 'service_id'],
    ['trips.txt', 'trip_id'],
    ['calendar.txt', 'sunday'],
    ['calendar.txt', 'end_date'],
    ['stop_times.txt', 'arrival_time'],
    ['stop_times.txt', 'stop_sequence'],
  ])('when %s has no column %s', (file, column) => {
    const texts = edited(file, (text) => text.replace(column, 'something_else'));
    expect(codes(texts)).toContain(`refused ${file}:1 file.column_missing`);
  });

  it.each([
    [
      'a time that cannot be read',
      edited('stop_times.txt', (text) => text.replace('06:20:00', '6.20')),
      'refused stop_times.txt:3 time.unreadable',
    ],
    [
      'a date that cannot be read',
      edited('calendar.txt', (text) => text.replace('20261231', '20261331')),
      'refused calendar.txt:2 date.unreadable',
    ],
    [
      'a date that does not exist',
      aFeed({ calendarDates: [['WKD', '20260230', '1']] }),
      'refused calendar_dates.txt:2 date.unreadable',
    ],
    [
      'a weekday that is neither yes nor no',
      edited('calendar.txt', (text) => text.replace(',1,1,', ',1,x,')),
      'refused calendar.txt:2 day.unreadable',
    ],
    [
      'an order of calls that cannot be read',
      edited('stop_times.txt', (text) => text.replace('T1,2,', 'T1,b,')),
      'refused stop_times.txt:3 call.order_unreadable',
    ],
    ['a zone nobody knows', aFeed({ zone: 'America/Cove' }), 'refused agency.txt:2 agency.zone_unknown'],
    [
      'agencies in two zones',
      edited('agency.txt', (text) => `${text}2,Other,America/Chicago\n`),
      'refused agency.txt:3 agency.zones_differ',
    ],
    [
      'no agency at all',
      edited('agency.txt', (text) => text.split('\n')[0] ?? ''),
      'refused agency.txt: agency.none',
    ],
    ['no train', aFeed({ routes: [['R', '3']] }), 'refused trips.txt: trip.none'],
    [
      'a calendar of two hundred years',
      aFeed({ calendar: [['WKD', '1111111', '19000101', '20991231']] }),
      'refused calendar.txt:2 limit.days',
    ],
  ])('for %s', (_, texts, problem) => {
    const { timetable } = read(texts);
    expect(timetable).toBeNull();
    expect(codes(texts)).toContain(problem);
  });

  it('with every mistake named, not only the first', () => {
    const texts = edited('stop_times.txt', (text) =>
      text.replace('06:20:00,', 'a,').replace('07:20:00,', 'b,'),
    );
    expect(codes(texts)).toEqual([
      'refused stop_times.txt:3 time.unreadable',
      'refused stop_times.txt:6 time.unreadable',
    ]);
  });

  it('and a file with one mistake in every row is not repeated without end', () => {
    const rows = Array.from({ length: 5000 }, (_, index) => `Z${index},1,mill,08:00:00,08:00:00`).join('\n');
    const { problems } = read(edited('stop_times.txt', (text) => text + rows));
    expect(problems).toHaveLength(problemsKeptOfOneKind + 1);
    expect(problems.at(-1)?.message).toBe(
      `${5000 - problemsKeptOfOneKind} more of the same kind in this file.`,
    );
  });
});

describe('a part is left out and named, and the rest stands,', () => {
  const two = (id: string, block: string): FeedTrain[] => [
    {
      id,
      block,
      calls: [
        ['mill', '09:00:00'],
        ['harbor-1', '09:20:00'],
      ],
    },
  ];
  const usual = (more: FeedTrain[] = []): FeedTrain[] => [
    {
      id: 'T1',
      block: 'B1',
      calls: [
        ['stonecrop', '06:00:00'],
        ['mill', '06:20:00'],
        ['harbor-1', '06:40:00'],
      ],
    },
    {
      id: 'T2',
      block: 'B1',
      calls: [
        ['harbor-1', '07:00:00'],
        ['mill', '07:20:00'],
        ['stonecrop', '07:40:00'],
      ],
    },
    ...more,
  ];

  it.each([
    [
      'a trip with one stop time',
      { trains: usual([{ id: 'T9', calls: [['mill', '06:00:00']] }]) },
      'left-out trips.txt:4 trip.too_few_stops',
    ],
    [
      'a trip without stop times',
      { trains: usual([{ id: 'T9', calls: [] }]) },
      'left-out trips.txt:4 trip.too_few_stops',
    ],
    [
      'a service without days',
      {
        trains: usual(two('T9', 'B9').map((trip) => ({ ...trip, service: 'NIL' }))),
        calendar: [
          ['WKD', '1111100', '20260101', '20261231'],
          ['NIL', '0000000', '20260101', '20261231'],
        ],
      },
      'left-out calendar.txt:3 service.no_days',
    ],
    [
      'a service whose only day is removed',
      {
        trains: usual(two('T9', 'B9').map((trip) => ({ ...trip, service: 'ONE' }))),
        calendarDates: [
          ['ONE', '20260302', '1'],
          ['ONE', '20260302', '2'],
        ],
      },
      'left-out calendar_dates.txt:2 service.no_days',
    ],
    [
      'an unknown service',
      { trains: usual([{ id: 'T9', service: 'X', calls: [] }]) },
      'left-out trips.txt:4 trip.service_unknown',
    ],
    [
      'an unknown route',
      { trains: usual([{ id: 'T9', route: 'X', calls: [] }]) },
      'left-out trips.txt:4 trip.route_unknown',
    ],
    [
      'an unknown stop',
      {
        trains: usual([
          {
            id: 'T9',
            calls: [
              ['nowhere', '06:00:00'],
              ['mill', '06:10:00'],
            ],
          },
        ]),
      },
      'left-out stop_times.txt:8 call.stop_unknown',
    ],
    [
      'an end without a time',
      {
        trains: usual([
          {
            id: 'T9',
            calls: [
              ['mill', '06:00:00'],
              ['harbor-1', ''],
            ],
          },
        ]),
      },
      'left-out stop_times.txt:9 call.no_time',
    ],
    [
      'a trip that arrives before it leaves',
      {
        trains: usual([
          {
            id: 'T9',
            calls: [
              ['mill', '06:00:00'],
              ['harbor-1', '05:59:59'],
            ],
          },
        ]),
      },
      'left-out stop_times.txt:9 call.order_of_times',
    ],
    [
      'a spacing without exact times',
      { trains: usual(two('T9', 'B9')), frequencies: [['T9', '06:00:00', '07:00:00', '600', '0']] },
      'left-out frequencies.txt:2 frequency.inexact',
    ],
    [
      'a spacing of nothing',
      { trains: usual(two('T9', 'B9')), frequencies: [['T9', '06:00:00', '07:00:00', '0', '1']] },
      'left-out frequencies.txt:2 frequency.headway',
    ],
    [
      'a spacing of an unknown trip',
      { trains: usual(), frequencies: [['T9', '06:00:00', '07:00:00', '600', '1']] },
      'left-out frequencies.txt:2 frequency.trip_unknown',
    ],
    [
      'a link to an unknown trip',
      { trains: usual(), transfers: [['T1', 'T9', '4']] },
      'left-out transfers.txt:2 link.trip_unknown',
    ],
    [
      'a link that names no trip',
      { trains: usual(), transfers: [['T1', '', '5']] },
      'left-out transfers.txt:2 link.trip_unknown',
    ],
  ] satisfies [string, FeedParts, string][])('%s', (_, parts, problem) => {
    expect(codes(aFeed(parts))).toContain(problem);
    expect(pairsOn(aFeed(parts))).toEqual(['T1>T2']);
  });

  it('a stop time of an unknown trip', () => {
    const texts = edited('stop_times.txt', (text) => `${text}T9,1,mill,06:00:00,06:00:00\n`);
    expect(codes(texts)).toEqual(['left-out stop_times.txt:11 call.trip_unknown']);
    expect(pairsOn(texts)).toEqual(['T1>T2', 'T2>T3']);
  });

  it('a parent that is not in the file: the stop stands alone', () => {
    const texts = edited('stops.txt', (text) => text.replace('mill,Mill Road,', 'mill,Mill Road,annex'));
    expect(codes(texts)).toEqual(['left-out stops.txt:5 stop.parent_unknown']);
    expect(pairsOn(texts)).toEqual(['T1>T2', 'T2>T3']);
  });

  it('parents that bite their own tail', () => {
    const texts = edited('stops.txt', (text) =>
      text
        .replace('mill,Mill Road,', 'mill,Mill Road,stonecrop')
        .replace('stonecrop,Stonecrop,', 'stonecrop,Stonecrop,mill'),
    );
    expect(codes(texts)).toEqual(['left-out stops.txt:5 stop.parent_circle']);
    expect(read(texts).timetable).not.toBeNull();
  });

  it('a second row of the same trip, stop or call', () => {
    const again = (file: string, row: number): FeedTexts =>
      edited(file, (text) => `${text}${text.split('\n')[row] ?? ''}\n`);
    expect(codes(again('trips.txt', 1))).toEqual(['left-out trips.txt:5 trip.twice']);
    expect(codes(again('stops.txt', 1))).toEqual(['left-out stops.txt:7 stop.twice']);
    expect(codes(again('stop_times.txt', 1))).toEqual(['left-out stop_times.txt:11 call.twice']);
    expect(pairsOn(again('trips.txt', 1))).toEqual(['T1>T2', 'T2>T3']);
  });

  it('but a file of which no train remains is refused', () => {
    expect(codes(aFeed({ trains: [{ id: 'T1', calls: [] }] }))).toEqual([
      'refused trips.txt: trip.none_left',
      'left-out trips.txt:2 trip.too_few_stops',
    ]);
  });
});

describe('a day both added and removed', () => {
  it('is remarked and does not run', () => {
    const texts = aFeed({
      calendarDates: [
        ['WKD', '20260302', '1'],
        ['WKD', '20260302', '2'],
      ],
    });
    expect(codes(texts)).toEqual(['note calendar_dates.txt:3 day.twice']);
    expect(pairsOn(texts)).toEqual([]);
  });
});
