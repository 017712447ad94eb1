import { parseInstant, type CalendarDate, type Instant } from '@stubpost/shared';

/** An instant as the wire gives it (ISO text) or as our sums do (milliseconds). */
export type Moment = Instant | string;

/** Milliseconds of a moment. A text that is no instant is a fault of the caller. */
export function toInstant(moment: Moment): Instant {
  if (typeof moment === 'number') return moment;
  const instant = parseInstant(moment);
  if (instant === null) throw new RangeError(`Not an instant: ${moment}`);
  return instant;
}

const formatters = new Map<string, Intl.DateTimeFormat>();

function formatter(zone: string, options: Intl.DateTimeFormatOptions): Intl.DateTimeFormat {
  const key = `${zone} ${JSON.stringify(options)}`;
  const known = formatters.get(key);
  if (known !== undefined) return known;
  const made = new Intl.DateTimeFormat('en-US', { timeZone: zone, hourCycle: 'h23', ...options });
  formatters.set(key, made);
  return made;
}

/** A wall clock reading in a zone. */
export interface WallTime {
  date: CalendarDate;
  hour: number;
  minute: number;
  second: number;
}

const wallParts: Intl.DateTimeFormatOptions = {
  year: 'numeric',
  month: '2-digit',
  day: '2-digit',
  hour: '2-digit',
  minute: '2-digit',
  second: '2-digit',
};

/** What a clock on the wall of the terminal shows. */
export function wallTime(moment: Moment, zone: string): WallTime {
  const parts: Record<string, string> = {};
  for (const { type, value } of formatter(zone, wallParts).formatToParts(toInstant(moment)))
    parts[type] = value;
  return {
    date: `${parts['year']}-${parts['month']}-${parts['day']}`,
    hour: Number(parts['hour']),
    minute: Number(parts['minute']),
    second: Number(parts['second']),
  };
}

const two = (value: number): string => String(value).padStart(2, '0');
const hourAndMinute = (wall: WallTime): string => `${two(wall.hour)}:${two(wall.minute)}`;
const millisecondsInHour = 3_600_000;

/** Letters of the zone at that moment: "EST" in winter, "EDT" in summer. */
export function formatZoneLetters(moment: Moment, zone: string): string {
  const parts = formatter(zone, { timeZoneName: 'short' }).formatToParts(toInstant(moment));
  return parts.find((part) => part.type === 'timeZoneName')?.value ?? zone;
}

/** In the night when clocks go back one hour comes twice: says which of the two, with letters; else nothing. */
function whichOfTwo(instant: Instant, zone: string): string {
  const here = wallTime(instant, zone);
  const sameClock = (other: Instant): boolean => {
    const wall = wallTime(other, zone);
    return wall.date === here.date && wall.hour === here.hour;
  };
  if (sameClock(instant + millisecondsInHour)) return ` first (${formatZoneLetters(instant, zone)})`;
  if (sameClock(instant - millisecondsInHour)) return ` second (${formatZoneLetters(instant, zone)})`;
  return '';
}

/** Plan and forecast: "17:40", without seconds, cut off and not rounded. "01:12 first (EDT)" where it comes twice. */
export function formatTime(moment: Moment, zone: string): string {
  const instant = toInstant(moment);
  return hourAndMinute(wallTime(instant, zone)) + whichOfTwo(instant, zone);
}

/** Clock, ticks, departures, log: "17:22:41". */
export function formatClock(moment: Moment, zone: string): string {
  const instant = toInstant(moment);
  const wall = wallTime(instant, zone);
  return `${hourAndMinute(wall)}:${two(wall.second)}${whichOfTwo(instant, zone)}`;
}

const calendarDay = (date: CalendarDate): Date => new Date(`${date}T12:00:00Z`);

function dayWords(date: CalendarDate, withYear: boolean): string {
  const at = calendarDay(date);
  const word = (options: Intl.DateTimeFormatOptions): string => formatter('UTC', options).format(at);
  const words = `${word({ weekday: 'short' })} ${word({ day: 'numeric' })} ${word({ month: 'short' })}`;
  return withYear ? `${words} ${word({ year: 'numeric' })}` : words;
}

/** A service date in words: "Tue 3 Mar". */
export function formatServiceDate(date: CalendarDate): string {
  return dayWords(date, false);
}

/** A service date where the year matters: "Tue 3 Mar 2026". */
export function formatServiceDateWithYear(date: CalendarDate): string {
  return dayWords(date, true);
}

/** The calendar day at the terminal. */
export function dateAt(moment: Moment, zone: string): CalendarDate {
  return wallTime(moment, zone).date;
}

