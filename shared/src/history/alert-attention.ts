import { addSeconds, type Instant, millisecondsInHour, secondsBetween } from '../lib/instant';
import { PRIORITIES, type Priority } from '../lateness/finding';
import { type CountedShare, countedShare } from './alert-precision';
import { publishedAlertTargets } from './alert-targets';
import type { PastAlert } from './past-alert';
import { quantileOfSorted } from './quantile';

/** Alerts that nobody ever took, and how long the others waited. */
export interface UntakenFigures extends CountedShare {
  byPriority: (CountedShare & { priority: Priority })[];
  /** Seconds from raising to the last taking, of those that were taken; quantiles of type 7. */
  secondsToTake: { counted: number; median: number | null; ninetyFifth: number | null };
}

/** Which alerts nobody took. An alert that its crew settles before anybody can take it is among them. */
export function measureUntaken(alerts: readonly PastAlert[]): UntakenFigures {
  const shareOf = (some: readonly PastAlert[]): CountedShare =>
    countedShare(some.filter(({ takenAt }) => takenAt === null).length, some.length);
  const seconds = alerts
    .flatMap(({ takenAt, raisedAt }) => (takenAt === null ? [] : [secondsBetween(raisedAt, takenAt)]))
    .sort((a, b) => a - b);
  return {
    ...shareOf(alerts),
    byPriority: PRIORITIES.map((priority) => ({
      priority,
      ...shareOf(alerts.filter((alert) => alert.priority === priority)),
    })),
    secondsToTake: {
      counted: seconds.length,
      median: quantileOfSorted(seconds, 0.5),
      ninetyFifth: quantileOfSorted(seconds, 0.95),
    },
  };
}

/** Alerts that come and go. */
export interface RepeaterFigures {
  /** Subjects on which one cause was raised three times within a minute. */
  chattering: number;
  /** Alerts raised again within 10 minutes of the clearing before. */
  cameBack: number;
  /** Alerts that were gone within a minute, untaken. */
  fleeting: number;
}

/** An alert that comes back sooner than this after it cleared is a repeater. Our choice: the hold times are made for it. */
export const comesBackSeconds = 600;
/** An alert that is gone sooner than this helped nobody. Our choice. */
export const fleetingSeconds = 60;

/** Alerts that come and go, counted on each subject and cause. */
export function measureRepeaters(alerts: readonly PastAlert[]): RepeaterFigures {
  const bySubject = new Map<string, PastAlert[]>();
  for (const alert of [...alerts].sort((a, b) => a.raisedAt - b.raisedAt)) {
    const key = `${alert.cause} ${alert.subjectId}`;
    const row = bySubject.get(key);
    if (row === undefined) bySubject.set(key, [alert]);
    else row.push(alert);
  }
  const rows = [...bySubject.values()];
  return {
    chattering: rows.filter(chatters).length,
    cameBack: rows.reduce((sum, row) => sum + row.filter((_alert, index) => cameBack(row, index)).length, 0),
    fleeting: alerts.filter(
      ({ raisedAt, takenAt, clearedAt }) =>
        takenAt === null && clearedAt !== null && clearedAt < addSeconds(raisedAt, fleetingSeconds),
    ).length,
  };
}

function chatters(row: readonly PastAlert[]): boolean {
  const { chatterTimes, chatterSeconds } = publishedAlertTargets;
  return row.some((alert, index) => {
    const last = row[index + chatterTimes - 1];
    return last !== undefined && last.raisedAt <= addSeconds(alert.raisedAt, chatterSeconds);
  });
}

function cameBack(row: readonly PastAlert[], index: number): boolean {
  const clearedAt = row[index - 1]?.clearedAt ?? null;
  const alert = row[index];
  return (
    alert !== undefined && clearedAt !== null && alert.raisedAt <= addSeconds(clearedAt, comesBackSeconds)
  );
}

/** Whether an alert stood, or stands, longer than 24 hours. */
export function isStale(alert: Pick<PastAlert, 'raisedAt' | 'clearedAt'>, now: Instant): boolean {
  const stood = (alert.clearedAt ?? now) - alert.raisedAt;
  return stood > publishedAlertTargets.staleHours * millisecondsInHour;
}
