import { millisecondsInMinute, type Instant } from '@stubpost/shared';
import { TZDate } from '@date-fns/tz';

/** How long ago an act may be said to have been with one touch, in minutes. Our choice. */
export const minutesAgoChoices = [1, 2, 5, 10] as const;

/** The moment so many minutes before now. */
export function minutesAgo(now: Instant, minutes: number): Instant {
  return now - minutes * millisecondsInMinute;
}

const clockForm = /^([01]?\d|2[0-3])[:.]?([0-5]\d)(?:[:.]([0-5]\d))?$/;

/**
 * The latest moment up to now at which the clocks of a zone showed a typed time (`17:22`, `1722`, `17:22:05`): just
 * after midnight 23:50 is the evening before. Null when it cannot be read. On the night the clocks go back the later of
 * two such moments that have passed is taken.
 */
export function momentOfClock(typed: string, zone: string, now: Instant): Instant | null {
  const match = clockForm.exec(typed.trim());
  if (match === null) return null;
  const [hours = 0, minutes = 0, seconds = 0] = match.slice(1).map((part) => Number(part ?? 0));
  const wanted = (hours * 60 + minutes) * 60 + seconds;
  const shown = (at: Instant): number => {
    const local = new TZDate(at, zone);
    return (local.getHours() * 60 + local.getMinutes()) * 60 + local.getSeconds();
  };
  const wholeSecond = now - (now % 1000);
  // Back by the difference on the clock; a second look mends the hour that a clock change puts in between.
  const first = wholeSecond - ((shown(wholeSecond) - wanted + daySeconds) % daySeconds) * 1000;
  const off = difference(wanted, shown(first));
  const mended = first + off * 1000;
  return mended <= now && shown(mended) === wanted ? mended : null;
}

const daySeconds = 24 * 60 * 60;

/** Seconds from one clock time to another, the short way round. */
function difference(wanted: number, shown: number): number {
  const forward = (wanted - shown + daySeconds) % daySeconds;
  return forward > daySeconds / 2 ? forward - daySeconds : forward;
}
