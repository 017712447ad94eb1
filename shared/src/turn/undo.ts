import type { Instant } from '../lib/instant';
import type { Entry } from './entry';

/** For so many seconds after an act the same bar takes it back. */
export const undoSeconds = 10;
/** What is allowed on top for a finger on its way and clocks that are not quite equal. Our choice. */
export const undoGraceSeconds = 5;

/**
 * Whether a withdrawal is the *Undo* of its target: by the same person, at most 10 s (and a grace of 5 s) after the
 * target was made. An entry by hand was made when it was observed; any other may tell of something earlier and was
 * made when it came in.
 */
export function isUndo(withdrawal: Entry, target: Entry | undefined): boolean {
  if (target === undefined || withdrawal.by === null) return false;
  if (withdrawal.by.personId !== target.by?.personId) return false;
  const longest = (undoSeconds + undoGraceSeconds) * 1000;
  return withdrawal.observedAt >= target.observedAt && withdrawal.observedAt - madeAtOf(target) <= longest;
}

function madeAtOf({ source, observedAt, receivedAt }: Entry): Instant {
  return source === 'by-hand' ? observedAt : Math.max(observedAt, receivedAt);
}
