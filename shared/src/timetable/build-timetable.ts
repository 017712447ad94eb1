import type { Result } from '../lib/result';
import { ok, refused } from '../lib/result';
import { buildTrips } from './build-trips';
import { problemsOf, type DraftService, type TimetableDraft } from './draft';
import { REQUIRED_FEED_FILES } from './feed-files';
import type { ImportProblem } from './problem';
import { mendParents, stationOf } from './read-stops';
import { daysBetween } from './service-day';
import { hasDays } from './service-days';
import type { Timetable, TimetableLink, TimetableService, TimetableStop, TimetableTrip } from './timetable';

/** What reading a feed ends in: a timetable, or the reasons why there is none. Problems come with both. */
export type ReadOutcome = Result<{ timetable: Timetable; problems: ImportProblem[] }, ImportProblem[]>;

/** Span of days beyond which a calendar is taken for a mistake: a hundred years (our choice). */
export const longestSpanDays = 36_525;

/** Makes the timetable out of what has been gathered, or says why there is none. */
export function buildTimetable(draft: TimetableDraft): ReadOutcome {
  nameMissingFiles(draft);
  mendParents(draft);
  const trips = buildTrips(draft);
  const services = buildServices(draft, trips);
  const kept = withDays(draft, trips, services);
  nameMissingTrains(draft, kept);
  if (draft.problems.refuses() || draft.agency === null) return refused(draft.problems.list());
  const timetable: Timetable = {
    zone: draft.agency.zone,
    agency: draft.agency.name,
    stops: buildStops(draft, kept),
    services,
    trips: kept,
    links: buildLinks(draft, kept),
  };
  return ok({ timetable, problems: draft.problems.list() });
}

function nameMissingFiles(draft: TimetableDraft): void {
  for (const file of REQUIRED_FEED_FILES.filter((name) => !draft.filesSeen.has(name))) {
    problemsOf(draft, file).refuse(null, 'file.missing', `The file ${file} is missing.`);
  }
  if (!draft.filesSeen.has('calendar.txt') && !draft.filesSeen.has('calendar_dates.txt')) {
    const message =
      'The file calendar.txt is missing, and calendar_dates.txt too. One of them must say on which days trains run.';
    problemsOf(draft, 'calendar.txt').refuse(null, 'file.missing', message);
  }
  if (draft.filesSeen.has('agency.txt') && draft.agency === null) {
    problemsOf(draft, 'agency.txt').refuse(
      null,
      'agency.none',
      'No agency is named, so the time zone is unknown.',
    );
  }
}

function nameMissingTrains(draft: TimetableDraft, kept: TimetableTrip[]): void {
  if (kept.length > 0 || draft.problems.refuses()) return;
  const { refuse } = problemsOf(draft, 'trips.txt');
  if (draft.trips.size > 0)
    refuse(null, 'trip.none_left', 'Every train had to be left out. Nothing remains to run.');
  else
    refuse(
      null,
      'trip.none',
      'No trip runs on a route of the wanted types. Rail is route type 2 and 100 to 117.',
    );
}

function buildServices(draft: TimetableDraft, trips: TimetableTrip[]): TimetableService[] {
  const used = new Set(trips.map((trip) => trip.serviceId));
  return [...draft.services.values()]
    .filter((service) => used.has(service.serviceId) && isOfSaneLength(draft, service))
    .map(({ serviceId, weekdays, from, to, added, removed }) => ({
      ...{ serviceId, weekdays, from, to },
      added: [...added].sort(),
      removed: [...removed].sort(),
    }));
}

function isOfSaneLength(draft: TimetableDraft, service: DraftService): boolean {
  const days = [service.from, service.to, ...service.added].filter((date) => date !== null).sort();
  const [from] = days;
  const to = days.at(-1);
  if (from === undefined || to === undefined || daysBetween(from, to) <= longestSpanDays) return true;
  const message = `Service “${service.serviceId}” runs from ${from} to ${to}. More than a hundred years are not read.`;
  problemsOf(draft, service.file).refuse(service.line, 'limit.days', message);
  return false;
}

/** Leaves out the trips of services that never run, and names them by service. */
function withDays(
  draft: TimetableDraft,
  trips: TimetableTrip[],
  services: TimetableService[],
): TimetableTrip[] {
  const idle = new Set(services.filter((service) => !hasDays(service)).map((service) => service.serviceId));
  for (const serviceId of idle) {
    const { file, line } = draft.services.get(serviceId) ?? { file: 'calendar.txt' as const, line: null };
    const count = new Set(trips.filter((trip) => trip.serviceId === serviceId).map((trip) => trip.tripId))
      .size;
    const message = `Service “${serviceId}” has no day on which it runs. Its trips are left out: ${count}.`;
    problemsOf(draft, file).leaveOut(line, 'service.no_days', message);
  }
  return trips.filter((trip) => !idle.has(trip.serviceId));
}

function buildLinks(draft: TimetableDraft, trips: TimetableTrip[]): TimetableLink[] {
  const kept = new Set(trips.map((trip) => trip.tripId));
  return draft.links
    .filter((link) => kept.has(link.fromTripId) && kept.has(link.toTripId))
    .map(({ fromTripId, toTripId }) => ({ fromTripId, toTripId }));
}

/** The stations at the ends of trains with everything under them; stops of other modes alone are dropped. */
function buildStops(draft: TimetableDraft, trips: TimetableTrip[]): TimetableStop[] {
  const ends = trips.flatMap((trip) => [trip.firstStopId, trip.lastStopId]);
  const stations = new Set(ends.map((stopId) => stationOf(draft.stops, stopId)));
  const isPlace = (type: string): boolean => type === '0' || type === '1';
  return [...draft.stops.values()]
    .map((stop) => ({ stop, stationId: stationOf(draft.stops, stop.stopId) }))
    .filter(
      ({ stop, stationId }) =>
        stations.has(stationId) && (isPlace(stop.locationType) || stop.calledAt === 'by-train'),
    )
    .map(({ stop: { stopId, name, code, platform, calledAt }, stationId }) => ({
      ...{ stopId, name, code, platform, stationId, calledAt },
    }));
}
