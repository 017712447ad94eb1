/** One activity of a network. Times have any one unit; predecessors are ids of other activities. */
export interface Activity {
  id: string;
  duration: number;
  after: readonly string[];
  /** The activity may not start earlier than this; absent: as soon as its predecessors are finished. */
  notBefore?: number | undefined;
}

/** When an activity can and must run. `slack` is total slack, latest start less earliest start. */
export interface ActivityTimes {
  id: string;
  earliestStart: number;
  earliestFinish: number;
  latestStart: number;
  latestFinish: number;
  slack: number;
}

/** What is wrong with a network that has no schedule. */
export type NetworkRefusal =
  | { code: 'network.unknown_predecessor'; activity: string; predecessor: string }
  | { code: 'network.cycle'; activities: string[] };

/** A worked-out network: activities in an order that respects their predecessors. */
export interface NetworkSchedule {
  finish: number;
  activities: ActivityTimes[];
  /** Activities with the least slack, in order: the critical path, or all of them where several tie. */
  critical: string[];
}

type Ordered = { ok: true; value: Activity[] } | { ok: false; error: NetworkRefusal };

/**
 * Critical-path method on activities. Forward: a start is the latest finish of the predecessors, not before its own
 * not-before time; backward: a finish is the earliest latest start of the successors, or the end of the whole for an
 * activity that has none. `end` is the time by which all must be finished, by default the earliest finish of the
 * whole; with an earlier end slack is negative.
 *
 * `scheduleNetwork([{ id: 'A', duration: 3, after: [] }, { id: 'B', duration: 2, after: ['A'] }])` finishes at 5.
 */
export function scheduleNetwork(
  activities: readonly Activity[],
  end?: number,
): { ok: true; value: NetworkSchedule } | { ok: false; error: NetworkRefusal } {
  const ordered = orderActivities(activities);
  if (!ordered.ok) return ordered;
  const earliest = forwardPass(ordered.value);
  const finish = Math.max(0, ...[...earliest.values()].map((times) => times.finish));
  const latest = backwardPass(ordered.value, end ?? finish);
  const times = ordered.value.map((activity): ActivityTimes => {
    const { start: earliestStart, finish: earliestFinish } = earliest.get(activity.id) ?? {
      start: 0,
      finish: 0,
    };
    const latestFinish = latest.get(activity.id) ?? 0;
    const latestStart = latestFinish - activity.duration;
    const slack = latestStart - earliestStart;
    return { id: activity.id, earliestStart, earliestFinish, latestStart, latestFinish, slack };
  });
  const least = Math.min(...times.map((each) => each.slack));
  const critical = times.filter((each) => each.slack === least).map((each) => each.id);
  return { ok: true, value: { finish, activities: times, critical } };
}

/** The activities, each after all its predecessors; those that are free at the same time keep their given order. */
function orderActivities(activities: readonly Activity[]): Ordered {
  const ids = new Set(activities.map((activity) => activity.id));
  for (const { id, after } of activities) {
    const unknown = after.find((key) => !ids.has(key));
    if (unknown === undefined) continue;
    return { ok: false, error: { code: 'network.unknown_predecessor', activity: id, predecessor: unknown } };
  }
  const placed = new Set<string>();
  const ordered: Activity[] = [];
  let waiting = [...activities];
  while (waiting.length > 0) {
    const free = waiting.filter((activity) => activity.after.every((key) => placed.has(key)));
    if (free.length === 0) {
      return { ok: false, error: { code: 'network.cycle', activities: waiting.map(({ id }) => id) } };
    }
    for (const activity of free) placed.add(activity.id);
    ordered.push(...free);
    waiting = waiting.filter((activity) => !placed.has(activity.id));
  }
  return { ok: true, value: ordered };
}

function forwardPass(ordered: readonly Activity[]): Map<string, { start: number; finish: number }> {
  const times = new Map<string, { start: number; finish: number }>();
  for (const { id, duration, after, notBefore } of ordered) {
    const start = Math.max(notBefore ?? 0, 0, ...after.map((key) => times.get(key)?.finish ?? 0));
    times.set(id, { start, finish: start + duration });
  }
  return times;
}

function backwardPass(ordered: readonly Activity[], end: number): Map<string, number> {
  const latestFinish = new Map<string, number>();
  for (const { id, duration, after } of [...ordered].reverse()) {
    const finish = latestFinish.get(id) ?? end;
    latestFinish.set(id, finish);
    for (const key of after) {
      latestFinish.set(key, Math.min(latestFinish.get(key) ?? Infinity, finish - duration));
    }
  }
  return latestFinish;
}
