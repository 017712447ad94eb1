import type { CalendarDate, Instant, OnTimeRule } from '@stubpost/shared';
import { dateAt } from '../../../lib/time-display';

/** Everything the page is about; stands in the address, so that a link shows the same figures. */
export interface HistorySearch {
  from: CalendarDate;
  to: CalendarDate;
  rule: OnTimeRule;
}

/** The board's own measure: within 59 s of schedule, early is on time, annulled left out. */
export const boardRule: OnTimeRule = {
  thresholdSeconds: 59,
  inclusive: true,
  early: 'on-time',
  annulled: 'left-out',
};

const defaultDays = 28;
const date = /^\d{4}-\d{2}-\d{2}$/;

/** The calendar day some days later, or earlier when negative. */
export function addDays(day: CalendarDate, days: number): CalendarDate {
  return new Date(Date.parse(`${day}T12:00:00Z`) + days * 86_400_000).toISOString().slice(0, 10);
}

/** The four weeks up to yesterday on the terminal's calendar. */
function defaultRange(now: Instant, zone: string): { from: CalendarDate; to: CalendarDate } {
  const to = addDays(dateAt(now, zone), -1);
  return { from: addDays(to, 1 - defaultDays), to };
}

/** Reads the address; what is missing or unreadable takes its usual value. */
export function readHistorySearch(search: URLSearchParams, now: Instant, zone: string): HistorySearch {
  const usual = defaultRange(now, zone);
  const dateOf = (name: string, otherwise: CalendarDate): CalendarDate => {
    const text = search.get(name) ?? '';
    return date.test(text) && !Number.isNaN(Date.parse(text)) ? text : otherwise;
  };
  const seconds = Number(search.get('limit') ?? 'none');
  return {
    from: dateOf('from', usual.from),
    to: dateOf('to', usual.to),
    rule: {
      thresholdSeconds: Number.isInteger(seconds) && seconds >= 0 ? seconds : boardRule.thresholdSeconds,
      inclusive: search.get('exactly') !== 'late',
      early: search.get('early') === 'not-on-time' ? 'not-on-time' : 'on-time',
      annulled: search.get('annulled') === 'not-on-time' ? 'not-on-time' : 'left-out',
    },
  };
}

/** Writes it back; other things in the address stay. */
export function writeHistorySearch(search: URLSearchParams, next: HistorySearch): URLSearchParams {
  const written = new URLSearchParams(search);
  written.set('from', next.from);
  written.set('to', next.to);
  written.set('limit', String(next.rule.thresholdSeconds));
  const set = (name: string, value: string, isUsual: boolean): void => {
    if (isUsual) written.delete(name);
    else written.set(name, value);
  };
  set('exactly', 'late', next.rule.inclusive);
  set('early', 'not-on-time', next.rule.early === 'on-time');
  set('annulled', 'not-on-time', next.rule.annulled === 'left-out');
  return written;
}

/** A service day as the date picker holds it: the same day on this computer's calendar. */
export function toPickerDate(day: CalendarDate): Date {
  const [year = 1970, month = 1, dayOfMonth = 1] = day.split('-').map(Number);
  return new Date(year, month - 1, dayOfMonth);
}

/** Back from the date picker. */
export function fromPickerDate(picked: Date): CalendarDate {
  const two = (value: number): string => String(value).padStart(2, '0');
  return `${picked.getFullYear()}-${two(picked.getMonth() + 1)}-${two(picked.getDate())}`;
}
