import { clockAt } from '../../../testing/wire-turn';
import { timelineOptions } from './timeline-options';

const range = { start: clockAt('17:06:40'), end: clockAt('19:06:40') };
const labels = (clock: string, pixelsPerMinute = 9.2) => {
  const axis = { zone: 'America/New_York', now: clockAt('17:26:40'), pixelsPerMinute };
  const { format } = timelineOptions(axis, range);
  const write = format?.minorLabels;
  return typeof write === 'function' ? write(new Date(clockAt(clock)), 'minute', 10) : undefined;
};

describe('the set-up of the picture', () => {
  it('starts a second too long, so that the first window changes its range and it shows itself', () => {
    const options = timelineOptions(
      { zone: 'America/New_York', now: range.start, pixelsPerMinute: 9.2 },
      range,
    );
    expect(options.end).toBe(range.end + 1000);
    expect(options.start).toBe(range.start);
  });

  it('relies on no stacking, selects nothing and leaves the filter for HTML on', () => {
    const options = timelineOptions(
      { zone: 'America/New_York', now: range.start, pixelsPerMinute: 9.2 },
      range,
    );
    expect(options).toMatchObject({
      stack: false,
      selectable: false,
      groupHeightMode: 'fixed',
      showMajorLabels: false,
    });
    expect(options.xss).toBeUndefined();
  });

  it('writes full hours bold and leaves out what the clock of the now line would cover', () => {
    expect([labels('18:00'), labels('17:40'), labels('17:30')]).toEqual(['<b>18:00</b>', '17:40', '']);
  });

  it('draws a zone whose rules are not shipped on a grid of UTC', () => {
    const { moment } = timelineOptions(
      { zone: 'Europe/Paris', now: range.start, pixelsPerMinute: 9.2 },
      range,
    );
    expect(moment?.(new Date(range.start)).utcOffset()).toBe(0);
    const shipped = timelineOptions(
      { zone: 'America/New_York', now: range.start, pixelsPerMinute: 9.2 },
      range,
    );
    expect(shipped.moment?.(new Date(range.start)).utcOffset()).toBe(-300);
  });
});
