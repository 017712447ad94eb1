import { millisecondsInMinute, type Instant } from '@stubpost/shared';
import { nearestInstantOfTime, readTimeOfDay } from '../../../lib/time-entry';

/** A moment as typed, or why it cannot be read. */
export type WhenResult =
  { ok: true; at: Instant; said: 'now' | 'ago' | 'typed' } | { ok: false; words: string };

const longestAgo = 99;

/**
 * When something happened, as typed at a desk on the terminal's clock: nothing is now, "2" is two minutes ago, "17:24",
 * "1724" or "17:24:05" is the nearest such moment. What has happened does not lie ahead.
 */
export function readWhen(text: string, zone: string, now: Instant): WhenResult {
  const typed = text.trim().toLowerCase();
  if (typed === '' || typed === 'now') return { ok: true, at: now, said: 'now' };
  const ago = /^(\d{1,2})(?: ?(?:m|min|min ago))?$/.exec(typed);
  if (ago !== null && Number(ago[1]) <= longestAgo) {
    return { ok: true, at: now - Number(ago[1]) * millisecondsInMinute, said: 'ago' };
  }
  const seconds = readTimeOfDay(typed);
  if (seconds === null)
    return { ok: false, words: 'Give nothing for now, 2 for two minutes ago, or a time as 17:24' };
  const at = nearestInstantOfTime(seconds, zone, now);
  if (at > now + millisecondsInMinute)
    return { ok: false, words: 'That lies ahead: give the time at which it happened' };
  return { ok: true, at: Math.min(at, now), said: 'typed' };
}

/** A time to come, as typed: the nearest such moment that is not already over. */
export function readAhead(text: string, zone: string, now: Instant): WhenResult {
  const typed = text.trim();
  const inMinutes = /^\+(\d{1,3})$/.exec(typed);
  if (inMinutes !== null)
    return { ok: true, at: now + Number(inMinutes[1]) * millisecondsInMinute, said: 'ago' };
  const seconds = readTimeOfDay(typed);
  if (seconds === null) return { ok: false, words: 'Give a time as 17:40, or +5 for in five minutes' };
  return { ok: true, at: nearestInstantOfTime(seconds, zone, now), said: 'typed' };
}
