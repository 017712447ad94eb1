import type { Timetable, TimetableLink, TimetableStop, TimetableTrip } from './timetable';

/** A timetable made ready for looking things up. */
export interface TripIndex {
  timetable: Timetable;
  stops: ReadonlyMap<string, TimetableStop>;
  byService: ReadonlyMap<string, TimetableTrip[]>;
  byId: ReadonlyMap<string, TimetableTrip>;
  linksFrom: ReadonlyMap<string, TimetableLink[]>;
}

/** Puts things under their key, in the order in which they come. */
export function groupBy<Item>(items: readonly Item[], keyOf: (item: Item) => string): Map<string, Item[]> {
  const groups = new Map<string, Item[]>();
  for (const item of items) {
    const group = groups.get(keyOf(item));
    if (group === undefined) groups.set(keyOf(item), [item]);
    else group.push(item);
  }
  return groups;
}

/** Indexes a timetable once for any number of dates. */
export function indexTrips(timetable: Timetable): TripIndex {
  return {
    timetable,
    stops: new Map(timetable.stops.map((stop) => [stop.stopId, stop])),
    byService: groupBy(timetable.trips, (trip) => trip.serviceId),
    byId: new Map(timetable.trips.map((trip) => [trip.tripId, trip])),
    linksFrom: groupBy(timetable.links, (link) => link.fromTripId),
  };
}

/** The trips of the services that run. */
export function tripsOf(index: TripIndex, services: ReadonlySet<string>): TimetableTrip[] {
  return [...services].flatMap((serviceId) => index.byService.get(serviceId) ?? []);
}

/** The station of a stop; the stop itself when the timetable does not keep it. */
export function stationIdOf(index: TripIndex, stopId: string): string {
  return index.stops.get(stopId)?.stationId ?? stopId;
}

/**
 * Order of trips in a block: by departure, then arrival, then trip id (plain comparison of characters).
 */
export function inRunningOrder(one: TimetableTrip, other: TimetableTrip): number {
  return (
    one.departureSeconds - other.departureSeconds ||
    one.arrivalSeconds - other.arrivalSeconds ||
    (one.tripId < other.tripId ? -1 : one.tripId > other.tripId ? 1 : 0)
  );
}
