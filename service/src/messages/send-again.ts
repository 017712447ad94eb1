/** Seconds until the next try after the first, the second … failure; then always the last. Our choice. */
const pausesSeconds = [5, 15, 30, 60, 120, 300];

/** A message that has found no way out for so long is given up: it would tell of something long over. Our choice. */
export const giveUpAfterSeconds = 24 * 60 * 60;

/** Seconds to wait after so many failed tries. `pauseAfter(1)` is 5, `pauseAfter(20)` is 300. */
export function pauseAfter(tries: number): number {
  return pausesSeconds[Math.min(tries, pausesSeconds.length) - 1] ?? 0;
}
