/** The files of a GTFS zip that are read, in the order in which they must be: each speaks only of earlier ones. */
export const FEED_FILES = [
  'agency.txt',
  'stops.txt',
  'routes.txt',
  'calendar.txt',
  'calendar_dates.txt',
  'trips.txt',
  'frequencies.txt',
  'transfers.txt',
  'stop_times.txt',
] as const;
export type FeedFile = (typeof FEED_FILES)[number];

/** Files without which there is nothing to read. Of the two calendars one is enough. */
export const REQUIRED_FEED_FILES: readonly FeedFile[] = [
  'agency.txt',
  'stops.txt',
  'routes.txt',
  'trips.txt',
  'stop_times.txt',
];

/** Days of the weekly rule in the order of `weekdayOf`. */
export const weekdayColumns = [
  'monday',
  'tuesday',
  'wednesday',
  'thursday',
  'friday',
  'saturday',
  'sunday',
] as const;

/** Columns a file must have to be read at all. Columns that are not named here are optional or not looked at. */
export const requiredColumns: Record<FeedFile, readonly string[]> = {
  'agency.txt': ['agency_timezone'],
  'stops.txt': ['stop_id'],
  'routes.txt': ['route_id', 'route_type'],
  'calendar.txt': ['service_id', ...weekdayColumns, 'start_date', 'end_date'],
  'calendar_dates.txt': ['service_id', 'date', 'exception_type'],
  'trips.txt': ['route_id', 'service_id', 'trip_id'],
  'frequencies.txt': ['trip_id', 'start_time', 'end_time', 'headway_secs'],
  'transfers.txt': ['transfer_type'],
  'stop_times.txt': ['trip_id', 'arrival_time', 'departure_time', 'stop_id', 'stop_sequence'],
};

/** Whether a name is that of a file that is read. */
export function isFeedFile(name: string): name is FeedFile {
  return (FEED_FILES as readonly string[]).includes(name);
}
