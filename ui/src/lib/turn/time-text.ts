import type { Instant } from '@stubpost/shared';
import { formatClock, formatTime } from '../time-display';

const most = 5000;

function kept(write: (instant: Instant, zone: string) => string): (instant: Instant, zone: string) => string {
  const texts = new Map<string, string>();
  return (instant, zone) => {
    const key = `${zone} ${instant}`;
    const known = texts.get(key);
    if (known !== undefined) return known;
    if (texts.size > most) texts.clear();
    const made = write(instant, zone);
    texts.set(key, made);
    return made;
  };
}

/** "17:34" in the terminal's zone. Kept, because a board writes the same hundreds of times every second. */
export const timeText = kept(formatTime);

/** "17:20:45" in the terminal's zone. */
export const clockText = kept(formatClock);
