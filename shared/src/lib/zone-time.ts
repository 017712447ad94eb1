import type { CalendarDate, Instant } from './instant';

/** Whether a clock time shows its seconds. */
export interface ClockFormat {
  seconds?: boolean;
}

const clocks = new Map<string, Intl.DateTimeFormat>();

function formatter(name: string, make: () => Intl.DateTimeFormat): Intl.DateTimeFormat {
  const known = clocks.get(name);
  if (known !== undefined) return known;
  const made = make();
  clocks.set(name, made);
  return made;
}

/**
 * Time of day on a 24-hour clock in an IANA zone, `17:24` or with seconds `17:24:05`. Cut, not rounded: 17:24:59.9 is
 * `17:24`. On the night the clocks go back the same text stands for two instants; `formatZoneLetters` tells them
 * apart. Throws a RangeError for a zone that does not exist.
 */
export function formatClock(instant: Instant, zone: string, { seconds = false }: ClockFormat = {}): string {
  const clock = formatter(`${zone} ${seconds ? 'seconds' : 'minutes'}`, () => {
    const hourAndMinute = { timeZone: zone, hourCycle: 'h23', hour: '2-digit', minute: '2-digit' } as const;
    return new Intl.DateTimeFormat(
      'en-US',
      seconds ? { ...hourAndMinute, second: '2-digit' } : hourAndMinute,
    );
  });
  return clock.format(instant);
}

/** Letters of a zone at an instant: `EST` or `EDT` for America/New_York; `GMT+1` where English has no letters. */
export function formatZoneLetters(instant: Instant, zone: string): string {
  const letters = formatter(
    `${zone} letters`,
    () => new Intl.DateTimeFormat('en-US', { timeZone: zone, timeZoneName: 'short' }),
  );
  return letters.formatToParts(instant).find((part) => part.type === 'timeZoneName')?.value ?? zone;
}

/** A calendar day in words without its year: `2026-03-03` is `Tue 3 Mar`. A text that is no date comes back as it is. */
export function formatServiceDate(date: CalendarDate): string {
  const noon = Date.parse(`${date}T12:00:00Z`);
  if (Number.isNaN(noon)) return date;
  const day = formatter(
    'service date',
    () =>
      new Intl.DateTimeFormat('en-GB', { timeZone: 'UTC', weekday: 'short', day: 'numeric', month: 'short' }),
  );
  const part = (type: string): string =>
    day.formatToParts(noon).find((each) => each.type === type)?.value ?? '';
  return `${part('weekday')} ${part('day')} ${part('month')}`;
}

/**
 * A length of time in words: `45 s`, `3 min`, `3 min 20 s`, `1 h 5 min`. Whole seconds, cut; from an hour on without
 * seconds; the sign is dropped, for the words around it say late or early.
 */
export function formatDuration(seconds: number): string {
  const whole = Math.floor(Math.abs(seconds));
  const hours = Math.floor(whole / 3600);
  const minutes = Math.floor(whole / 60) % 60;
  const rest = whole % 60;
  if (hours > 0) return minutes > 0 ? `${hours} h ${minutes} min` : `${hours} h`;
  if (minutes === 0) return `${rest} s`;
  return rest > 0 ? `${minutes} min ${rest} s` : `${minutes} min`;
}
