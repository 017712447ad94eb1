import { DirectedGraph } from 'graphology';
import { topologicalSort } from 'graphology-dag';
import toposort from 'toposort';
import { describe, expect, it } from 'vitest';
import { seededRandom } from '../testing/seeded-random';
import { scheduleNetwork, type Activity, type NetworkSchedule } from './network';

type Table = Record<string, [duration: number, after: string[]]>;

function activitiesOf(table: Table): Activity[] {
  return Object.entries(table).map(([id, [duration, after]]) => ({ id, duration, after }));
}

function schedule(activities: readonly Activity[], end?: number): NetworkSchedule {
  const result = scheduleNetwork(activities, end);
  if (!result.ok) throw new Error(result.error.code);
  return result.value;
}

/** Earliest start, earliest finish, latest start, latest finish, slack of each activity. */
function fullTable(activities: readonly Activity[]): Record<string, number[]> {
  return Object.fromEntries(
    schedule(activities).activities.map((times) => [
      times.id,
      [times.earliestStart, times.earliestFinish, times.latestStart, times.latestFinish, times.slack],
    ]),
  );
}

const slackOf = (activities: readonly Activity[]): Record<string, number> =>
  Object.fromEntries(schedule(activities).activities.map((times) => [times.id, times.slack]));

describe('published networks', () => {
  it('N1, ten activities (published table of a project-management text): 20, by A, D, G', () => {
    const n1 = activitiesOf({
      A: [8, []],
      B: [4, []],
      C: [3, []],
      D: [5, ['A']],
      E: [1, ['A']],
      F: [2, ['C']],
      G: [7, ['D']],
      H: [6, ['C']],
      I: [9, ['B', 'E', 'F']],
      J: [6, ['H']],
    });
    expect(schedule(n1)).toMatchObject({ finish: 20, critical: ['A', 'D', 'G'] });
    expect(fullTable(n1)).toEqual({
      A: [0, 8, 0, 8, 0],
      B: [0, 4, 7, 11, 7],
      C: [0, 3, 5, 8, 5],
      D: [8, 13, 8, 13, 0],
      E: [8, 9, 10, 11, 2],
      F: [3, 5, 9, 11, 6],
      G: [13, 20, 13, 20, 0],
      H: [3, 9, 8, 14, 5],
      I: [9, 18, 11, 20, 2],
      J: [9, 15, 14, 20, 5],
    });
  });

  it('N2, seven arrows between six nodes (management-science solutions, chapter 8): 20, by 1-3-4-5-6', () => {
    const n2 = activitiesOf({
      '1-2': [7, []],
      '1-3': [10, []],
      '2-4': [6, ['1-2']],
      '3-4': [5, ['1-3']],
      '3-5': [4, ['1-3']],
      '4-5': [3, ['2-4', '3-4']],
      '5-6': [2, ['3-5', '4-5']],
    });
    expect(schedule(n2)).toMatchObject({ finish: 20, critical: ['1-3', '3-4', '4-5', '5-6'] });
    expect(fullTable(n2)).toEqual({
      '1-2': [0, 7, 2, 9, 2],
      '1-3': [0, 10, 0, 10, 0],
      '2-4': [7, 13, 9, 15, 2],
      '3-4': [10, 15, 10, 15, 0],
      '3-5': [10, 14, 14, 18, 4],
      '4-5': [15, 18, 15, 18, 0],
      '5-6': [18, 20, 18, 20, 0],
    });
  });

  it('N3, thirteen arrows with a dummy of no length (the same source): 38, by 1-3-5-7-8-9', () => {
    const n3 = activitiesOf({
      '1-2': [8, []],
      '1-3': [10, []],
      '1-4': [9, []],
      '2-5': [6, ['1-2']],
      '2-6': [4, ['1-2']],
      '3-5': [5, ['1-3']],
      '4-5': [0, ['1-4']],
      '4-7': [7, ['1-4']],
      '5-7': [12, ['2-5', '3-5', '4-5']],
      '5-8': [15, ['2-5', '3-5', '4-5']],
      '6-9': [18, ['2-6']],
      '7-8': [4, ['4-7', '5-7']],
      '8-9': [7, ['5-8', '7-8']],
    });
    expect(schedule(n3)).toMatchObject({ finish: 38, critical: ['1-3', '3-5', '5-7', '7-8', '8-9'] });
    expect(fullTable(n3)).toEqual({
      '1-2': [0, 8, 1, 9, 1],
      '1-3': [0, 10, 0, 10, 0],
      '1-4': [0, 9, 6, 15, 6],
      '2-5': [8, 14, 9, 15, 1],
      '2-6': [8, 12, 16, 20, 8],
      '3-5': [10, 15, 10, 15, 0],
      '4-5': [9, 9, 15, 15, 6],
      '4-7': [9, 16, 20, 27, 11],
      '5-7': [15, 27, 15, 27, 0],
      '5-8': [15, 30, 16, 31, 1],
      '6-9': [12, 30, 20, 38, 8],
      '7-8': [27, 31, 27, 31, 0],
      '8-9': [31, 38, 31, 38, 0],
    });
  });

  it('N4, five activities (course notes): 27, by A, C, D', () => {
    const n4 = activitiesOf({ A: [12, []], B: [10, []], C: [10, ['A', 'B']], D: [5, ['C']], E: [3, ['C']] });
    expect(schedule(n4)).toMatchObject({ finish: 27, critical: ['A', 'C', 'D'] });
    expect(slackOf(n4)).toEqual({ A: 0, B: 2, C: 0, D: 0, E: 2 });
  });

  it('N5, fourteen activities at their PERT means (Hillier and Lieberman, prototype example): 44, by A-B-C-E-F-J-L-N', () => {
    const threePoint: Record<string, [number, number, number, string[]]> = {
      A: [1, 2, 3, []],
      B: [2, 3.5, 8, ['A']],
      C: [6, 9, 18, ['B']],
      D: [4, 5.5, 10, ['C']],
      E: [1, 4.5, 5, ['C']],
      F: [4, 4, 10, ['E']],
      G: [5, 6.5, 11, ['D']],
      H: [5, 8, 17, ['E', 'G']],
      I: [3, 7.5, 9, ['C']],
      J: [3, 9, 9, ['F', 'I']],
      K: [4, 4, 4, ['J']],
      L: [1, 5.5, 7, ['J']],
      M: [1, 2, 3, ['H']],
      N: [5, 5.5, 9, ['K', 'L']],
    };
    const n5 = Object.entries(threePoint).map(([id, [o, m, p, after]]) => ({
      id,
      duration: (o + 4 * m + p) / 6,
      after,
    }));
    expect(schedule(n5)).toMatchObject({ finish: 44, critical: ['A', 'B', 'C', 'E', 'F', 'J', 'L', 'N'] });
    expect(slackOf(n5)).toEqual({
      ...{ A: 0, B: 0, C: 0, D: 4, E: 0, F: 0, G: 4 },
      ...{ H: 4, I: 2, J: 0, K: 1, L: 0, M: 4, N: 0 },
    });
    const variance = schedule(n5).critical.reduce((sum, id) => {
      const [optimistic = 0, , pessimistic = 0] = threePoint[id] ?? [];
      return sum + ((pessimistic - optimistic) / 6) ** 2;
    }, 0);
    expect(variance).toBeCloseTo(9, 10);
  });
});

