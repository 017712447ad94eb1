import { receiptDay, type CalendarDate, type Instant } from '@stubpost/shared';

/** Days of receipt in UTC, both included. */
export interface LogDays {
  from: CalendarDate;
  to: CalendarDate;
}

const usualDays = 14;
const millisecondsInDay = 86_400_000;

const isDay = (text: string | null): text is CalendarDate =>
  text !== null && /^\d{4}-\d{2}-\d{2}$/.test(text) && !Number.isNaN(Date.parse(text));

/** Reads the address; without it the two weeks up to today. A range that runs backwards is one day. */
export function readLogDays(search: URLSearchParams, now: Instant): LogDays {
  const [from, to] = [search.get('from'), search.get('to')];
  const last = isDay(to) ? to : receiptDay(now);
  const first = isDay(from) ? from : receiptDay(Date.parse(last) - (usualDays - 1) * millisecondsInDay);
  return { from: first <= last ? first : last, to: last };
}

/** Writes one of the days into the address; other things in it stay. */
export function writeLogDay(search: URLSearchParams, name: keyof LogDays, day: string): URLSearchParams {
  const written = new URLSearchParams(search);
  if (isDay(day)) written.set(name, day);
  else written.delete(name);
  return written;
}

/** Name of the file that the log of these days is saved under. */
export const logFileName = ({ from, to }: LogDays): string => `stubpost-log-${from}-${to}.ndjson`;
