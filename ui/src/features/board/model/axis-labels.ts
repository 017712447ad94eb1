import { millisecondsInHour, millisecondsInMinute, type Instant } from '@stubpost/shared';
import { formatZoneLetters, wallTime } from '../../../lib/time-display';

/** How far the labels of the axis stand apart, as the timeline library wants it said. */
export interface AxisStep {
  scale: 'minute' | 'hour';
  step: number;
}

/** Least distance between two labels in pixels: five figures with air on both sides. */
const leastPixels = 64;
const steps: AxisStep[] = [
  { scale: 'minute', step: 5 },
  { scale: 'minute', step: 10 },
  { scale: 'minute', step: 20 },
  { scale: 'minute', step: 30 },
  { scale: 'hour', step: 1 },
  { scale: 'hour', step: 2 },
  { scale: 'hour', step: 3 },
];

const minutesOf = ({ scale, step }: AxisStep): number => (scale === 'hour' ? step * 60 : step);

/** The narrowest step whose labels do not crowd. */
export function axisStep(pixelsPerMinute: number): AxisStep {
  return steps.find((step) => minutesOf(step) * pixelsPerMinute >= leastPixels) ?? { scale: 'hour', step: 6 };
}

const two = (value: number): string => String(value).padStart(2, '0');

/** Whether the zone changes its clocks within a day of the moment: only then must times carry the zone's letters. */
export function clocksChangeNear(instant: Instant, zone: string): boolean {
  const halfDay = 12 * millisecondsInHour;
  return formatZoneLetters(instant - halfDay, zone) !== formatZoneLetters(instant + halfDay, zone);
}

/**
 * The label at a moment of the axis: "17:30"; in the night of a clock change "01:30 EDT", because one hour comes twice.
 */
export function axisLabel(instant: Instant, zone: string): string {
  const wall = wallTime(instant, zone);
  const text = `${two(wall.hour)}:${two(wall.minute)}`;
  return clocksChangeNear(instant, zone) ? `${text} ${formatZoneLetters(instant, zone)}` : text;
}

/** Whether a label stands at a full hour and is set in bold. */
export function isFullHour(instant: Instant, zone: string): boolean {
  return wallTime(instant, zone).minute === 0;
}

/** Width of the clock on the now line and of the label right of its tick, in pixels. */
const clockHalfWidth = 36;
const labelWidth = 44;

/** Whether the clock on the now line would cover a label, which begins at its tick and runs to the right. */
export function isUnderClock(instant: Instant, now: Instant, pixelsPerMinute: number): boolean {
  const pixels = ((instant - now) / millisecondsInMinute) * pixelsPerMinute;
  return pixels > -clockHalfWidth - labelWidth && pixels < clockHalfWidth;
}
