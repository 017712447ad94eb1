import { millisecondsInMinute, type Instant } from '@stubpost/shared';
import type { Stretch } from '../../../lib/turn/turn-times';

/** Lengths offered as buttons, in minutes; `day` is the whole service day. */
export const SPANS = [60, 120, 240, 480, 'day'] as const;
export type Span = number | 'day';

/** The stretch of time that is shown. */
export type TimeWindow = Stretch;

/** What the person chose: how long, and where it starts (of a day: any moment in it); a null start follows now. */
export interface WindowChoice {
  span: Span;
  startAt: Instant | null;
}

/** A sixth of the picture lies before now: 20 of 120 minutes. */
const shareBeforeNow = 1 / 6;
/** From this length on, step marks give way to a summary of four cells. */
export const summaryFromMinutes = 480;
const shortestMinutes = 30;
const longestMinutes = 36 * 60;

const minutes = (count: number): number => count * millisecondsInMinute;

/** The stretch to show at `now`. `day` bounds the service day's turns and is used as it is. */
export function windowAt(choice: WindowChoice, now: Instant, day: TimeWindow): TimeWindow {
  if (choice.span === 'day') return day;
  const length = minutes(choice.span);
  const from = choice.startAt ?? now - length * shareBeforeNow;
  return { from, to: from + length };
}

/**
 * The choice after pressing Earlier (−1) or Later (+1): half a picture on, at whole minutes, no longer following now;
 * from one day to the next.
 */
export function movedChoice(choice: WindowChoice, shown: TimeWindow, direction: -1 | 1): WindowChoice {
  if (choice.span === 'day') return { span: 'day', startAt: middle(shown) + direction * minutes(24 * 60) };
  const step = minutes(choice.span) / 2;
  return { span: choice.span, startAt: wholeMinute(shown.from + direction * step) };
}

/** The choice after picking another length: a picture that follows now goes on doing so, any other keeps its middle. */
export function resizedChoice(choice: WindowChoice, shown: TimeWindow, span: Span): WindowChoice {
  if (choice.startAt === null) return { span, startAt: null };
  const startAt = span === 'day' ? middle(shown) : middle(shown) - minutes(span) / 2;
  return { span, startAt: wholeMinute(startAt) };
}

/** The next shorter (−1) or longer (+1) of the offered lengths. */
export function neighbourSpan(span: Span, direction: -1 | 1): Span {
  const size = (one: Span): number => (one === 'day' ? Infinity : one);
  const ordered: readonly Span[] = direction === 1 ? SPANS : [...SPANS].reverse();
  return ordered.find((one) => (size(one) - size(span)) * direction > 0) ?? span;
}

/** The choice after the picture itself was dragged or zoomed. */
export function draggedChoice(window: TimeWindow): WindowChoice {
  const length = Math.round((window.to - window.from) / minutes(1));
  const span = Math.min(longestMinutes, Math.max(shortestMinutes, length));
  return { span, startAt: wholeMinute(window.from) };
}

/** Whether two stretches share any time. */
export function overlaps(a: TimeWindow, b: TimeWindow): boolean {
  return a.from < b.to && b.from < a.to;
}

const middle = (window: TimeWindow): Instant => (window.from + window.to) / 2;

function wholeMinute(instant: Instant): Instant {
  return Math.round(instant / minutes(1)) * minutes(1);
}
