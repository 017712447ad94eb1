import {
  longestSetAsideMinutes,
  millisecondsInMinute,
  parseInstant,
  type Instant,
  type WireAlert,
} from '@stubpost/shared';
import { formatClock, formatTime } from '../../../lib/time-display';

const instant = (text: string | null): Instant | null => (text === null ? null : parseInstant(text));

/** Who has it, in two lines. */
export function holderWords(alert: WireAlert, zone: string, me: string): { who: string; small: string } {
  const who = alert.takenBy === null ? 'nobody' : alert.takenBy === me ? 'you' : alert.takenBy;
  const taken = instant(alert.takenAt);
  const until = instant(alert.setAsideUntil);
  if (alert.state === 'set-aside' && until !== null) {
    return { who: `till ${formatTime(until, zone)}`, small: alert.takenBy === null ? '' : who };
  }
  return {
    who: alert.state === 'raised' ? 'nobody' : who,
    small: taken === null ? '' : formatTime(taken, zone),
  };
}

/** One line of the strip about who has it: "taken by you 17:24", "not taken". */
export function stripHolder(alert: WireAlert, zone: string, me: string): string {
  const { who, small } = holderWords(alert, zone, me);
  if (alert.state === 'raised') return 'not taken';
  if (alert.state === 'set-aside') return `set aside ${who}`;
  return `taken by ${who} ${small}`.trim();
}

/** One thing that happened to an alert. */
export interface AlertMoment {
  clock: string;
  words: string;
}

/** What happened to an alert so far, oldest first. */
export function alertStory(alert: WireAlert, zone: string, me: string): AlertMoment[] {
  const who = (name: string | null): string => (name === me ? 'you' : (name ?? 'the system'));
  const moments: [string | null, string][] = [
    [alert.raisedAt, alert.previousId === null ? 'raised' : 'raised again, it had been cleared'],
    [
      alert.takenAt,
      alert.state === 'set-aside' ? `set aside by ${who(alert.takenBy)}` : `taken by ${who(alert.takenBy)}`,
    ],
    [alert.clearedAt, 'cleared'],
    [alert.closedAt, `closed${alert.closedCause === null ? '' : `: ${alert.closedCause}`}`],
  ];
  const past = moments.flatMap(([at, words]) => {
    const when = instant(at);
    return when === null ? [] : [{ when, words }];
  });
  return past
    .sort((a, b) => a.when - b.when)
    .map(({ when, words }) => ({ clock: formatClock(when, zone), words }));
}

/** A time until which an alert may be set aside. */
export interface UntilChoice {
  at: Instant;
  words: string;
}

const untilMinutes = [5, 10, 15, 20, longestSetAsideMinutes];

/** The times offered for setting aside: whole minutes, half an hour ahead at most. */
export function untilChoices(now: Instant, zone: string): UntilChoice[] {
  const minute = Math.floor(now / millisecondsInMinute) * millisecondsInMinute;
  return untilMinutes.map((minutes) => {
    const at = minute + minutes * millisecondsInMinute;
    return { at, words: `${formatTime(at, zone)}, ${minutes} min` };
  });
}

/** Causes offered when an alert is closed; any other can be typed. Our choice of words. */
export const commonCauses = [
  'Late inbound',
  'Late crew or relief',
  'Equipment fault',
  'Brake test took longer',
  'Boarding took longer',
  'Track or platform change',
  'Step done, not recorded',
  'Held for a connection',
] as const;
