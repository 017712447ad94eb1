import { addSeconds, secondsBetween, type Instant } from '../lib/instant';
import { formatDuration } from '../lib/zone-time';
import type { AssessedTurn } from './assessed-turn';
import type { Finding } from './finding';
import type { LatenessSettings } from './settings';
import { deskAnd } from './words';

/**
 * *Unsecured*: nobody is at the train who can work its brakes, and no handbrake stands set by count. Raised at once;
 * stands until a handbrake, an engineer or a relief is recorded. Its line gives the gap in seconds.
 */
export function findUnsecured(turn: AssessedTurn, settings: LatenessSettings, now: Instant): Finding | null {
  const { unsecuredSince } = turn;
  if (unsecuredSince === null) return null;
  const gapSeconds = Math.floor(secondsBetween(unsecuredSince, now));
  return {
    cause: 'unsecured',
    priority: 'act-now',
    text: `No handbrake recorded and nobody at the brakes since ${settings.formatExactTime(unsecuredSince)}`,
    action: 'Send somebody to the train. If a handbrake is set, record it; if not, have it set first.',
    actor: deskAnd(turn, 'conductor'),
    byWhen: null,
    lines: [`Gap so far: ${gapSeconds} s`],
  };
}

/**
 * *Blue signal* still up near the departure, from 10 min before it, or up when the train left. Stands until the
 * signal is taken down.
 */
export function findBlueSignal(turn: AssessedTurn, settings: LatenessSettings, now: Instant): Finding | null {
  const { blueSignal, departureAt } = turn;
  const { departureAnchorAt } = turn.forecast;
  if (blueSignal === null || departureAnchorAt === null) return null;
  const hasLeft = departureAt !== null;
  if (!hasLeft && now < addSeconds(departureAnchorAt, -settings.blueSignalSeconds)) return null;
  const since = `up since ${settings.formatExactTime(blueSignal.since)} (${blueSignal.by})`;
  return {
    cause: 'blue-signal',
    priority: 'act-now',
    text: hasLeft
      ? `Left at ${settings.formatExactTime(departureAt)} with the blue signal on record, ${since}`
      : `Blue signal ${since}, leaves ${settings.formatTime(departureAnchorAt)}`,
    action: 'Call whoever put it up. Only they, or their craft, take it down; nobody works round it.',
    actor: `dispatcher, inspector ${blueSignal.by}`,
    byWhen: hasLeft ? null : departureAnchorAt,
    lines: [],
  };
}

/** How long a gap lasted, for the record of an alert that is over: "340 s (5 min 40 s)". */
export function gapWords(seconds: number): string {
  return `${Math.floor(seconds)} s (${formatDuration(seconds)})`;
}
