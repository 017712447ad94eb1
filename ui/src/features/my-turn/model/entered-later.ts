import { millisecondsInHour, millisecondsInMinute, type Instant } from '@stubpost/shared';
import { dateAt, wallTime } from '../../../lib/time-display';
import { instantOfWallTime, readTimeOfDay } from '../../../lib/time-entry';

/** How long ago an act may be said to have been with one touch, in minutes. Our choice. */
export const minutesAgoChoices = [1, 2, 5, 10] as const;

const hoursInDay = 24;

/** The moment so many minutes before now. */
export function minutesAgo(now: Instant, minutes: number): Instant {
  return now - minutes * millisecondsInMinute;
}

/**
 * The latest moment up to now at which the clocks of a zone showed a typed time (`17:22`, `1722`, `17:22:05`): just
 * after midnight 23:50 is the evening before, and in the night when the clocks go back it is the later of the two
 * that have passed. Null when it cannot be read or the clocks never showed it.
 */
export function momentOfClock(typed: string, zone: string, now: Instant): Instant | null {
  const wanted = readTimeOfDay(typed);
  if (wanted === null || wanted >= hoursInDay * 3600) return null;
  const days = [now, now - hoursInDay * millisecondsInHour].map((near) => dateAt(near, zone));
  const moments = days.flatMap((day) => {
    const first = instantOfWallTime(day, wanted, zone);
    return [first, first + millisecondsInHour];
  });
  const passed = moments.filter((moment) => moment <= now && secondsOfDay(moment, zone) === wanted);
  return passed.length === 0 ? null : Math.max(...passed);
}

function secondsOfDay(moment: Instant, zone: string): number {
  const { hour, minute, second } = wallTime(moment, zone);
  return (hour * 60 + minute) * 60 + second;
}