describe('a network', () => {
  it('starts an activity no earlier than its not-before time', () => {
    const times = schedule([
      { id: 'A', duration: 3, after: [] },
      { id: 'B', duration: 2, after: ['A'], notBefore: 10 },
    ]);
    expect(times.finish).toBe(12);
    expect(times.activities[1]).toMatchObject({ earliestStart: 10, slack: 0 });
  });

  it('has negative slack when it must end earlier than it can', () => {
    expect(
      schedule(activitiesOf({ A: [3, []], B: [2, ['A']] }), 4).activities.map(({ slack }) => slack),
    ).toEqual([-1, -1]);
  });

  it('without activities is finished at once', () => {
    expect(schedule([])).toEqual({ finish: 0, activities: [], critical: [] });
  });

  it('that waits for something unknown is refused', () => {
    expect(scheduleNetwork([{ id: 'A', duration: 1, after: ['Z'] }])).toEqual({
      ok: false,
      error: { code: 'network.unknown_predecessor', activity: 'A', predecessor: 'Z' },
    });
  });

  it('that goes in a circle is refused and its activities named', () => {
    const circle = activitiesOf({ A: [1, []], B: [1, ['A', 'C']], C: [1, ['B']] });
    expect(scheduleNetwork(circle)).toEqual({
      ok: false,
      error: { code: 'network.cycle', activities: ['B', 'C'] },
    });
  });
});

