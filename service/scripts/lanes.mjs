/**
 * Does the tasks in their order, at most `width` at a time; a task marked `alone` waits until all others are done and
 * has the machine for itself. `work` never rejects. Answers the results in the order of the tasks.
 */
export async function inLanes(tasks, work, width = 2) {
  const results = new Map();
  const waiting = tasks.filter((task) => !task.alone);
  async function lane() {
    for (let task = waiting.shift(); task !== undefined; task = waiting.shift())
      results.set(task, await work(task));
  }
  await Promise.all(Array.from({ length: width }, lane));
  for (const task of tasks.filter((each) => each.alone)) results.set(task, await work(task));
  return tasks.map((task) => results.get(task));
}
