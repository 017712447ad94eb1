import { printGoals } from './measure.mjs';

// Speed as ratios within one run, medians of interleaved rounds. `npm run bench -- board` runs one part,
// `--rounds 3` is quicker and rougher.
const parts = {
  forecast: async () => (await import('./forecast.mjs')).benchForecast,
  entry: async () => (await import('./entry.mjs')).benchEntry,
  board: async () => (await import('./board.mjs')).benchBoard,
  timeline: async () => (await import('./timeline.mjs')).benchTimeline,
};
const words = process.argv.slice(2);
const at = words.indexOf('--rounds');
const rounds = at < 0 ? 5 : Number(words[at + 1]);
const asked = words.filter((word, index) => word in parts && index !== at + 1);
if (!Number.isInteger(rounds) || rounds < 1) throw new Error('--rounds takes a whole number from 1');

for (const name of asked.length > 0 ? asked : Object.keys(parts)) {
  process.stdout.write(`\n${name}\n`);
  const bench = await parts[name]();
  await bench({ rounds });
}
process.exitCode = printGoals() ? 0 : 1;
process.exit();
