import type { CalendarDate, Instant } from '../lib/instant';
import { dayServices, reversesHint, timesOf } from './derive-turns';
import { pairDay, type DayPairs, type PlaceOf, type TrainPair } from './pairs';
import { serviceInstant } from './service-day';
import { terminalTracks } from './terminal-tracks';
import type { Timetable, TimetableTrip } from './timetable';
import { indexTrips, stationIdOf, type TripIndex } from './trip-index';

/** A terminal and the stations of a timetable that it is made of. */
export interface TerminalChoice {
  code: string;
  name: string;
  stationIds: readonly string[];
}

/** A turn as a timetable plans it at a terminal, ready to be opened. */
export interface PlannedOpening {
  /** Names the turn among those of its terminal and service date; the same in any timetable with these trains. */
  pairKey: string;
  terminal: string;
  serviceDate: CalendarDate;
  kind: 'turn' | 'first-out' | 'tie-up';
  inboundTrain: string | null;
  outboundTrain: string | null;
  scheduledArrivalAt: Instant | null;
  scheduledDepartureAt: Instant | null;
  /** Label of the platform's track; null when the timetable names no platform. */
  track: string | null;
  /** The block, which stands for the set until one is named. */
  block: string | null;
  reverses: boolean | null;
}

/** What is asked of a timetable when turns are opened. */
export interface OpeningsQuestion {
  serviceDate: CalendarDate;
  terminals: readonly TerminalChoice[];
  /** Whether pairs guessed for trains without a block count as turns. */
  acceptGuesses: boolean;
}

interface Half {
  kind: PlannedOpening['kind'];
  inbound: TimetableTrip | null;
  outbound: TimetableTrip | null;
}

/**
 * The turns of one service date at chosen terminals. Pairs that meet at one terminal are turns, even at different
 * stations of it. A train of a block that leaves a terminal without having come in there is a first-out; one that
 * comes in and does not leave again is a tie-up. Trains without a block count only when guesses are accepted.
 * Sorted by their first time.
 */
export function openingsFor(timetable: Timetable, question: OpeningsQuestion): PlannedOpening[] {
  const index = indexTrips(timetable);
  const terminalOf = new Map(
    question.terminals.flatMap(({ code, stationIds }) => stationIds.map((id) => [id, code] as const)),
  );
  const placeOf: PlaceOf = (stopId) => {
    const stationId = stationIdOf(index, stopId);
    return terminalOf.get(stationId) ?? `station ${stationId}`;
  };
  const tracks = new Map<string, string>();
  for (const terminal of question.terminals) {
    terminalTracks(timetable, terminal.stationIds).byStop.forEach((label, stopId) =>
      tracks.set(stopId, label),
    );
  }
  const codes = new Set(terminalOf.values());
  const day = pairDay(index, dayServices(timetable, question.serviceDate), placeOf);
  const openings = [
    ...pairedOpenings({ index, day, question, tracks, placeOf }),
    ...loneOpenings({ index, day, question, tracks, placeOf }),
  ];
  return withUniqueKeys(openings.filter((opening) => codes.has(opening.terminal)).sort(byFirstTime));
}

interface Making {
  index: TripIndex;
  day: DayPairs;
  question: OpeningsQuestion;
  tracks: ReadonlyMap<string, string>;
  placeOf: PlaceOf;
}

function pairedOpenings(making: Making): PlannedOpening[] {
  const { day, question, index } = making;
  const pairs = day.pairs.filter((pair) => question.acceptGuesses || !pair.guessed);
  return pairs.map((pair) => {
    const { arrivalAt, departureAt } = timesOf(pair, question.serviceDate, index.timetable.zone);
    const opening = openingOf(making, { kind: 'turn', ...pair });
    const times = { scheduledArrivalAt: arrivalAt, scheduledDepartureAt: departureAt };
    return { ...opening, ...times, reverses: reversesHint(pair) };
  });
}

function loneOpenings(making: Making): PlannedOpening[] {
  const { day, question } = making;
  const paired = day.pairs.filter((pair) => question.acceptGuesses || !pair.guessed);
  const isIn = new Set(paired.map((pair: TrainPair) => pair.inbound));
  const isOut = new Set(paired.filter((pair) => pair.dayOffset === 0).map((pair) => pair.outbound));
  const trips = day.trips.filter((trip) => day.isJoined(trip) || question.acceptGuesses);
  const tieUps = trips.filter((trip) => !isIn.has(trip));
  const firstOuts = trips.filter((trip) => !isOut.has(trip) && !day.broughtIn.has(trip));
  return [
    ...firstOuts.map((outbound) => openingOf(making, { kind: 'first-out', inbound: null, outbound })),
    ...tieUps.map((inbound) => openingOf(making, { kind: 'tie-up', inbound, outbound: null })),
  ];
}

function openingOf(making: Making, { kind, inbound, outbound }: Half): PlannedOpening {
  const { serviceDate } = making.question;
  const { zone } = making.index.timetable;
  const stopId = inbound?.lastStopId ?? outbound?.firstStopId ?? '';
  const at = (seconds: number | undefined): Instant | null =>
    seconds === undefined ? null : serviceInstant(serviceDate, seconds, zone);
  return {
    pairKey: `${inbound?.train ?? ''}>${outbound?.train ?? ''}`,
    terminal: making.placeOf(stopId),
    serviceDate,
    kind,
    inboundTrain: inbound?.train ?? null,
    outboundTrain: outbound?.train ?? null,
    scheduledArrivalAt: at(inbound?.arrivalSeconds),
    scheduledDepartureAt: at(outbound?.departureSeconds),
    track: making.tracks.get(stopId) ?? making.tracks.get(outbound?.firstStopId ?? '') ?? null,
    block: inbound?.blockId ?? outbound?.blockId ?? null,
    reverses: null,
  };
}

function firstTime(opening: PlannedOpening): Instant {
  return opening.scheduledArrivalAt ?? opening.scheduledDepartureAt ?? 0;
}

function byFirstTime(one: PlannedOpening, other: PlannedOpening): number {
  return firstTime(one) - firstTime(other) || (one.pairKey < other.pairKey ? -1 : 1);
}

/** Trains of one name on one day are told apart by a running number, in the order of their times. */
function withUniqueKeys(openings: PlannedOpening[]): PlannedOpening[] {
  const seen = new Map<string, number>();
  return openings.map((opening) => {
    const key = `${opening.terminal} ${opening.pairKey}`;
    const number = (seen.get(key) ?? 0) + 1;
    seen.set(key, number);
    return number === 1 ? opening : { ...opening, pairKey: `${opening.pairKey} ${number}` };
  });
}
