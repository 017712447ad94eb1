import type { CalendarDate } from '../lib/instant';
import { dayPatterns, type DayPattern } from './day-patterns';
import type { ImportProblem } from './problem';
import { summariseStations, type StationSummary } from './summarise-stations';
import type { Timetable, TimetableTrip } from './timetable';
import { indexTrips, stationIdOf, type TripIndex } from './trip-index';

/** Two stations between which trains change over without running: one real place, or an empty run. */
export interface StationGap {
  fromStationId: string;
  toStationId: string;
  /** Pairs on all days. */
  pairs: number;
}

/** What a timetable holds, over all its days. */
export interface TimetableSummary {
  trips: number;
  blocks: number;
  turns: number;
  guessedTurns: number;
  firstDate: CalendarDate | null;
  lastDate: CalendarDate | null;
  /** The first of the days with the most turns. */
  busiestDate: CalendarDate | null;
  zone: string;
  agency: string;
  stations: StationSummary[];
  gaps: StationGap[];
}

const distinct = (values: readonly string[]): number => new Set(values).size;
const sum = (values: readonly number[]): number => values.reduce((total, value) => total + value, 0);

/**
 * Sums a timetable up over all its days and names what had to be left out. `shortestTurnSeconds` is the shortest turn
 * of the step plan at typical durations, in seconds; turns that reverse and stand shorter are short by design.
 */
export function summarise(
  timetable: Timetable,
  shortestTurnSeconds: number,
): { summary: TimetableSummary; problems: ImportProblem[] } {
  const index = indexTrips(timetable);
  const patterns = dayPatterns(index);
  const dates = patterns.flatMap((pattern) => pattern.dates).sort();
  const busiest = busiestOf(patterns);
  const stations = summariseStations(index, patterns, { busiest, shortestTurnSeconds });
  const summary: TimetableSummary = {
    trips: distinct(timetable.trips.map((trip) => trip.tripId)),
    blocks: distinct(timetable.trips.map((trip) => trip.blockId).filter((blockId) => blockId !== null)),
    turns: sum(stations.map((station) => station.turns)),
    guessedTurns: sum(stations.map((station) => station.guessedTurns)),
    firstDate: dates[0] ?? null,
    lastDate: dates.at(-1) ?? null,
    busiestDate: busiest?.dates[0] ?? null,
    zone: timetable.zone,
    agency: timetable.agency,
    stations,
    gaps: gapsOf(index, patterns),
  };
  const problems = [...overlapProblems(patterns), ...shortProblems(stations, shortestTurnSeconds)];
  return { summary, problems };
}

function busiestOf(patterns: readonly DayPattern[]): DayPattern | undefined {
  return [...patterns].sort(
    (one, other) =>
      other.turns.length - one.turns.length || ((one.dates[0] ?? '') < (other.dates[0] ?? '') ? -1 : 1),
  )[0];
}

function gapsOf(index: TripIndex, patterns: readonly DayPattern[]): StationGap[] {
  const stationOf = (stopId: string): string => stationIdOf(index, stopId);
  const gaps = new Map<string, StationGap>();
  for (const { apart, dates } of patterns) {
    for (const { inbound, outbound } of apart) {
      const fromStationId = stationOf(inbound.lastStopId);
      const toStationId = stationOf(outbound.firstStopId);
      const key = JSON.stringify([fromStationId, toStationId]);
      const gap = gaps.get(key) ?? { fromStationId, toStationId, pairs: 0 };
      gaps.set(key, { ...gap, pairs: gap.pairs + dates.length });
    }
  }
  return [...gaps.values()].sort((one, other) => other.pairs - one.pairs);
}

function overlapProblems(patterns: readonly DayPattern[]): ImportProblem[] {
  const found = new Map<string, { inbound: TimetableTrip; outbound: TimetableTrip; dates: number }>();
  for (const { overlaps, dates } of patterns) {
    for (const { inbound, outbound } of overlaps) {
      const key = JSON.stringify([
        inbound.tripId,
        inbound.departureSeconds,
        outbound.tripId,
        outbound.departureSeconds,
      ]);
      const known = found.get(key)?.dates ?? 0;
      found.set(key, { inbound, outbound, dates: known + dates.length });
    }
  }
  return [...found.values()].map(({ inbound, outbound, dates }) => ({
    severity: 'left-out',
    file: 'trips.txt',
    line: outbound.line,
    code: 'block.overlap',
    message:
      `Block “${outbound.blockId ?? ''}”: train ${outbound.train} leaves before ${inbound.train} is in, ` +
      `on ${dates} ${dates === 1 ? 'date' : 'dates'}. No turn on those dates.`,
  }));
}

/** Turns that are short by design are named once, here, and later raise only when worse than their own schedule. */
function shortProblems(stations: readonly StationSummary[], shortestTurnSeconds: number): ImportProblem[] {
  return stations
    .filter((station) => station.shortByDesign > 0)
    .map((station) => ({
      severity: 'note',
      file: null,
      line: null,
      code: 'turn.short_by_design',
      message:
        `${station.name}: ${station.shortByDesign} turns on all days are short by design. ` +
        `They stand less than the ${shortestTurnSeconds} s that the steps need.`,
    }));
}
