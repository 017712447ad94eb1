import type { CountedShare, WireAlertQuality } from '@stubpost/shared';
import { formatDuration } from '../../../lib/time-display';

/** A share of 0 to 1 in percent with one decimal, "3.2 %"; "–" when nothing was counted. */
export function percent(share: number | null): string {
  return share === null ? '–' : `${(share * 100).toFixed(1)} %`;
}

/** A count with its thousands set apart. */
export function count(value: number): string {
  return value.toLocaleString('en-US');
}

/** A figure per 10 minutes with at most two decimals: "1", "0.25"; "–" for none. */
export function amount(value: number | null): string {
  return value === null ? '–' : String(Math.round(value * 100) / 100);
}

/** "9 of 14, interval 38.8 to 83.7 %"; what stands in its place when nothing was counted. */
export function countedWords({ count: some, counted, interval }: CountedShare): string {
  if (interval === null) return 'nothing to count';
  const [low, high] = [interval.low, interval.high].map((end) => (end * 100).toFixed(1));
  return `${count(some)} of ${count(counted)}, interval ${low} to ${high} %`;
}

/** Seconds of warning: "4 min 10 s", "1 min after the departure". */
export function warningWords(seconds: number | null): string {
  if (seconds === null) return '–';
  const words = formatDuration(seconds);
  return seconds < 0 ? `${words} after the departure` : words;
}

/** One or many: "1 alert", "3 alerts". */
export function plural(value: number, one: string, many = `${one}s`): string {
  return `${count(value)} ${value === 1 ? one : many}`;
}

/** What is in the figures, or left out of them, because it was entered afterwards; null when nothing was. */
export function afterwardsWords(
  quality: Pick<WireAlertQuality, 'afterwards' | 'unwatchedTurns' | 'unseenAlerts'>,
): string | null {
  const { afterwards, unwatchedTurns, unseenAlerts } = quality;
  if (unwatchedTurns === 0 && unseenAlerts === 0) return null;
  const turns = `${plural(unwatchedTurns, 'turn')} of these days ${unwatchedTurns === 1 ? 'was' : 'were'} entered only when over`;
  const alerts = `${plural(unseenAlerts, 'alert')} worked out from their entries`;
  return afterwards === 'left-out'
    ? `Left out: ${turns}, and ${alerts}. Nobody could have acted on them.`
    : `Counted here: ${turns}, and ${alerts}. Nobody could have acted on them, and they were looked for only when an entry came in, so the warning is shorter than at a desk that watches.`;
}
