import { inLanes } from './lanes.mjs';
import { sumCounts } from './report.mjs';
import { formatDuration, say } from './say.mjs';

const describe = ({ passed, failed, skipped }) =>
  [`${passed} ok`, failed > 0 && `${failed} FAILED`, skipped > 0 && `${skipped} left out`]
    .filter(Boolean)
    .join(', ');

async function attempt(task) {
  try {
    return await task.run();
  } catch (error) {
    return { counts: { passed: 0, failed: 1, skipped: 0 }, output: error.stack, reason: 'could not be run' };
  }
}

async function performTask(task) {
  const began = performance.now();
  const { counts, output, reason } = await attempt(task);
  const took = formatDuration(performance.now() - began);
  if (counts.failed > 0)
    say(`\n----- ${task.name}: output -----\n${output.trimEnd()}\n----- ${task.name}: end -----\n`);
  say(`${task.name.padEnd(28)} ${took.padStart(10)}   ${describe(counts)}${reason ? ` - ${reason}` : ''}`);
  return { name: task.name, counts };
}

/**
 * Does the tasks, two at a time, and prints a line for each as it ends - with all its output where it failed, in one
 * piece. Answers the counts of all together.
 */
export async function perform(tasks) {
  const results = await inLanes(tasks, performTask);
  const failed = results.filter(({ counts }) => counts.failed > 0).map(({ name }) => name);
  if (failed.length > 0) say(`\nFailed: ${failed.join(', ')}`);
  return sumCounts(results.map(({ counts }) => counts));
}
