import { problemsOf, type RowReader, type TimetableDraft } from './draft';
import { parseServiceTime } from './service-day';

/** Calls of the trains. Of other modes only the stops are remembered, so that their bays do not become tracks. */
export function stopTimeReader(draft: TimetableDraft): RowReader {
  const { refuse, leaveOut } = problemsOf(draft, 'stop_times.txt');
  const readTime = (text: string, column: string, line: number): number | null => {
    if (text === '') return null;
    const seconds = parseServiceTime(text);
    if (seconds === null)
      refuse(line, 'time.unreadable', `“${text}” in ${column} is not a time like 25:35:00.`);
    return seconds;
  };
  return (field, line) => {
    const tripId = field('trip_id');
    const stopId = field('stop_id');
    const stop = draft.stops.get(stopId);
    const trip = draft.trips.get(tripId);
    if (trip === undefined) {
      const why = draft.passedOver.get(tripId);
      if (why === undefined) {
        leaveOut(line, 'call.trip_unknown', `Trip “${tripId}” is not in the file. The row is left out.`);
      }
      if (why === 'other-mode' && stop?.calledAt === 'never') stop.calledAt = 'by-others';
      return;
    }
    const sequence = field('stop_sequence');
    if (!/^\d{1,9}$/.test(sequence)) {
      refuse(line, 'call.order_unreadable', `“${sequence}” in stop_sequence is not a whole number.`);
      return;
    }
    if (stop !== undefined) stop.calledAt = 'by-train';
    trip.calls.push({
      sequence: Number(sequence),
      stopId,
      arrivalSeconds: readTime(field('arrival_time'), 'arrival_time', line),
      departureSeconds: readTime(field('departure_time'), 'departure_time', line),
      line,
    });
  };
}
