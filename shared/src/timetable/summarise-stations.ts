import type { DayPattern } from './day-patterns';
import type { DerivedTurn } from './derive-turns';
import { weightedMedian } from './median';
import { terminalTracks } from './terminal-tracks';
import { groupBy, stationIdOf, type TripIndex } from './trip-index';

/** A station where trains begin, end or turn. */
export interface StationSummary {
  stationId: string;
  name: string;
  /** Turns on all days; guessed ones are not among them. */
  turns: number;
  guessedTurns: number;
  /** Half of all turns stand shorter; null without turns. */
  medianLayoverSeconds: number | null;
  /** Turns on all days whose layover is below the shortest turn of the step plan. */
  shortByDesign: number;
  /** Labels of the tracks its platforms suggest. */
  platforms: string[];
  /** Turns on the busiest day, and how many of them stand so many whole minutes. */
  turnsOnBusiestDay: number;
  layovers: { minutes: number; turns: number }[];
}

const sum = (values: readonly number[]): number => values.reduce((total, value) => total + value, 0);

/** Sums up every station at which trains begin or end; the one with most turns first. */
export function summariseStations(
  index: TripIndex,
  patterns: readonly DayPattern[],
  { busiest, shortestTurnSeconds }: { busiest: DayPattern | undefined; shortestTurnSeconds: number },
): StationSummary[] {
  const stationOf = (stopId: string): string => stationIdOf(index, stopId);
  const ends = index.timetable.trips.flatMap((trip) => [
    stationOf(trip.firstStopId),
    stationOf(trip.lastStopId),
  ]);
  const weighted = patterns.flatMap(({ turns, dates }) =>
    turns.map((turn) => ({ turn, weight: dates.length })),
  );
  const byStation = groupBy(weighted, ({ turn }) => turn.stationId);
  const onBusiest = groupBy(busiest?.turns ?? [], (turn) => turn.stationId);
  return [...new Set(ends)]
    .map((stationId): StationSummary => {
      const all = byStation.get(stationId) ?? [];
      const sure = all.filter(({ turn }) => !turn.guessed);
      const day = onBusiest.get(stationId) ?? [];
      return {
        stationId,
        name: index.stops.get(stationId)?.name ?? stationId,
        turns: sum(sure.map(({ weight }) => weight)),
        guessedTurns: sum(all.map(({ turn, weight }) => (turn.guessed ? weight : 0))),
        medianLayoverSeconds: weightedMedian(
          sure.map(({ turn, weight }) => ({ value: turn.layoverSeconds, weight })),
        ),
        shortByDesign: sum(sure.map(({ turn, weight }) => (isShort(turn, shortestTurnSeconds) ? weight : 0))),
        platforms: terminalTracks(index.timetable, [stationId]).labels,
        turnsOnBusiestDay: day.length,
        layovers: layoversOf(day),
      };
    })
    .sort((one, other) => other.turns - one.turns || (one.name < other.name ? -1 : 1));
}

function isShort(turn: DerivedTurn, shortestTurnSeconds: number): boolean {
  return turn.reverses && turn.layoverSeconds < shortestTurnSeconds;
}

function layoversOf(turns: readonly DerivedTurn[]): { minutes: number; turns: number }[] {
  const byMinute = groupBy(turns, (turn) => String(Math.floor(turn.layoverSeconds / 60)));
  return [...byMinute]
    .map(([minutes, group]) => ({ minutes: Number(minutes), turns: group.length }))
    .sort((one, other) => one.minutes - other.minutes);
}
