/**
 * Quantile of a sample, type 7 of Hyndman and Fan (The American Statistician 50, 1996): with h = (n − 1)·p, linear
 * between the two order statistics round h. Unit of the values; null for an empty sample. `probability` is 0 to 1.
 *
 * `quantile([1, 2, 3, 4, 5, 6, 7, 8, 9, 10], 0.25)` is 3.25.
 */
export function quantile(values: readonly number[], probability: number): number | null {
  return quantileOfSorted(
    [...values].sort((a, b) => a - b),
    probability,
  );
}

/** The same for values that are already in rising order, for asking several quantiles of one sample. */
export function quantileOfSorted(sorted: readonly number[], probability: number): number | null {
  const position = (sorted.length - 1) * Math.min(1, Math.max(0, probability));
  const below = sorted[Math.floor(position)];
  const above = sorted[Math.ceil(position)];
  if (below === undefined || above === undefined) return null;
  return below + (position - Math.floor(position)) * (above - below);
}
