import { millisecondsInSecond } from '@stubpost/shared';

/** A phone's clock is spoken of when it is wrong by more than this. Our choice. */
export const notedOffsetSeconds = 2;

/**
 * How far the phone's clock is off, for people; null while it is near enough. Given is by how many milliseconds the
 * server's clock is ahead. `clockWords(2400)` is `'2.4 s slow'`, `clockWords(-90000)` is `'90 s fast'`.
 */
export function clockWords(serverAheadMilliseconds: number): string | null {
  const seconds = Math.abs(serverAheadMilliseconds) / millisecondsInSecond;
  if (seconds <= notedOffsetSeconds) return null;
  const figure = seconds < 10 ? seconds.toFixed(1) : Math.round(seconds).toLocaleString('en-US');
  return `${figure} s ${serverAheadMilliseconds > 0 ? 'slow' : 'fast'}`;
}
