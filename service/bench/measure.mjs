/** Middle value; of an even number the mean of the two in the middle. */
export function median(values) {
  const sorted = [...values].sort((a, b) => a - b);
  const middle = Math.floor(sorted.length / 2);
  return sorted.length % 2 === 1 ? sorted[middle] : (sorted[middle - 1] + sorted[middle]) / 2;
}

/**
 * Runs each variant once a round, in turn, for so many rounds, and gives back the median of each: a machine whose
 * speed drifts then slows all of them alike.
 */
export async function interleave(variants, rounds) {
  const results = new Map(variants.map(({ name }) => [name, []]));
  for (let round = 0; round < rounds; round += 1) {
    for (const { name, run } of variants) results.get(name).push(await run());
  }
  return new Map([...results].map(([name, values]) => [name, median(values)]));
}

const report = [];

/** Notes one goal: a ratio or a share, which way is better, and what was asked for. */
export function goal({ id, what, value, atLeast, atMost, digits = 2 }) {
  const met = atLeast === undefined ? value <= atMost : value >= atLeast;
  report.push({
    id,
    what,
    value: value.toFixed(digits),
    goal: atLeast === undefined ? `<= ${atMost}` : `>= ${atLeast}`,
    met,
  });
}

/** Notes a figure that has no goal of its own. */
export function note(text) {
  process.stdout.write(`  ${text}\n`);
}

/** Prints all goals and answers whether every one is met. */
export function printGoals() {
  process.stdout.write('\n');
  for (const { id, what, value, goal: asked, met } of report)
    process.stdout.write(
      `${met ? 'meets ' : 'MISSES'} ${id.padEnd(4)} ${value.padStart(9)} (${asked})  ${what}\n`,
    );
  return report.every(({ met }) => met);
}