describe('a second opinion on 250 random networks', () => {
  const random = seededRandom(20260303);
  const networks = Array.from({ length: 250 }, () => randomNetwork(random));

  it('graphology orders them and the longest path to each activity is its earliest finish', () => {
    for (const activities of networks) {
      const graph = new DirectedGraph();
      for (const { id } of activities) graph.addNode(id);
      for (const { id, after } of activities) for (const before of after) graph.addDirectedEdge(before, id);
      expectEarliest(activities, longestPaths(activities, topologicalSort(graph)));
    }
  });

  it('toposort orders them and the longest path to each activity is its earliest finish', () => {
    for (const activities of networks) {
      const edges = activities.flatMap(({ id, after }) =>
        after.map((before): [string, string] => [before, id]),
      );
      const order = toposort.array(
        activities.map(({ id }) => id),
        edges,
      );
      expectEarliest(activities, longestPaths(activities, order));
    }
  });

  it('the longest path from each activity to the end of the whole is what its slack leaves', () => {
    for (const activities of networks) {
      const { finish, activities: times } = schedule(activities);
      const reversed = activities.map(({ id, duration }) => ({
        id,
        duration,
        after: activities.filter((other) => other.after.includes(id)).map((other) => other.id),
      }));
      const edges = reversed.flatMap(({ id, after }) =>
        after.map((before): [string, string] => [before, id]),
      );
      const toEnd = longestPaths(
        reversed,
        toposort.array(
          reversed.map(({ id }) => id),
          edges,
        ),
      );
      for (const { id, latestStart } of times) expect(latestStart).toBe(finish - (toEnd.get(id) ?? 0));
    }
  });
});

/** Two to twenty activities in mixed order; each waits for up to three that were made before it. Whole durations. */
function randomNetwork(random: () => number): Activity[] {
  const size = 2 + Math.floor(random() * 19);
  const activities = Array.from({ length: size }, (_, index): Activity => {
    const after = Array.from({ length: Math.floor(random() * 4) }, () => `n${Math.floor(random() * index)}`);
    const known = index === 0 ? [] : [...new Set(after)];
    return { id: `n${index}`, duration: Math.floor(random() * 300), after: known };
  });
  return activities
    .map((activity) => ({ activity, key: random() }))
    .sort((a, b) => a.key - b.key)
    .map(({ activity }) => activity);
}

function longestPaths(activities: readonly Activity[], order: readonly string[]): Map<string, number> {
  const byId = new Map(activities.map((activity) => [activity.id, activity]));
  const finish = new Map<string, number>();
  for (const id of order) {
    const activity = byId.get(id);
    const start = Math.max(0, ...(activity?.after ?? []).map((before) => finish.get(before) ?? Number.NaN));
    finish.set(id, start + (activity?.duration ?? Number.NaN));
  }
  return finish;
}

function expectEarliest(activities: readonly Activity[], finish: ReadonlyMap<string, number>): void {
  for (const times of schedule(activities).activities)
    expect(times.earliestFinish).toBe(finish.get(times.id));
}
