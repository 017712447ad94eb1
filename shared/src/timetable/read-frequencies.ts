import { problemsOf, type RowReader, type TimetableDraft } from './draft';
import { parseServiceTime } from './service-day';

/**
 * Trips that repeat at a spacing. Only those said to keep exact times become runs; of the others nobody knows when
 * they leave, so they are left out. Source: GTFS Schedule reference, `frequencies.txt`, field `exact_times`.
 */
export function frequencyReader(draft: TimetableDraft): RowReader {
  const { refuse, leaveOut } = problemsOf(draft, 'frequencies.txt');
  const readTime = (text: string, column: string, line: number): number => {
    const seconds = parseServiceTime(text);
    if (seconds === null)
      refuse(line, 'time.unreadable', `“${text}” in ${column} is not a time like 25:35:00.`);
    return seconds ?? 0;
  };
  return (field, line) => {
    const tripId = field('trip_id');
    const trip = draft.trips.get(tripId);
    if (trip === undefined) {
      if (draft.passedOver.has(tripId)) return;
      leaveOut(line, 'frequency.trip_unknown', `Trip “${tripId}” is not in the file. The row is left out.`);
      return;
    }
    trip.windows ??= [];
    if (field('exact_times') !== '1') {
      const message = `Trip “${tripId}” runs at a spacing without exact times. These runs are left out.`;
      leaveOut(line, 'frequency.inexact', message);
      return;
    }
    const fromSeconds = readTime(field('start_time'), 'start_time', line);
    const toSeconds = readTime(field('end_time'), 'end_time', line);
    const headway = field('headway_secs');
    if (!/^[1-9]\d{0,5}$/.test(headway)) {
      leaveOut(
        line,
        'frequency.headway',
        `“${headway}” is not a spacing in seconds. These runs are left out.`,
      );
      return;
    }
    trip.windows.push({ fromSeconds, toSeconds, headwaySeconds: Number(headway) });
  };
}
