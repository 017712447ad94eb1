import { demoAgency, demoLines, demoTerminals, demoZone } from './geography';
import { tripsOfDay, type DayPattern, type DemoTrip } from './rotation';

/** First and last service date of the demo's timetable, `YYYY-MM-DD`. */
export interface ServicePeriod {
  from: string;
  to: string;
}

const slug = (name: string): string => name.toLowerCase().replace(/[^a-z]+/g, '-');
const compact = (date: string): string => date.replaceAll('-', '');
const platformId = (stationId: string, track: string): string => `${stationId}-${track}`;

function clock(minute: number): string {
  const two = (value: number) => String(value).padStart(2, '0');
  return `${two(Math.floor(minute / 60))}:${two(Math.floor(minute % 60))}:00`;
}

const csv = (rows: ReadonlyArray<readonly string[]>): string =>
  rows.map((row) => row.join(',')).join('\n') + '\n';

function stopsFile(): string {
  const stations = demoTerminals.flatMap((terminal) => [
    [terminal.stationId, terminal.name, '1', '', ''],
    ...terminal.tracks.map((track) => [
      platformId(terminal.stationId, track.label),
      `${terminal.name} track ${track.label}`,
      '0',
      terminal.stationId,
      track.label,
    ]),
  ]);
  const between = [...new Set(demoLines.flatMap((line) => line.between))].map((name) => [
    slug(name),
    name,
    '0',
    '',
    '',
  ]);
  return csv([
    ['stop_id', 'stop_name', 'location_type', 'parent_station', 'platform_code'],
    ...stations,
    ...between,
  ]);
}

function stopTimesOf(trip: DemoTrip, tripId: string): string[][] {
  const outward = trip.fromStation === 'ostrel-quay';
  const middle = (outward ? trip.line.between : [...trip.line.between].reverse()).map(slug);
  const stops = [
    platformId(trip.fromStation, trip.fromTrack),
    ...middle,
    platformId(trip.toStation, trip.toTrack),
  ];
  const minutesApart = (trip.arrivesMinute - trip.departsMinute) / (stops.length - 1);
  return stops.map((stop, index) => {
    const time = clock(Math.round(trip.departsMinute + index * minutesApart));
    return [tripId, time, time, stop, String(index + 1)];
  });
}

const patterns: ReadonlyArray<{ pattern: DayPattern; serviceId: string; days: string }> = [
  { pattern: 'weekday', serviceId: 'weekdays', days: '1111100' },
  { pattern: 'weekend', serviceId: 'weekends', days: '0000011' },
];

/** The demo's timetable as the files of a GTFS feed: name of the file → its text. */
export function demoTimetableFiles(period: ServicePeriod): Record<string, string> {
  const weekdays = ['monday', 'tuesday', 'wednesday', 'thursday', 'friday', 'saturday', 'sunday'];
  const planned = patterns.flatMap(({ pattern, serviceId }) =>
    tripsOfDay(pattern).map((trip) => ({ trip, serviceId, tripId: `${serviceId}-${trip.train}` })),
  );
  return {
    'agency.txt': csv([
      ['agency_id', 'agency_name', 'agency_url', 'agency_timezone'],
      ['ovr', demoAgency, 'https://ostrel-valley.example', demoZone],
    ]),
    'routes.txt': csv([
      ['route_id', 'agency_id', 'route_short_name', 'route_long_name', 'route_type'],
      ...demoLines.map((line) => [line.routeId, 'ovr', line.name, line.name, '2']),
    ]),
    'stops.txt': stopsFile(),
    'calendar.txt': csv([
      ['service_id', ...weekdays, 'start_date', 'end_date'],
      ...patterns.map((row) => [row.serviceId, ...row.days, compact(period.from), compact(period.to)]),
    ]),
    'trips.txt': csv([
      ['route_id', 'service_id', 'trip_id', 'trip_short_name', 'direction_id', 'block_id'],
      ...planned.map(({ trip, serviceId, tripId }) => [
        trip.line.routeId,
        serviceId,
        tripId,
        trip.train,
        trip.fromStation === 'ostrel-quay' ? '0' : '1',
        trip.block,
      ]),
    ]),
    'stop_times.txt': csv([
      ['trip_id', 'arrival_time', 'departure_time', 'stop_id', 'stop_sequence'],
      ...planned.flatMap(({ trip, tripId }) => stopTimesOf(trip, tripId)),
    ]),
  };
}
