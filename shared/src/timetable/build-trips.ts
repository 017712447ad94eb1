import { problemsOf, type DraftCall, type DraftTrip, type TimetableDraft } from './draft';
import type { FeedFile } from './feed-files';
import { stationOf } from './read-stops';
import { formatServiceTime } from './service-day';
import { mostRunsOfOneTrip, spacedStarts } from './spaced-runs';
import type { TimetableTrip } from './timetable';

/** The calls of a trip in running order, without doubles. */
function callsOf(draft: TimetableDraft, trip: DraftTrip): DraftCall[] {
  const { leaveOut } = problemsOf(draft, 'stop_times.txt');
  const seen = new Set<number>();
  const sorted = [...trip.calls].sort((one, other) => one.sequence - other.sequence || one.line - other.line);
  return sorted.filter((call) => {
    if (seen.has(call.sequence)) {
      const message = `Trip “${trip.tripId}” has number ${call.sequence} twice. This row is left out.`;
      leaveOut(call.line, 'call.twice', message);
      return false;
    }
    seen.add(call.sequence);
    return true;
  });
}

/** The calls that make a trip usable for turns: its two ends and their neighbours. */
interface Ends {
  first: DraftCall;
  second: DraftCall;
  lastButOne: DraftCall;
  last: DraftCall;
}

function endsOf(calls: DraftCall[]): Ends | null {
  const [first, second] = calls;
  const last = calls.at(-1);
  const lastButOne = calls.at(-2);
  if (first === undefined || second === undefined || last === undefined || lastButOne === undefined)
    return null;
  return { first, second, lastButOne, last };
}

/** Where one of a call's two times is blank the other counts. */
function leavesAt(call: DraftCall): number | null {
  return call.departureSeconds ?? call.arrivalSeconds;
}

function arrivesAt(call: DraftCall): number | null {
  return call.arrivalSeconds ?? call.departureSeconds;
}

type Outcome = { trip: TimetableTrip } | { line: number; file: FeedFile; code: string; message: string };

function onceOf(draft: TimetableDraft, trip: DraftTrip, calls: DraftCall[]): Outcome {
  const leftOut = (file: FeedFile, line: number, code: string, what: string): Outcome => ({
    ...{ file, line, code },
    message: `${what}. Trip “${trip.tripId}” is left out.`,
  });
  const ends = endsOf(calls);
  if (ends === null)
    return leftOut('trips.txt', trip.line, 'trip.too_few_stops', 'Fewer than two stop times');
  const lost = calls.find((call) => !draft.stops.has(call.stopId));
  if (lost !== undefined) {
    return leftOut(
      'stop_times.txt',
      lost.line,
      'call.stop_unknown',
      `Stop “${lost.stopId}” is not in the file`,
    );
  }
  const departureSeconds = leavesAt(ends.first);
  const arrivalSeconds = arrivesAt(ends.last);
  if (departureSeconds === null || arrivalSeconds === null) {
    const { line } = departureSeconds === null ? ends.first : ends.last;
    return leftOut('stop_times.txt', line, 'call.no_time', 'No time at an end');
  }
  if (departureSeconds > arrivalSeconds) {
    return leftOut('stop_times.txt', ends.last.line, 'call.order_of_times', 'It arrives before it leaves');
  }
  return {
    trip: {
      tripId: trip.tripId,
      train: trip.shortName ?? trip.tripId,
      serviceId: trip.serviceId,
      blockId: trip.blockId,
      direction: trip.direction,
      firstStopId: ends.first.stopId,
      departureSeconds,
      lastStopId: ends.last.stopId,
      arrivalSeconds,
      secondStationId: stationOf(draft.stops, ends.second.stopId),
      lastButOneStationId: stationOf(draft.stops, ends.lastButOne.stopId),
      line: trip.line,
    },
  };
}

/** The runs of a trip: itself, or one for each start at an exact spacing, named by when it starts. */
function runsOf(draft: TimetableDraft, trip: DraftTrip, once: TimetableTrip): TimetableTrip[] {
  if (trip.windows === null) return [once];
  const starts = spacedStarts(trip.windows);
  if (starts === null) {
    const message = `Trip “${trip.tripId}” would run more than ${mostRunsOfOneTrip} times a day.`;
    problemsOf(draft, 'frequencies.txt').refuse(null, 'limit.runs', message);
    return [];
  }
  return starts.map((start) => ({
    ...once,
    train: `${once.train} ${formatServiceTime(start).slice(0, 5)}`,
    departureSeconds: start,
    arrivalSeconds: start + once.arrivalSeconds - once.departureSeconds,
  }));
}

/** The usable runs of every trip, in the order of the file; what is not usable is named. */
export function buildTrips(draft: TimetableDraft): TimetableTrip[] {
  return [...draft.trips.values()].flatMap((trip) => {
    const outcome = onceOf(draft, trip, callsOf(draft, trip));
    if ('trip' in outcome) return runsOf(draft, trip, outcome.trip);
    draft.problems.add({ severity: 'left-out', ...outcome });
    return [];
  });
}
