import { addDays, daysBetween, isCalendarDate, type Afterwards, type CalendarDate } from '@stubpost/shared';

/** Calendar days at the terminal, both included. */
export interface DayRange {
  from: CalendarDate;
  to: CalendarDate;
}

/** What the page is about: days, and whether turns that were entered afterwards count. It stands in the address. */
export interface QualityRange extends DayRange {
  afterwards: Afterwards;
}

/** Lengths that are offered, in days up to today. */
export const offeredDays = [1, 7, 28, 56] as const;
const usualDays = 28;

/** So many days up to today. */
export function lastDays(days: number, today: CalendarDate): DayRange {
  return { from: addDays(today, 1 - days), to: today };
}

/** Reads the address; a range that is missing, unreadable or the wrong way round is the last four weeks. */
export function readQualityRange(search: URLSearchParams, today: CalendarDate): QualityRange {
  const usual = lastDays(usualDays, today);
  const dateOf = (name: 'from' | 'to'): CalendarDate => {
    const text = search.get(name) ?? '';
    return isCalendarDate(text) ? text : usual[name];
  };
  const range = { from: dateOf('from'), to: dateOf('to') };
  const afterwards = search.get('afterwards') === 'counted' ? 'counted' : 'left-out';
  return { ...(daysBetween(range.from, range.to) < 0 ? usual : range), afterwards };
}

/** Writes it back; other things in the address stay. */
export function writeQualityRange(search: URLSearchParams, range: QualityRange): URLSearchParams {
  const written = new URLSearchParams(search);
  written.set('from', range.from);
  written.set('to', range.to);
  if (range.afterwards === 'counted') written.set('afterwards', 'counted');
  else written.delete('afterwards');
  return written;
}

/** Which of the offered lengths a range is; null when it is none. */
export function offeredLength(range: DayRange, today: CalendarDate): number | null {
  if (range.to !== today) return null;
  return offeredDays.find((days) => days === daysBetween(range.from, range.to) + 1) ?? null;
}
