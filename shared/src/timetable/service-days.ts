import type { CalendarDate } from '../lib/instant';
import { datesBetween, weekdayOf } from './service-day';
import type { Timetable, TimetableService } from './timetable';

/** Whether a service runs on a date: a removed day never, an added one always, else by the weekly rule. */
export function runsOn(service: TimetableService, date: CalendarDate): boolean {
  if (service.removed.includes(date)) return false;
  if (service.added.includes(date)) return true;
  if (service.from === null || service.to === null) return false;
  return service.from <= date && date <= service.to && service.weekdays[weekdayOf(date)] === true;
}

/** The services that run on a date. */
export function servicesOn(services: readonly TimetableService[], date: CalendarDate): Set<string> {
  return new Set(services.filter((service) => runsOn(service, date)).map((service) => service.serviceId));
}

/** First and last date that the rules of a service speak of; null when it speaks of none. */
export function spanOf(service: TimetableService): { from: CalendarDate; to: CalendarDate } | null {
  const ends = [...(service.from !== null && service.to !== null ? [service.from, service.to] : [])];
  const days = [...ends, ...service.added].sort();
  const [from] = days;
  const to = days.at(-1);
  return from === undefined || to === undefined ? null : { from, to };
}

/** Whether there is any day on which a service runs. */
export function hasDays(service: TimetableService): boolean {
  const span = spanOf(service);
  if (span === null) return false;
  if (service.added.some((date) => !service.removed.includes(date))) return true;
  return datesBetween(span.from, span.to).some((date) => runsOn(service, date));
}

/** Every date of a timetable on which at least one of its trips runs, in order. */
export function runningDates(timetable: Timetable): CalendarDate[] {
  const used = new Set(timetable.trips.map((trip) => trip.serviceId));
  const services = timetable.services.filter((service) => used.has(service.serviceId));
  const spans = services.map(spanOf).filter((span) => span !== null);
  const from = spans.map((span) => span.from).sort()[0];
  const to = spans
    .map((span) => span.to)
    .sort()
    .at(-1);
  if (from === undefined || to === undefined) return [];
  return datesBetween(from, to).filter((date) => services.some((service) => runsOn(service, date)));
}
