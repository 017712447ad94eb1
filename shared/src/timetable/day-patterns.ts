import type { CalendarDate } from '../lib/instant';
import { dayServices, turnsOfDay, type DerivedTurn } from './derive-turns';
import { joinDay } from './pairs';
import { addDays, serviceDayStart } from './service-day';
import { runningDates } from './service-days';
import type { TimetableTrip } from './timetable';
import { stationIdOf, type TripIndex } from './trip-index';

/** Dates on which the same services run, and so the same turns come about. */
export interface DayPattern {
  dates: CalendarDate[];
  /** The turns of the first of the dates; on the others they differ in nothing but the date. */
  turns: DerivedTurn[];
  /** Neighbours in a block of which the second leaves before the first is in. */
  overlaps: { inbound: TimetableTrip; outbound: TimetableTrip }[];
  /** Pairs that follow one another but meet at two different stations. */
  apart: { inbound: TimetableTrip; outbound: TimetableTrip }[];
}

/** What decides the turns of a date: its services, and where links reach over midnight those of its neighbours. */
function signatureOf(index: TripIndex, date: CalendarDate): string {
  const { timetable } = index;
  const services = dayServices(timetable, date);
  const named = (ids: ReadonlySet<string>): string => JSON.stringify([...ids].sort());
  if (timetable.links.length === 0) return named(services.day);
  const length = serviceDayStart(addDays(date, 1), timetable.zone) - serviceDayStart(date, timetable.zone);
  return [services.before, services.day, services.after].map(named).join() + String(length);
}

/** Sorts every running date of a timetable by what runs, so that each different day is worked out once. */
export function dayPatterns(index: TripIndex): DayPattern[] {
  const patterns = new Map<string, CalendarDate[]>();
  for (const date of runningDates(index.timetable)) {
    const signature = signatureOf(index, date);
    const dates = patterns.get(signature);
    if (dates === undefined) patterns.set(signature, [date]);
    else dates.push(date);
  }
  return [...patterns.values()].map((dates) => patternOf(index, dates));
}

function patternOf(index: TripIndex, dates: CalendarDate[]): DayPattern {
  const [date = ''] = dates;
  const { followers, overlaps } = joinDay(index, dayServices(index.timetable, date));
  const station = (stopId: string): string => stationIdOf(index, stopId);
  const apart = followers.filter(
    ({ inbound, outbound }) => station(inbound.lastStopId) !== station(outbound.firstStopId),
  );
  return { dates, turns: turnsOfDay(index, date), overlaps, apart };
}
