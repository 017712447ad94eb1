/** A list that stands still under the pointer, and how much has changed since it was last let go. */
export interface SteadyIds {
  ids: readonly string[];
  waiting: number;
}

/**
 * What to show while the list is held: what was shown, in the old order, so that nothing moves under a pointer or a
 * focus. Counts what came or went meanwhile; a mere change of order counts as one.
 */
export function heldIds(shown: readonly string[], wanted: readonly string[]): SteadyIds {
  const come = wanted.filter((id) => !shown.includes(id)).length;
  const gone = shown.filter((id) => !wanted.includes(id)).length;
  if (come + gone > 0) return { ids: shown, waiting: come + gone };
  return { ids: shown, waiting: wanted.every((id, index) => shown[index] === id) ? 0 : 1 };
}
