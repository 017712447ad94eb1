import moment from 'moment-timezone/moment-timezone';

/** Packed clock rules of the zones we ship, cut out of the full file when the page is built. */
declare const __ZONES__: string[];

moment.tz.add(__ZONES__);

/** Whether the clock rules of a zone travel with the picture. */
export function isShippedZone(zone: string): boolean {
  return moment.tz.zone(zone) !== null;
}

/**
 * Moments on the terminal's clock, as the timeline asks for them. A zone we do not ship is drawn on a grid of UTC; the
 * labels are right either way, because they are made from the browser's own rules.
 */
export function zoneMoment(zone: string): (date?: moment.MomentInput) => moment.Moment {
  const known = isShippedZone(zone) ? zone : 'UTC';
  return (date) => moment.tz(date, known);
}
