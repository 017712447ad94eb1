import type { CalendarDate, Instant } from '@stubpost/shared';
import { wallTime } from './time-display';

const timeOfDay = /^(\d{1,2})[:.]?(\d{2})(?:[:.]?(\d{2}))?$/;

/**
 * Reads a time as people at a desk type it: "17:40", "1740", "17:40:30", and "25:35" for the small hours of the same
 * service day. Seconds past the day's start, below 48 h; null when it is no time.
 */
export function readTimeOfDay(text: string): number | null {
  const match = timeOfDay.exec(text.trim());
  if (match === null) return null;
  const [hours, minutes, seconds] = [Number(match[1]), Number(match[2]), Number(match[3] ?? 0)];
  if (hours > 47 || minutes > 59 || seconds > 59) return null;
  return hours * 3600 + minutes * 60 + seconds;
}

const asUtc = (date: CalendarDate, seconds: number): Instant =>
  Date.parse(`${date}T00:00:00Z`) + seconds * 1000;

/** Milliseconds by which the zone's wall clock is ahead of UTC at an instant. */
function offsetAt(instant: Instant, zone: string): number {
  const wall = wallTime(instant, zone);
  const whole = Math.floor(instant / 1000) * 1000;
  return asUtc(wall.date, wall.hour * 3600 + wall.minute * 60 + wall.second) - whole;
}

/**
 * The instant at which the terminal's clock shows a time on a day. A time that comes twice (clocks go back) is the
 * first one; one that does not come (clocks go forward) is as far past the gap as it was past its start.
 */
export function instantOfWallTime(date: CalendarDate, secondsOfDay: number, zone: string): Instant {
  const naive = asUtc(date, secondsOfDay);
  const day = 24 * 3_600_000;
  const candidates = [offsetAt(naive - day, zone), offsetAt(naive + day, zone)].map(
    (offset) => naive - offset,
  );
  const fitting = candidates.filter((instant) => offsetAt(instant, zone) === naive - instant);
  return fitting.length > 0 ? Math.min(...fitting) : Math.max(...candidates);
}

/** The next or last instant at which the terminal's clock shows a time, whichever is nearer to `near`. */
export function nearestInstantOfTime(secondsOfDay: number, zone: string, near: Instant): Instant {
  const day = 24 * 3_600_000;
  const around = [near - day, near, near + day].map((instant) =>
    instantOfWallTime(wallTime(instant, zone).date, secondsOfDay, zone),
  );
  return around.reduce((best, instant) =>
    Math.abs(instant - near) < Math.abs(best - near) ? instant : best,
  );
}
