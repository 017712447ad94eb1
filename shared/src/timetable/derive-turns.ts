import type { CalendarDate, Instant } from '../lib/instant';
import { addSeconds, secondsBetween } from '../lib/instant';
import { pairDay, stationPlaces, type DayServices, type TrainPair } from './pairs';
import { addDays, serviceDayStart } from './service-day';
import { servicesOn } from './service-days';
import type { Timetable } from './timetable';
import { indexTrips, stationIdOf, type TripIndex } from './trip-index';

/** One pair of trains at one station on one service date. */
export interface DerivedTurn {
  serviceDate: CalendarDate;
  stationId: string;
  blockId: string | null;
  inboundTripId: string;
  inboundTrain: string;
  arrivalAt: Instant;
  outboundTripId: string;
  outboundTrain: string;
  departureAt: Instant;
  layoverSeconds: number;
  /** A hint that the train goes back the way it came. */
  reverses: boolean;
  /** True for a pair that the file does not join and that is only likely. */
  guessed: boolean;
}

/** The services of a date and of its two neighbours. */
export function dayServices(timetable: Timetable, date: CalendarDate): DayServices {
  const on = (day: CalendarDate): Set<string> => servicesOn(timetable.services, day);
  return { before: on(addDays(date, -1)), day: on(date), after: on(addDays(date, 1)) };
}

/**
 * Whether the second train goes back the way the first came: its second stop is the first's last but one, or both
 * carry a direction and the two differ. A hint only; the file does not say.
 */
export function reversesHint({ inbound, outbound }: Pick<TrainPair, 'inbound' | 'outbound'>): boolean {
  if (outbound.secondStationId === inbound.lastButOneStationId) return true;
  return (
    inbound.direction !== null && outbound.direction !== null && inbound.direction !== outbound.direction
  );
}

/** Arrival and departure of a pair as instants. */
export function timesOf(pair: TrainPair, serviceDate: CalendarDate, zone: string) {
  const start = serviceDayStart(serviceDate, zone);
  const startOfSecond = pair.dayOffset === 0 ? start : serviceDayStart(addDays(serviceDate, 1), zone);
  return {
    arrivalAt: addSeconds(start, pair.inbound.arrivalSeconds),
    departureAt: addSeconds(startOfSecond, pair.outbound.departureSeconds),
  };
}

function turnOf(index: TripIndex, pair: TrainPair, serviceDate: CalendarDate): DerivedTurn {
  const { arrivalAt, departureAt } = timesOf(pair, serviceDate, index.timetable.zone);
  return {
    serviceDate,
    stationId: stationIdOf(index, pair.inbound.lastStopId),
    blockId: pair.inbound.blockId ?? pair.outbound.blockId,
    inboundTripId: pair.inbound.tripId,
    inboundTrain: pair.inbound.train,
    arrivalAt,
    outboundTripId: pair.outbound.tripId,
    outboundTrain: pair.outbound.train,
    departureAt,
    layoverSeconds: secondsBetween(arrivalAt, departureAt),
    reverses: reversesHint(pair),
    guessed: pair.guessed,
  };
}

/**
 * The turns of one service date, before any terminal is chosen: trips joined by a link (transfer types 4 and 5) or, where
 * no link speaks of them, neighbours in a block, when both stand at stops of one station and the second does not
 * leave before the first arrives. Trips without a block give guesses. Sorted by arrival, then trip ids.
 * Source: GTFS Schedule reference, blocks and service days, linked trips; revision of 27 April 2026.
 */
export function deriveTurns(timetable: Timetable, serviceDate: CalendarDate): DerivedTurn[] {
  const index = indexTrips(timetable);
  return turnsOfDay(index, serviceDate);
}

/** As `deriveTurns`, for callers that ask for many dates. */
export function turnsOfDay(index: TripIndex, serviceDate: CalendarDate): DerivedTurn[] {
  const { pairs } = pairDay(index, dayServices(index.timetable, serviceDate), stationPlaces(index));
  const key = (turn: DerivedTurn): string => `${turn.inboundTripId} ${turn.outboundTripId}`;
  return pairs
    .map((pair) => turnOf(index, pair, serviceDate))
    .sort((one, other) => one.arrivalAt - other.arrivalAt || (key(one) < key(other) ? -1 : 1));
}
