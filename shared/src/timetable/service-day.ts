import { TZDate } from '@date-fns/tz';
import type { CalendarDate, Instant } from '../lib/instant';
import { millisecondsInHour, millisecondsInSecond } from '../lib/instant';

/** 24 × 60 × 60 seconds; a service day that holds a clock change is an hour shorter or longer than this. */
export const secondsInPlainDay = 86_400;
const millisecondsInPlainDay = secondsInPlainDay * millisecondsInSecond;

const serviceTime = /^(\d{1,3}):([0-5]\d):([0-5]\d)$/;
const feedDate = /^(\d{4})(\d{2})(\d{2})$/;
const calendarDate = /^(\d{4})-(\d{2})-(\d{2})$/;

/**
 * Reads a time of the service day, `H:MM:SS` or `HH:MM:SS`, as seconds after the day's start. Hours may go past 24:
 * `25:35:00` is 92,100 and means 1:35 the next morning. Anything else is null. Source: GTFS Schedule reference,
 * field type Time, revision of 27 April 2026.
 */
export function parseServiceTime(text: string): number | null {
  const parts = serviceTime.exec(text);
  if (parts === null) return null;
  return Number(parts[1]) * 3600 + Number(parts[2]) * 60 + Number(parts[3]);
}

/** Writes seconds after the service day's start as `HH:MM:SS`, past 24 where need be: 92,100 is `25:35:00`. */
export function formatServiceTime(seconds: number): string {
  const two = (value: number): string => String(value).padStart(2, '0');
  return `${two(Math.floor(seconds / 3600))}:${two(Math.floor(seconds / 60) % 60)}:${two(seconds % 60)}`;
}

/** Reads a date of a GTFS file, `YYYYMMDD`; a day that does not exist is null. `20260229` is null. */
export function parseFeedDate(text: string): CalendarDate | null {
  const parts = feedDate.exec(text);
  if (parts === null) return null;
  const date = `${parts[1]}-${parts[2]}-${parts[3]}`;
  return isCalendarDate(date) ? date : null;
}

/** Writes a date as GTFS files do: `2026-03-08` is `20260308`. */
export function formatFeedDate(date: CalendarDate): string {
  return date.replaceAll('-', '');
}

/** Whether a text is a day `YYYY-MM-DD` that exists. */
export function isCalendarDate(text: string): boolean {
  if (!calendarDate.test(text)) return false;
  const instant = Date.parse(`${text}T00:00:00Z`);
  return !Number.isNaN(instant) && new Date(instant).toISOString().startsWith(text);
}

function dayNumber(date: CalendarDate): number {
  return Math.round(Date.parse(`${date}T00:00:00Z`) / millisecondsInPlainDay);
}

/** The calendar day so many days later (earlier when negative): one day after `2024-02-28` is `2024-02-29`. */
export function addDays(date: CalendarDate, days: number): CalendarDate {
  return new Date((dayNumber(date) + days) * millisecondsInPlainDay).toISOString().slice(0, 10);
}

/** Days from one date to another, negative when `to` is earlier. */
export function daysBetween(from: CalendarDate, to: CalendarDate): number {
  return dayNumber(to) - dayNumber(from);
}

/** Every date from `from` to `to`, both included; none when `to` is earlier. */
export function datesBetween(from: CalendarDate, to: CalendarDate): CalendarDate[] {
  return Array.from({ length: Math.max(0, daysBetween(from, to) + 1) }, (_, index) => addDays(from, index));
}

/** Day of the week, 0 for Monday to 6 for Sunday (the column order of `calendar.txt`). */
export function weekdayOf(date: CalendarDate): number {
  // 1970-01-01 was a Thursday, which is number 3.
  return (((dayNumber(date) + 3) % 7) + 7) % 7;
}

/** Whether the machine's zone database knows a zone by this IANA name. */
export function isZone(name: string): boolean {
  try {
    new Intl.DateTimeFormat('en', { timeZone: name });
    return name.length > 0;
  } catch {
    return false;
  }
}

/**
 * Start of a service day in a zone: noon less twelve hours. That is midnight except on a day whose clocks change:
 * 2026-03-08 in New York starts at 23:00 the evening before. Source: GTFS Schedule reference, field type Time.
 */
export function serviceDayStart(serviceDate: CalendarDate, zone: string): Instant {
  const [year = 0, month = 1, day = 1] = serviceDate.split('-').map(Number);
  return new TZDate(year, month - 1, day, 12, 0, 0, zone).getTime() - 12 * millisecondsInHour;
}

/**
 * The instant of a service-day time. `serviceInstant('2026-03-07', 92_100, 'America/New_York')` is
 * 2026-03-08T06:35Z: 25:35:00 of Saturday, 1:35 on Sunday morning.
 */
export function serviceInstant(serviceDate: CalendarDate, seconds: number, zone: string): Instant {
  return serviceDayStart(serviceDate, zone) + seconds * millisecondsInSecond;
}

/** The calendar day a zone's clocks and calendars show at an instant. */
export function calendarDateAt(instant: Instant, zone: string): CalendarDate {
  const local = new TZDate(instant, zone);
  const two = (value: number): string => String(value).padStart(2, '0');
  return `${String(local.getFullYear()).padStart(4, '0')}-${two(local.getMonth() + 1)}-${two(local.getDate())}`;
}

/** Seconds of an instant after the start of a service day; the other way round of `serviceInstant`. */
export function secondsOfServiceDay(instant: Instant, serviceDate: CalendarDate, zone: string): number {
  return (instant - serviceDayStart(serviceDate, zone)) / millisecondsInSecond;
}
