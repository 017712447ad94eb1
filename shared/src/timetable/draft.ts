import type { CalendarDate } from '../lib/instant';
import type { FeedFile } from './feed-files';
import { createProblemLog, type ProblemLog, type ProblemSeverity } from './problem';
import type { RouteTypes } from './route-types';

export interface DraftStop {
  stopId: string;
  name: string;
  code: string | null;
  platform: string | null;
  parentId: string | null;
  /** GTFS location type; 0 is a stop or platform, 1 a station. */
  locationType: string;
  line: number;
  calledAt: 'by-train' | 'by-others' | 'never';
}

export interface DraftService {
  serviceId: string;
  weekdays: boolean[];
  from: CalendarDate | null;
  to: CalendarDate | null;
  added: Set<CalendarDate>;
  removed: Set<CalendarDate>;
  file: FeedFile;
  line: number;
}

export interface DraftCall {
  sequence: number;
  stopId: string;
  arrivalSeconds: number | null;
  departureSeconds: number | null;
  line: number;
}

/** Runs at a fixed spacing; the trip's own times then only give the distances. */
export interface DraftWindow {
  fromSeconds: number;
  toSeconds: number;
  headwaySeconds: number;
}

export interface DraftTrip {
  tripId: string;
  shortName: string | null;
  serviceId: string;
  blockId: string | null;
  direction: string | null;
  line: number;
  calls: DraftCall[];
  /** Null for a trip that runs once, at its own times. */
  windows: DraftWindow[] | null;
}

/** What has been gathered of the files so far. */
export interface TimetableDraft {
  routeTypes: RouteTypes;
  problems: ProblemLog;
  filesSeen: Set<FeedFile>;
  agency: { name: string; zone: string } | null;
  stops: Map<string, DraftStop>;
  /** Whether trains run on the route, by route id. */
  routes: Map<string, boolean>;
  services: Map<string, DraftService>;
  trips: Map<string, DraftTrip>;
  /** Trips that are in the file but not read, and whether because of their mode or because something is wrong. */
  passedOver: Map<string, 'other-mode' | 'left-out'>;
  links: { fromTripId: string; toTripId: string; line: number }[];
}

export function createDraft(routeTypes: RouteTypes): TimetableDraft {
  return {
    routeTypes,
    problems: createProblemLog(),
    filesSeen: new Set(),
    agency: null,
    stops: new Map(),
    routes: new Map(),
    services: new Map(),
    trips: new Map(),
    passedOver: new Map(),
    links: [],
  };
}

/** Value of a column in the row at hand, blanks round it dropped; empty when the column or the value is missing. */
export type FieldOf = (column: string) => string;

/** Takes one row of one file. */
export type RowReader = (field: FieldOf, line: number) => void;

/** Writes down problems of one file. */
export function problemsOf(draft: TimetableDraft, file: FeedFile) {
  const write =
    (severity: ProblemSeverity) =>
    (line: number | null, code: string, message: string): void =>
      draft.problems.add({ severity, file, line, code, message });
  return { refuse: write('refused'), leaveOut: write('left-out'), note: write('note') };
}

/** An empty text counts as nothing said. */
export function orNull(text: string): string | null {
  return text === '' ? null : text;
}
