import { millisecondsInSecond, undoSeconds, type Instant } from '@stubpost/shared';

/** How long Undo takes no touch at first, so that a double touch takes nothing back. Our choice. */
export const undoDeafSeconds = 1;
/** How long the bar takes no touch after its act changed by itself. Our choice. */
export const barDeafSeconds = 1;

/** How Undo stands at one moment: not yet listening, listening for so many more seconds, or gone. */
export type UndoState = { kind: 'deaf' | 'open'; secondsLeft: number } | { kind: 'gone' };

/** `recordedAt` is when the bar was released; at exactly ten seconds Undo is gone. */
export function undoState(recordedAt: Instant, now: Instant): UndoState {
  const passed = (now - recordedAt) / millisecondsInSecond;
  if (passed >= undoSeconds || passed < 0) return { kind: 'gone' };
  const secondsLeft = Math.ceil(undoSeconds - passed);
  return { kind: passed < undoDeafSeconds ? 'deaf' : 'open', secondsLeft };
}

/** What the bar showed, since when, and whether the change came from this phone's own touch. */
export interface BarMemory {
  key: string;
  changedAt: Instant;
  byItself: boolean;
}

/**
 * Whether a touch on the bar counts. It does not when the thumb came down on another act than the one now shown, nor
 * within the first second after the act changed by itself (radio, another phone).
 */
export function touchCounts(bar: BarMemory, touch: { downOn: string | null; releasedAt: Instant }): boolean {
  if (touch.downOn !== null && touch.downOn !== bar.key) return false;
  return !bar.byItself || touch.releasedAt - bar.changedAt >= barDeafSeconds * millisecondsInSecond;
}
