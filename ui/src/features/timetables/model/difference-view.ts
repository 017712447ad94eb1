import type { CalendarDate, WireTimetableDifference } from '@stubpost/shared';
import { formatServiceDate } from '../../../lib/time-display';

type DifferenceTurn = WireTimetableDifference['turns'][number];

/** Counts of one date over all terminals. */
export interface DateCounts {
  serviceDate: CalendarDate;
  againstDate: CalendarDate | null;
  same: number;
  moved: number;
  added: number;
  removed: number;
}

/** Adds the terminals of each date up. */
export function countsByDate(difference: WireTimetableDifference): DateCounts[] {
  const counts = new Map<CalendarDate, DateCounts>();
  for (const { serviceDate, againstDate, same, moved, added, removed } of difference.dates) {
    const known = counts.get(serviceDate) ?? {
      serviceDate,
      againstDate,
      same: 0,
      moved: 0,
      added: 0,
      removed: 0,
    };
    counts.set(serviceDate, {
      ...known,
      same: known.same + same,
      moved: known.moved + moved,
      added: known.added + added,
      removed: known.removed + removed,
    });
  }
  return [...counts.values()];
}

/** How many turns of a date are not as they were. */
export function changedTurns({ moved, added, removed }: DateCounts): number {
  return moved + added + removed;
}

/** The date to show first: the one with the most changes, the earliest of several. */
export function dateToShow(counts: readonly DateCounts[]): DateCounts | undefined {
  return counts.reduce<DateCounts | undefined>(
    (most, each) => (most === undefined || changedTurns(each) > changedTurns(most) ? each : most),
    undefined,
  );
}

/** The most a week differs, in words: "54 turns differ, Tue 10 Mar". Empty while nothing can be said. */
export function differenceWords(difference: WireTimetableDifference | undefined): string {
  if (difference === undefined) return '';
  if (difference.against === null) return 'nothing to compare with';
  const most = dateToShow(countsByDate(difference));
  if (most === undefined || changedTurns(most) === 0) return 'none';
  return `${changedTurns(most)} turns differ, ${formatServiceDate(most.serviceDate)}`;
}

/** A moved turn with the minutes it had and has. */
export interface LayoverChange {
  turn: DifferenceTurn;
  beforeSeconds: number;
  afterSeconds: number;
}

/** The moved turns of a date that lose most of their layover, the greatest loss first. */
export function greatestLosses(turns: readonly DifferenceTurn[], most: number): LayoverChange[] {
  return turns
    .flatMap((turn) =>
      turn.before === null || turn.after === null
        ? []
        : [{ turn, beforeSeconds: turn.before.layoverSeconds, afterSeconds: turn.after.layoverSeconds }],
    )
    .filter(({ beforeSeconds, afterSeconds }) => afterSeconds < beforeSeconds)
    .sort((one, other) => other.beforeSeconds - other.afterSeconds - (one.beforeSeconds - one.afterSeconds))
    .slice(0, most);
}

/** Whole minutes for the axis of a picture: from below the smallest to above the largest value. */
export function axisMinutes(changes: readonly LayoverChange[], markSeconds: number): number[] {
  const seconds = [
    markSeconds,
    ...changes.flatMap(({ beforeSeconds, afterSeconds }) => [beforeSeconds, afterSeconds]),
  ];
  const from = Math.floor(Math.min(...seconds) / 60 / 4) * 4;
  const to = Math.ceil(Math.max(...seconds) / 60 / 4) * 4;
  const step = Math.max(4, Math.ceil((to - from) / 7 / 4) * 4);
  const ticks: number[] = [];
  for (let minute = from; minute <= to; minute += step) ticks.push(minute);
  if ((ticks.at(-1) ?? 0) < to) ticks.push((ticks.at(-1) ?? 0) + step);
  return ticks;
}
