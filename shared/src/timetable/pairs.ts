import { guessPairs } from './guess-pairs';
import { groupBy, inRunningOrder, stationIdOf, tripsOf, type TripIndex } from './trip-index';
import type { TimetableTrip } from './timetable';

/** An arriving train and the train it leaves as. */
export interface TrainPair {
  inbound: TimetableTrip;
  outbound: TimetableTrip;
  /** 1 when the second train belongs to the next service day, else 0. */
  dayOffset: 0 | 1;
  guessed: boolean;
}

/** Trips of one service day as the file joins them. */
export interface JoinedDay {
  /** Every pair that follows in a block or by a link, wherever the two meet. */
  followers: TrainPair[];
  /** Trips that a link from the day before brings in. */
  broughtIn: ReadonlySet<TimetableTrip>;
  /** Pairs of a block of which the second leaves before the first is in. */
  overlaps: { inbound: TimetableTrip; outbound: TimetableTrip }[];
}

/** Ids of the services that run on a service day, the day before and the day after. */
export interface DayServices {
  before: ReadonlySet<string>;
  day: ReadonlySet<string>;
  after: ReadonlySet<string>;
}

/**
 * The linked pairs whose first train runs on the day. The second train is that of the same day when it leaves no
 * earlier than the first arrives, else that of the following day. A link holds only when both run.
 */
function linkedPairs(index: TripIndex, day: ReadonlySet<string>, after: ReadonlySet<string>): TrainPair[] {
  return tripsOf(index, day).flatMap((inbound) =>
    (index.linksFrom.get(inbound.tripId) ?? []).flatMap((link): TrainPair[] => {
      const outbound = index.byId.get(link.toTripId);
      if (outbound === undefined) return [];
      const dayOffset = outbound.departureSeconds < inbound.arrivalSeconds ? 1 : 0;
      const runs = (dayOffset === 0 ? day : after).has(outbound.serviceId);
      return runs ? [{ inbound, outbound, dayOffset, guessed: false }] : [];
    }),
  );
}

/**
 * Joins the trips of one service day: links first, then neighbours in each block, left out where a link speaks of
 * either of the two.
 */
export function joinDay(index: TripIndex, services: DayServices): JoinedDay {
  const links = linkedPairs(index, services.day, services.after);
  const overnight = linkedPairs(index, services.before, services.day).filter((pair) => pair.dayOffset === 1);
  const broughtIn = new Set(overnight.map((pair) => pair.outbound));
  const linkedOn = new Set(links.map((pair) => pair.inbound));
  const linkedFrom = new Set(links.filter((pair) => pair.dayOffset === 0).map((pair) => pair.outbound));
  const joined: JoinedDay = { followers: links, broughtIn, overlaps: [] };
  const trips = tripsOf(index, services.day).filter((trip) => trip.blockId !== null);
  for (const block of groupBy(trips, (trip) => trip.blockId ?? '').values()) {
    block.sort(inRunningOrder);
    block.slice(1).forEach((outbound, place) => {
      const inbound = block[place];
      if (inbound === undefined || linkedOn.has(inbound)) return;
      if (linkedFrom.has(outbound) || broughtIn.has(outbound)) return;
      if (outbound.departureSeconds < inbound.arrivalSeconds) joined.overlaps.push({ inbound, outbound });
      else joined.followers.push({ inbound, outbound, dayOffset: 0, guessed: false });
    });
  }
  return joined;
}

/** Names the real place a stop belongs to; pairs are turns when both trains stand at the same one. */
export type PlaceOf = (stopId: string) => string;

/** Every station is a place of its own. */
export function stationPlaces(index: TripIndex): PlaceOf {
  return (stopId) => stationIdOf(index, stopId);
}

/** The trains of one service day and how they are paired. */
export interface DayPairs {
  trips: TimetableTrip[];
  /** Pairs that meet at one place, and guesses for trains the file does not join. */
  pairs: TrainPair[];
  broughtIn: ReadonlySet<TimetableTrip>;
  /** Whether the file says anything of what the train's vehicle does before or after: a block or a link. */
  isJoined(trip: TimetableTrip): boolean;
}

/** Pairs the trains of one service day at their places. */
export function pairDay(index: TripIndex, services: DayServices, placeOf: PlaceOf): DayPairs {
  const trips = tripsOf(index, services.day);
  const { followers, broughtIn } = joinDay(index, services);
  const inbound = new Set(followers.map((pair) => pair.inbound));
  const outbound = new Set(followers.filter((pair) => pair.dayOffset === 0).map((pair) => pair.outbound));
  const isLeaving = (trip: TimetableTrip): boolean => outbound.has(trip) || broughtIn.has(trip);
  const loose = trips.filter((trip) => trip.blockId === null);
  const guesses = guessPairs({
    arriving: loose.filter((trip) => !inbound.has(trip)),
    leaving: loose.filter((trip) => !isLeaving(trip)),
    placeOf,
  });
  const meets = (pair: TrainPair): boolean =>
    placeOf(pair.inbound.lastStopId) === placeOf(pair.outbound.firstStopId);
  return {
    trips,
    pairs: [
      ...followers.filter(meets),
      ...guesses.map((pair): TrainPair => ({ ...pair, dayOffset: 0, guessed: true })),
    ],
    broughtIn,
    isJoined: (trip) => trip.blockId !== null || inbound.has(trip) || isLeaving(trip),
  };
}
