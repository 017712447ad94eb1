import type { Instant } from '@stubpost/shared';
import type { TimelineOptions } from 'vis-timeline/esnext';
import { axisLabel, axisStep, isFullHour, isUnderClock } from '../model/axis-labels';
import { zoneMoment } from './zone-moment';

/** What the labels of the axis depend on; kept up to date from outside, read whenever a label is drawn. */
export interface AxisState {
  zone: string;
  now: Instant;
  pixelsPerMinute: number;
}

/**
 * The library stays hidden until its range has changed once after the start. So it starts with a range that is a second
 * too long, and shows itself with the first window it is given, also when that window then stands still.
 */
const firstChange = 1000;
const halfHour = 30 * 60_000;
const longest = 36 * 3_600_000;

/** How the library is set up: fixed lanes, nothing selectable, our own labels, HTML cleaned by its own filter. */
export function timelineOptions(axis: AxisState, range: { start: Instant; end: Instant }): TimelineOptions {
  return {
    start: range.start,
    end: range.end + firstChange,
    stack: false,
    stackSubgroups: false,
    groupHeightMode: 'fixed',
    groupOrder: 'order',
    margin: { axis: 0, item: { horizontal: 0, vertical: 0 } },
    orientation: { axis: 'top', item: 'top' },
    showMajorLabels: false,
    showCurrentTime: true,
    selectable: false,
    zoomKey: 'ctrlKey',
    zoomMin: halfHour,
    zoomMax: longest,
    horizontalScroll: false,
    verticalScroll: false,
    timeAxis: axisStep(axis.pixelsPerMinute),
    moment: zoneMoment(axis.zone),
    format: { minorLabels: (date: Date) => label(date.valueOf(), axis) },
  };
}

/** Bold at the full hour; none where the clock of the now line stands. */
function label(instant: Instant, { zone, now, pixelsPerMinute }: AxisState): string {
  if (isUnderClock(instant, now, pixelsPerMinute)) return '';
  const text = axisLabel(instant, zone);
  return isFullHour(instant, zone) ? `<b>${text}</b>` : text;
}
