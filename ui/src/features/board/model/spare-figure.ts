import { millisecondsInMinute, millisecondsInSecond } from '@stubpost/shared';

const secondsInMinute = millisecondsInMinute / millisecondsInSecond;

/** Real minus sign, as wide as the plus, so that a column of figures stays in line. */
const minus = '−';

/** Whole minutes of slack, rounded down: 230 s are 3, −10 s are −1. Never flatters. */
export function spareMinutes(slackSeconds: number): number {
  return Math.floor(slackSeconds / secondsInMinute);
}

/** The figure on the board: `+3`, `−1`. */
export function spareFigure(slackSeconds: number): string {
  const minutes = spareMinutes(slackSeconds);
  return minutes < 0 ? `${minus}${-minutes}` : `+${minutes}`;
}

/** Words for a count with its noun: "1 minute", "3 minutes". */
export function counted(count: number, one: string, many = `${one}s`): string {
  return `${count} ${count === 1 ? one : many}`;
}

/** The figure as it is read out: "3 minutes to spare", "short by 1 minute". */
export function spareWords(slackSeconds: number): string {
  const minutes = spareMinutes(slackSeconds);
  if (minutes < 0) return `short by ${counted(-minutes, 'minute')}`;
  return `${counted(minutes, 'minute')} to spare`;
}
