/** One stroke of the rug: a minute of layover and how many turns stand so long. */
export interface RugStroke {
  x: number;
  height: number;
}

/** Minutes on the axis; longer layovers stand at its end. */
export const rugMinutes = 60;
export const rugWidth = 200;
/** Strokes grow with the count up to this height. */
export const rugHeight = 16;
const leastHeight = 4;

/** Strokes of a station: by minute, height by count, the highest of all stations full. */
export function rugStrokes(
  layovers: readonly { minutes: number; turns: number }[],
  mostTurns: number,
): RugStroke[] {
  const byMinute = new Map<number, number>();
  for (const { minutes, turns } of layovers) {
    const minute = Math.min(minutes, rugMinutes);
    byMinute.set(minute, (byMinute.get(minute) ?? 0) + turns);
  }
  return [...byMinute].map(([minute, turns]) => ({
    x: (minute / rugMinutes) * rugWidth,
    height: leastHeight + (rugHeight - leastHeight) * (mostTurns <= 1 ? 0 : (turns - 1) / (mostTurns - 1)),
  }));
}

/** The largest number of turns in one minute at any station. */
export function mostTurnsInAMinute(stations: readonly { layovers: readonly { turns: number }[] }[]): number {
  return Math.max(1, ...stations.flatMap(({ layovers }) => layovers.map(({ turns }) => turns)));
}

/** The same in words for reading out: "104 turns, 7 to 33 minutes". */
export function rugWords(layovers: readonly { minutes: number; turns: number }[]): string {
  const minutes = layovers.map((each) => each.minutes);
  const turns = layovers.reduce((sum, each) => sum + each.turns, 0);
  if (turns === 0) return 'no turns';
  const [from, to] = [Math.min(...minutes), Math.max(...minutes)];
  return `${turns} ${turns === 1 ? 'turn' : 'turns'}, ${from === to ? from : `${from} to ${to}`} minutes`;
}
