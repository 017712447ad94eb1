import type { Instant } from '../lib/instant';

/** Length of the periods in which the load of a desk is counted, in seconds. Source: EEMUA 191 and ISA-18.2, as quoted. */
export const loadPeriodSeconds = 600;

/** When so many alerts come that nobody can follow them, in alerts per 10 minutes. */
export interface BurstRule {
  /** A burst begins with a period of more alerts than this. */
  startsAbove: number;
  /** It ends before the first period with fewer than this. */
  endsBelow: number;
}

/** Starts above 10 in 10 minutes, ends below 5. Source: EEMUA 191 and ISA-18.2, second-hand: as others quote them. */
export const publishedBurstRule: BurstRule = { startsAbove: 10, endsBelow: 5 };

/** A burst by its periods: the first one in it, and the first one after it. */
export interface Burst {
  firstPeriod: number;
  endPeriod: number;
  /** Alerts in it. */
  alerts: number;
  /** Whether it was still going on at the end of what was counted. */
  isOpen: boolean;
}

/** A half-open range of instants. */
export interface InstantRange {
  from: Instant;
  to: Instant;
}

const periodMilliseconds = loadPeriodSeconds * 1000;

/** How many periods of 10 minutes cover a range; the last one may be cut short. */
export function periodCount({ from, to }: InstantRange): number {
  return Math.max(0, Math.ceil((to - from) / periodMilliseconds));
}

/** How many of the instants fall into each period of 10 minutes of a range; those outside are left out. */
export function countByPeriod(instants: readonly Instant[], range: InstantRange): number[] {
  const counts = new Array<number>(periodCount(range)).fill(0);
  for (const instant of instants) {
    if (instant < range.from || instant >= range.to) continue;
    const period = Math.floor((instant - range.from) / periodMilliseconds);
    counts[period] = (counts[period] ?? 0) + 1;
  }
  return counts;
}

/** How many of the spans (half-open) touch each period of 10 minutes of a range. Empty spans touch none. */
export function spansByPeriod(spans: readonly InstantRange[], range: InstantRange): number[] {
  const changes = new Array<number>(periodCount(range) + 1).fill(0);
  for (const span of spans) {
    const from = Math.max(span.from, range.from);
    const to = Math.min(span.to, range.to);
    if (to <= from) continue;
    const first = Math.floor((from - range.from) / periodMilliseconds);
    const end = Math.ceil((to - range.from) / periodMilliseconds);
    changes[first] = (changes[first] ?? 0) + 1;
    changes[end] = (changes[end] ?? 0) - 1;
  }
  let standing = 0;
  return changes.slice(0, -1).map((change) => (standing += change));
}

/**
 * The bursts in counts per 10 minutes, in their order. Between the two limits a burst goes on, but none begins.
 *
 * `findBursts([11, 6, 2])` is one burst over the first two periods; `findBursts([10, 10, 10])` is none.
 */
export function findBursts(counts: readonly number[], rule: BurstRule = publishedBurstRule): Burst[] {
  const bursts: Burst[] = [];
  let open: Burst | null = null;
  counts.forEach((count, period) => {
    if (open === null && count > rule.startsAbove) {
      open = { firstPeriod: period, endPeriod: period, alerts: 0, isOpen: true };
      bursts.push(open);
    }
    if (open === null) return;
    open.endPeriod = period;
    if (count < rule.endsBelow) {
      open.isOpen = false;
      open = null;
    } else open.alerts += count;
  });
  for (const burst of bursts) if (burst.isOpen) burst.endPeriod = counts.length;
  return bursts;
}
