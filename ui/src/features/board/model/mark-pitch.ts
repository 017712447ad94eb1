/** Least distance between the middles of two marks in one half of the bar, in pixels: the width of a mark. */
export const markPitch = 14;

/**
 * Places of the marks in one half of the bar. A mark stands at its time; where it would cover the mark before it, it
 * is moved to the right until the two touch. Takes and gives pixels in rising order of time.
 */
export function spacedMarks(wanted: readonly number[], pitch = markPitch): number[] {
  let free = -Infinity;
  return wanted.map((place) => {
    const set = Math.max(place, free);
    free = set + pitch;
    return set;
  });
}

/** What fits into the outline of the plan lane, by its width in pixels. */
export interface PlanText {
  inbound: boolean;
  outbound: boolean;
  time: boolean;
}

/** Both train numbers and the time need this much. */
const widthForAll = 122;
/** Below this the time goes too, and below the next everything. */
const widthForTime = 88;
const widthForTrain = 46;

/** The outbound number is the last thing to go, because that is what people call the turn. */
export function planText(widthPixels: number): PlanText {
  return {
    inbound: widthPixels >= widthForAll,
    time: widthPixels >= widthForTime,
    outbound: widthPixels >= widthForTrain,
  };
}
