import { PRIORITIES, type WireAlert } from '@stubpost/shared';

/** The groups of the list, in the order in which they ask for somebody. */
export const ALERT_GROUPS = ['untaken', 'taken', 'set-aside', 'cleared', 'closed'] as const;
export type AlertGroupKey = (typeof ALERT_GROUPS)[number];

export const groupWords: Record<AlertGroupKey, string> = {
  untaken: 'Nobody has it',
  taken: 'Taken',
  'set-aside': 'Set aside',
  cleared: 'Cleared, waiting for a cause',
  closed: 'Closed today',
};

export interface AlertGroup {
  key: AlertGroupKey;
  alerts: WireAlert[];
}

/** What of the list is shown. */
export const SHOWN = ['all', 'standing', 'waiting', 'closed'] as const;
export type Shown = (typeof SHOWN)[number];

const shownGroups: Record<Shown, readonly AlertGroupKey[]> = {
  all: ALERT_GROUPS,
  standing: ['untaken', 'taken', 'set-aside'],
  waiting: ['cleared'],
  closed: ['closed'],
};

export function groupOf(alert: WireAlert): AlertGroupKey {
  return alert.state === 'raised' ? 'untaken' : alert.state;
}

/** Most urgent first, then the one that has stood longest. */
export function byUrgency(a: WireAlert, b: WireAlert): number {
  return (
    PRIORITIES.indexOf(a.priority) - PRIORITIES.indexOf(b.priority) || a.raisedAt.localeCompare(b.raisedAt)
  );
}

const latestFirst = (a: WireAlert, b: WireAlert): number => b.raisedAt.localeCompare(a.raisedAt);

/** The alerts in their groups; empty groups are left out. What is over stands with the latest first. */
export function groupAlerts(alerts: readonly WireAlert[], shown: Shown = 'all'): AlertGroup[] {
  return ALERT_GROUPS.filter((key) => shownGroups[shown].includes(key))
    .map((key) => ({
      key,
      alerts: alerts
        .filter((alert) => groupOf(alert) === key)
        .sort(key === 'cleared' || key === 'closed' ? latestFirst : byUrgency),
    }))
    .filter((group) => group.alerts.length > 0);
}

/** What the strip above the board shows: the alert that gets the room, and the rest, those that nobody has first. */
export interface Strip {
  foremost: WireAlert | null;
  others: WireAlert[];
}

/** Standing alerts for the strip. Only one that nobody has gets the room. */
export function stripOf(alerts: readonly WireAlert[]): Strip {
  const standing = groupAlerts(alerts, 'standing').flatMap((group) => group.alerts);
  const [first, ...rest] = standing;
  if (first === undefined || first.state !== 'raised') return { foremost: null, others: standing };
  return { foremost: first, others: rest };
}
