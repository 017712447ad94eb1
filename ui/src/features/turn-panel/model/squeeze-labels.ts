/** Places of things of one width in rising order: each where it is wanted, or right of the one before it. */
export function labelPlaces(wanted: readonly number[], width: number): number[] {
  let free = -Infinity;
  return wanted.map((place) => {
    const set = Math.max(place, free);
    free = set + width;
    return set;
  });
}
