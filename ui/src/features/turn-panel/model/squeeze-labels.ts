/** Places of things of one width in rising order: each where it is wanted, or right of the one before it. */
export function labelPlaces(wanted: readonly number[], width: number): number[] {
  let free = -Infinity;
  return wanted.map((place) => {
    const set = Math.max(place, free);
    free = set + width;
    return set;
  });
}

/** The same from the right: each where it is wanted, or left of the one after it. */
export function labelPlacesBackward(wanted: readonly number[], width: number): number[] {
  const mirrored = [...wanted].reverse().map((place) => -place);
  return labelPlaces(mirrored, width)
    .map((place) => -place)
    .reverse();
}