/** A time that may lie days back: "17:40" on the day of `now`, else with its weekday, "Mon 17:40". */
export function formatTimeWithDay(moment: Moment, zone: string, now: Instant): string {
  const time = formatTime(moment, zone);
  const date = dateAt(moment, zone);
  if (date === dateAt(now, zone)) return time;
  return `${formatter('UTC', { weekday: 'short' }).format(calendarDay(date))} ${time}`;
}

/** A plan time with its service day: "17:40", and after midnight "00:40 (Tue night)". */
export function formatServiceTime(moment: Moment, zone: string, serviceDate: CalendarDate): string {
  const time = formatTime(moment, zone);
  if (dateAt(moment, zone) <= serviceDate) return time;
  return `${time} (${formatter('UTC', { weekday: 'short' }).format(calendarDay(serviceDate))} night)`;
}

/** Day, clock and zone: "Tue 3 Mar 17:22:41 EST". */
export function formatStamp(moment: Moment, zone: string): string {
  const letters = formatZoneLetters(moment, zone);
  const clock = formatClock(moment, zone);
  return `${dayWords(dateAt(moment, zone), false)} ${clock}${clock.endsWith(`(${letters})`) ? '' : ` ${letters}`}`;
}

/** How far away: "in 12 min", "3 min ago", "in 45 s", "now". Whole minutes are cut off from 60 s on. */
export function formatRelative(moment: Moment, now: Instant): string {
  const seconds = Math.trunc((toInstant(moment) - now) / 1000);
  const words = formatDistance(Math.abs(seconds));
  if (seconds === 0) return 'now';
  return seconds > 0 ? `in ${words}` : `${words} ago`;
}

/** How long ago something was; never in the future, as a clock that is read seldom may lag behind it. */
export function formatSince(moment: Moment, now: Instant): string {
  return formatRelative(Math.min(toInstant(moment), now), now);
}

function formatDistance(seconds: number): string {
  if (seconds < 60) return `${seconds} s`;
  const minutes = Math.floor(seconds / 60);
  if (minutes < 60) return `${minutes} min`;
  const hours = Math.floor(minutes / 60);
  if (hours >= 48) return `${Math.floor(hours / 24)} days`;
  return minutes % 60 === 0 ? `${hours} h` : `${hours} h ${minutes % 60} min`;
}

/** Both at once, never relative alone: "17:40, in 12 min". */
export function formatTimeAndRelative(moment: Moment, zone: string, now: Instant): string {
  return `${formatTime(moment, zone)}, ${formatRelative(moment, now)}`;
}

/** A length of time in words: "3 min 20 s", "12 min", "45 s", "1 h 5 min". */
export function formatDuration(seconds: number): string {
  const whole = Math.round(Math.abs(seconds));
  const hours = Math.floor(whole / 3600);
  const minutes = Math.floor((whole % 3600) / 60);
  const rest = whole % 60;
  const parts = [
    hours > 0 && `${hours} h`,
    minutes > 0 && `${minutes} min`,
    rest > 0 && hours === 0 && `${rest} s`,
  ];
  return parts.filter((part) => part !== false).join(' ') || '0 s';
}

/** Lateness in words, kept to the second: "3 min 20 s late", "20 s early", "on the second". */
export function formatLateness(delaySeconds: number): string {
  if (delaySeconds === 0) return 'on the second';
  return `${formatDuration(delaySeconds)} ${delaySeconds > 0 ? 'late' : 'early'}`;
}

/** Lateness in tables, minutes with one decimal: "3.3", "−0.3". Tenths are cut off towards zero. */
export function formatLatenessMinutes(delaySeconds: number): string {
  const tenths = Math.trunc(Math.abs(delaySeconds) / 6);
  const text = `${Math.floor(tenths / 10)}.${tenths % 10}`;
  return delaySeconds < 0 && tenths > 0 ? `−${text}` : text;
}

/** Slack as a figure, whole minutes rounded down: 230 s is "+3", −10 s is "−1"; null (no forecast) is "–". */
export function formatSlack(slackSeconds: number | null): string {
  if (slackSeconds === null) return '–';
  const minutes = Math.floor(slackSeconds / 60);
  return minutes < 0 ? `−${-minutes}` : `+${minutes}`;
}

/** Slack in words for reading out: "3 minutes to spare", "short by 1 minute", "no forecast". */
export function formatSlackWords(slackSeconds: number | null): string {
  if (slackSeconds === null) return 'no forecast';
  const minutes = Math.floor(slackSeconds / 60);
  const words = `${Math.abs(minutes)} ${Math.abs(minutes) === 1 ? 'minute' : 'minutes'}`;
  return minutes < 0 ? `short by ${words}` : `${words} to spare`;
}
