/** A value and how often it stands. */
export interface Weighted {
  value: number;
  weight: number;
}

/**
 * Median of values that stand several times each: the middle one of all, or the mean of the two in the middle. Null
 * of nothing. `[{ value: 10, weight: 1 }, { value: 20, weight: 2 }]` gives 20.
 */
export function weightedMedian(values: readonly Weighted[]): number | null {
  const sorted = values.filter(({ weight }) => weight > 0).sort((one, other) => one.value - other.value);
  const total = sorted.reduce((sum, { weight }) => sum + weight, 0);
  if (total === 0) return null;
  const at = (place: number): number => {
    let reached = 0;
    const found = sorted.find(({ weight }) => (reached += weight) > place);
    return found?.value ?? 0;
  };
  return (at(Math.floor((total - 1) / 2)) + at(Math.floor(total / 2))) / 2;
}
