/**
 * Arithmetic mean; null for an empty sample. The mean of the remainders is added back, so that a small spread on a
 * large value keeps its digits (NIST's NumAcc sets are made to catch sums that do not).
 */
export function mean(values: readonly number[]): number | null {
  const first = values[0];
  if (first === undefined) return null;
  const rough = values.reduce((sum, value) => sum + (value - first), 0) / values.length + first;
  return rough + values.reduce((sum, value) => sum + (value - rough), 0) / values.length;
}

/** Standard deviation of a sample (divisor n − 1), in two passes; null below two values. */
export function standardDeviation(values: readonly number[]): number | null {
  const centre = mean(values);
  if (centre === null || values.length < 2) return null;
  const squares = values.reduce((sum, value) => sum + (value - centre) ** 2, 0);
  return Math.sqrt(squares / (values.length - 1));
}
