import { formatInstant, millisecondsInHour, type CalendarDate, type Instant } from '@stubpost/shared';
import { dateAt, wallTime } from '../../../lib/time-display';
import { instantOfWallTime } from '../../../lib/time-entry';
import type { TurnNow } from '../../../lib/turn/turn-now';
import type { TimeWindow } from './time-window';
import { plannedStretch } from '../../../lib/turn/turn-times';

/** Trains of a service day may run after midnight: until this hour a clock reading belongs to the day before. Our choice. */
const firstHour = 3;
/** A turn begins on one date and may end on the next: so far back turns of the day before are looked for. */
const reachBack = 5 * millisecondsInHour;

/** The service date that a moment belongs to: until 03:00 the day before. */
export function serviceDateAt(instant: Instant, zone: string): CalendarDate {
  const wall = wallTime(instant, zone);
  return wall.hour < firstHour ? dayBefore(wall.date) : wall.date;
}

function dayBefore(date: CalendarDate): CalendarDate {
  return formatInstant(Date.parse(`${date}T12:00:00Z`) - 24 * millisecondsInHour).slice(0, 10);
}

/** The service dates whose turns can reach into a window, in order. */
export function serviceDatesOf(window: TimeWindow, zone: string): CalendarDate[] {
  const dates: CalendarDate[] = [];
  const last = dateAt(window.to - 1, zone);
  for (let at = window.from - reachBack; ; at += 12 * millisecondsInHour) {
    const date = dateAt(Math.min(at, window.to - 1), zone);
    if (dates.at(-1) !== date) dates.push(date);
    if (date >= last) return dates;
  }
}

/** From the hour of the first turn of a service date to the hour after the last; without turns its daytime. */
export function dayBounds(turns: readonly TurnNow[], date: CalendarDate, zone: string): TimeWindow {
  const stretches = turns.filter((turn) => turn.serviceDate === date).map(plannedStretch);
  if (stretches.length === 0) {
    const start = instantOfWallTime(date, 5 * 3600, zone);
    return { from: start, to: start + 20 * millisecondsInHour };
  }
  const from = Math.min(...stretches.map((stretch) => stretch.from));
  const to = Math.max(...stretches.map((stretch) => stretch.to));
  return {
    from: Math.floor(from / millisecondsInHour) * millisecondsInHour,
    to: Math.ceil(to / millisecondsInHour) * millisecondsInHour,
  };
}
