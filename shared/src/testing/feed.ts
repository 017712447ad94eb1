import type { FeedTables } from '../timetable/reading';
import { isFeedFile } from '../timetable/feed-files';

/** A train of a made-up feed. Calls are stop, arrival and departure; one time stands for both. */
export interface FeedTrain {
  id: string;
  route?: string;
  service?: string;
  block?: string;
  shortName?: string;
  direction?: string;
  calls: (readonly [stop: string, arrival: string, departure?: string])[];
}

/** Parts of a made-up feed; what is absent is filled in with a small railroad. */
export interface FeedParts {
  zone?: string;
  /** Rows of stops: id, name, parent, platform code, stop code, location type. */
  stops?: readonly (readonly string[])[];
  /** Rows of routes: id, type. */
  routes?: readonly (readonly string[])[];
  /** Rows of the weekly rules: id, seven days as `1111100`, first and last date. */
  calendar?: readonly (readonly [id: string, days: string, from: string, to: string])[];
  /** Rows of days added (1) and removed (2). */
  calendarDates?: readonly (readonly [id: string, date: string, kind: string])[];
  trains?: readonly FeedTrain[];
  /** Rows of spacings: trip, from, to, seconds, exact. */
  frequencies?: readonly (readonly string[])[];
  /** Rows of links: from trip, to trip, type. */
  transfers?: readonly (readonly string[])[];
}

/** Text of each file of a feed, by file name. */
export type FeedTexts = Record<string, string>;

const harbor = [
  ['harbor', 'Harbor Terminal', '', '', '', '1'],
  ['harbor-1', 'Harbor Terminal', 'harbor', '1', '', '0'],
  ['harbor-2', 'Harbor Terminal', 'harbor', '2', '', '0'],
  ['mill', 'Mill Road', '', '', '', '0'],
  ['stonecrop', 'Stonecrop', '', '', '', '0'],
] as const;

const shuttle: FeedTrain[] = [
  {
    id: 'T1',
    block: 'B 1',
    calls: [
      ['stonecrop', '06:00:00'],
      ['mill', '06:20:00'],
      ['harbor-1', '06:40:00'],
    ],
  },
  {
    id: 'T2',
    block: 'B 1',
    calls: [
      ['harbor-1', '07:00:00'],
      ['mill', '07:20:00'],
      ['stonecrop', '07:40:00'],
    ],
  },
  {
    id: 'T3',
    block: 'B 1',
    calls: [
      ['stonecrop', '08:00:00'],
      ['mill', '08:20:00'],
      ['harbor-2', '08:40:00'],
    ],
  },
];

const table = (header: string, rows: readonly (readonly string[])[]): string =>
  [header, ...rows.map((row) => row.join(','))].join('\n') + '\n';

/** A small feed of an invented railroad: trains T1, T2, T3 of one block on weekdays of 2026, unless told otherwise. */
export function aFeed(parts: FeedParts = {}): FeedTexts {
  const trains = parts.trains ?? shuttle;
  const calendar = parts.calendar ?? [['WKD', '1111100', '20260101', '20261231'] as const];
  const texts: FeedTexts = {
    'agency.txt': table('agency_id,agency_name,agency_timezone', [
      ['1', 'Cove Line', parts.zone ?? 'America/New_York'],
    ]),
    'stops.txt': table(
      'stop_id,stop_name,parent_station,platform_code,stop_code,location_type',
      parts.stops ?? harbor,
    ),
    'routes.txt': table(
      'route_id,route_type',
      parts.routes ?? [
        ['R', '2'],
        ['BUS', '3'],
      ],
    ),
    'trips.txt': table(
      'trip_id,route_id,service_id,block_id,trip_short_name,direction_id',
      trains.map((train) => [
        ...[train.id, train.route ?? 'R', train.service ?? 'WKD', train.block ?? ''],
        ...[train.shortName ?? '', train.direction ?? ''],
      ]),
    ),
    'stop_times.txt': table(
      'trip_id,stop_sequence,stop_id,arrival_time,departure_time',
      trains.flatMap((train) =>
        train.calls.map(([stop, arrival, departure = arrival], index) => [
          ...[train.id, String(index + 1), stop, arrival, departure],
        ]),
      ),
    ),
  };
  if (calendar.length > 0) {
    const header = 'service_id,monday,tuesday,wednesday,thursday,friday,saturday,sunday,start_date,end_date';
    texts['calendar.txt'] = table(
      header,
      calendar.map(([id, days, from, to]) => [id, ...days, from, to]),
    );
  }
  if (parts.calendarDates)
    texts['calendar_dates.txt'] = table('service_id,date,exception_type', parts.calendarDates);
  if (parts.frequencies) {
    texts['frequencies.txt'] = table(
      'trip_id,start_time,end_time,headway_secs,exact_times',
      parts.frequencies,
    );
  }
  if (parts.transfers)
    texts['transfers.txt'] = table('from_trip_id,to_trip_id,transfer_type', parts.transfers);
  return texts;
}

/** Splits the texts of a feed into cells, as far as they hold no quotes. */
export function tablesOf(texts: FeedTexts): FeedTables {
  const tables: FeedTables = {};
  for (const [file, text] of Object.entries(texts)) {
    if (!isFeedFile(file)) continue;
    const [header = [], ...rows] = text.split(/\r?\n/).map((line) => line.split(','));
    tables[file] = {
      header,
      rows: rows
        .map((cells, index) => ({ cells, line: index + 2 }))
        .filter(({ cells }) => cells.join('') !== ''),
    };
  }
  return tables;
}
