import type { OnTimeFigures, OnTimeGroup } from '@stubpost/shared';

/** Below this many departures a share is drawn hollow and called few. Our choice. */
export const fewDepartures = 30;

/** A share of 0 to 1 in percent with one decimal: "91.7"; "–" when nothing was counted. */
export function formatPercent(share: number | null): string {
  return share === null ? '–' : (share * 100).toFixed(1);
}

/** A count with its thousands set apart: "3,762". */
export function formatCount(count: number): string {
  return count.toLocaleString('en-US');
}

/** "90.8 to 92.5 %", or what stands in its place. */
export function formatInterval(figures: Pick<OnTimeFigures, 'interval'>): string {
  return figures.interval === null
    ? 'no interval'
    : `${formatPercent(figures.interval.low)} to ${formatPercent(figures.interval.high)} %`;
}

/** Whether even the upper end of a group's interval lies below the share of all: then the group is worth a look. */
export function isClearlyBelow(group: OnTimeGroup, all: OnTimeFigures): boolean {
  return group.interval !== null && all.share !== null && group.interval.high < all.share;
}

/** What is not in the share, in words: "11 annulled, 3 without a record"; null when everything is. */
export function remarksOn(figures: Pick<OnTimeFigures, 'annulled' | 'noRecord'>): string | null {
  const parts = [
    figures.annulled > 0 && `${formatCount(figures.annulled)} annulled`,
    figures.noRecord > 0 && `${formatCount(figures.noRecord)} without a record of leaving`,
  ].filter((part) => part !== false);
  return parts.length === 0 ? null : parts.join(', ');
}

/** The limit as minutes and seconds: 59 is "0:59". */
export function formatLimit(seconds: number): string {
  return `${Math.floor(seconds / 60)}:${String(seconds % 60).padStart(2, '0')}`;
}

/** Reads "0:59", "5:59" or plain seconds; null when it is neither. */
export function parseLimit(text: string): number | null {
  const match = /^(?:(\d{1,4}):)?(\d{1,5})$/.exec(text.trim());
  if (match?.[2] === undefined) return null;
  const seconds = Number(match[2]);
  if (match[1] === undefined) return seconds <= 86_400 ? seconds : null;
  return seconds < 60 ? Number(match[1]) * 60 + seconds : null;
}
