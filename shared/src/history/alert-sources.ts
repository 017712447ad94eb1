import type { Instant } from '../lib/instant';
import { type AlertCause, PRIORITIES, type Priority } from '../lateness/finding';
import { type CountedShare, countedShare } from './alert-precision';
import { publishedPriorityMix } from './alert-targets';
import type { PastAlert } from './past-alert';

/** One priority's part of all alerts, and the part it should have. */
export interface PriorityPart extends CountedShare {
  priority: Priority;
  target: number;
}

/** The priorities as the alerts had them last, the most urgent first, each with its target. */
export function priorityMix(alerts: readonly PastAlert[]): PriorityPart[] {
  return PRIORITIES.map((priority) => ({
    priority,
    target: publishedPriorityMix[priority],
    ...countedShare(alerts.filter((alert) => alert.priority === priority).length, alerts.length),
  }));
}

/** What alerts come from: one cause about one train number, whatever the day. */
export interface AlertSource {
  cause: AlertCause;
  train: string | null;
  count: number;
  /** Of all alerts. */
  share: number;
  lastRaisedAt: Instant;
}

/** The busiest sources and what part of all alerts they make together. */
export interface TopSources {
  sources: AlertSource[];
  /** How many sources there are in all. */
  sourceCount: number;
  /** Of the busiest together; null without alerts. */
  share: number | null;
}

const topCount = 10;

/** The ten busiest sources, the busiest first; of equals the one that was raised last. */
export function topSources(alerts: readonly PastAlert[]): TopSources {
  const sources = new Map<string, AlertSource>();
  for (const { cause, train, raisedAt } of alerts) {
    const key = `${cause} ${train ?? ''}`;
    const known = sources.get(key) ?? { cause, train, count: 0, share: 0, lastRaisedAt: raisedAt };
    known.count += 1;
    known.share = known.count / alerts.length;
    known.lastRaisedAt = Math.max(known.lastRaisedAt, raisedAt);
    sources.set(key, known);
  }
  const top = [...sources.values()]
    .sort((a, b) => b.count - a.count || b.lastRaisedAt - a.lastRaisedAt)
    .slice(0, topCount);
  return {
    sources: top,
    sourceCount: sources.size,
    share: alerts.length === 0 ? null : top.reduce((sum, { count }) => sum + count, 0) / alerts.length,
  };
}
