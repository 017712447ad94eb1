import { buildTimetable, type ReadOutcome } from './build-timetable';
import { createDraft, problemsOf, type RowReader, type TimetableDraft } from './draft';
import { FEED_FILES, requiredColumns, type FeedFile } from './feed-files';
import { agencyReader } from './read-agency';
import { calendarDateReader, calendarReader } from './read-calendar';
import { frequencyReader } from './read-frequencies';
import { routeReader } from './read-routes';
import { stopTimeReader } from './read-stop-times';
import { stopReader } from './read-stops';
import { transferReader } from './read-transfers';
import { tripReader } from './read-trips';
import { railRouteTypes, type RouteTypes } from './route-types';

/** Cells of one row as they stand in the file, and the line it starts on. */
export interface FeedRow {
  line: number;
  cells: readonly string[];
}

/** A feed that is being read, file by file in the order of `FEED_FILES`. */
export interface TimetableReading {
  /** Begins a file with its header and gives back what takes its rows. */
  open(file: FeedFile, header: readonly string[]): (row: FeedRow) => void;
  /** Ends the reading. */
  finish(): ReadOutcome;
}

const readers: Record<FeedFile, (draft: TimetableDraft) => RowReader> = {
  'agency.txt': agencyReader,
  'stops.txt': stopReader,
  'routes.txt': routeReader,
  'calendar.txt': calendarReader,
  'calendar_dates.txt': calendarDateReader,
  'trips.txt': tripReader,
  'frequencies.txt': frequencyReader,
  'transfers.txt': transferReader,
  'stop_times.txt': stopTimeReader,
};

/**
 * Begins to read a GTFS feed for the routes of some types (rail when absent). Blanks round ids, values and column
 * names are dropped, those inside are kept; rows may come in any order.
 */
export function createTimetableReading(routeTypes: RouteTypes = railRouteTypes): TimetableReading {
  const draft = createDraft(routeTypes);
  return { open: (file, header) => openFile(draft, file, header), finish: () => buildTimetable(draft) };
}

function openFile(draft: TimetableDraft, file: FeedFile, header: readonly string[]): (row: FeedRow) => void {
  draft.filesSeen.add(file);
  const names = header.map((name) => name.replace(/^\uFEFF/, '').trim());
  const columns = new Map(names.map((name, index) => [name, index] as const).reverse());
  const missing = requiredColumns[file].filter((column) => !columns.has(column));
  for (const column of missing) {
    problemsOf(draft, file).refuse(1, 'file.column_missing', `The column ${column} is missing.`);
  }
  if (missing.length > 0) return () => undefined;
  const reader = readers[file](draft);
  let cells: readonly string[] = [];
  const field = (column: string): string => {
    const index = columns.get(column);
    return index === undefined ? '' : (cells[index]?.trim() ?? '');
  };
  return (row) => {
    cells = row.cells;
    reader(field, row.line);
  };
}

/** A whole feed in memory: header and rows of each file. */
export type FeedTables = Partial<Record<FeedFile, { header: readonly string[]; rows: readonly FeedRow[] }>>;

/** Reads a feed that is in memory as a whole. */
export function readTimetable(tables: FeedTables, routeTypes: RouteTypes = railRouteTypes): ReadOutcome {
  const reading = createTimetableReading(routeTypes);
  for (const file of FEED_FILES) {
    const table = tables[file];
    if (table !== undefined) table.rows.forEach(reading.open(file, table.header));
  }
  return reading.finish();
}
