/** A stage that did not succeed, said in words a person can act on. No stack belongs to it. */
export class Failure extends Error {
  constructor(message, { output = '' } = {}) {
    super(message);
    this.output = output;
  }
}

export function say(line) {
  process.stdout.write(`${line}\n`);
}

/** Seconds with one decimal, or minutes and seconds from two minutes on. */
export function formatDuration(milliseconds) {
  const seconds = milliseconds / 1000;
  if (seconds < 120) return `${seconds.toFixed(1)} s`;
  const whole = Math.round(seconds);
  return `${Math.floor(whole / 60)} min ${whole % 60} s`;
}

/** Announces a piece of work, does it, and says how long it took. */
export async function stage(title, work) {
  say(`${title} ...`);
  const began = performance.now();
  const result = await work();
  say(`${title}: done in ${formatDuration(performance.now() - began)}`);
  return result;
}

/** Prints a failure: the output of the tool first, then the sentence, so that the sentence is what stays in view. */
export function sayFailure(error) {
  if (error instanceof Failure) {
    if (error.output.trim() !== '') process.stderr.write(`${error.output.trimEnd()}\n`);
    process.stderr.write(`\n${error.message}\n`);
    return;
  }
  process.stderr.write(`${error instanceof Error ? error.stack : String(error)}\n`);
}
