import assert from 'node:assert/strict';
import { test } from 'node:test';
import { inLanes } from './lanes.mjs';

/** A worker that notes how many tasks were under way when each began; a task lasts as many turns as it says. */
function notingWorker() {
  const begun = [];
  let underWay = 0;
  async function work(task) {
    underWay += 1;
    begun.push({ name: task.name, underWay });
    for (let turn = 0; turn < task.turns; turn += 1) await null;
    underWay -= 1;
    return task.name;
  }
  return { begun, work };
}

const task = (name, turns, more = {}) => ({ name, turns, ...more });

test('two tasks are under way at most, and the results come in the order of the tasks', async () => {
  const { begun, work } = notingWorker();
  const results = await inLanes([task('a', 9), task('b', 1), task('c', 1), task('d', 5)], work);
  assert.deepEqual(results, ['a', 'b', 'c', 'd']);
  assert.deepEqual(
    begun.map(({ name }) => name),
    ['a', 'b', 'c', 'd'],
  );
  assert.equal(Math.max(...begun.map(({ underWay }) => underWay)), 2);
});

test('a task that wants to be alone comes last and is alone', async () => {
  const { begun, work } = notingWorker();
  await inLanes([task('quiet', 3, { alone: true }), task('a', 5), task('b', 2)], work);
  assert.deepEqual(begun.at(-1), { name: 'quiet', underWay: 1 });
});
