/** A moment in time: milliseconds since 1970-01-01T00:00Z. The only form of time inside `shared` and in tables. */
export type Instant = number;

/** A calendar day `YYYY-MM-DD`; for service days the zone stands beside it. */
export type CalendarDate = string;

/** 1000 milliseconds make a second. */
export const millisecondsInSecond = 1000;
/** 60 × 1000 milliseconds. */
export const millisecondsInMinute = 60 * millisecondsInSecond;
/** 60 × 60 × 1000 milliseconds. */
export const millisecondsInHour = 60 * millisecondsInMinute;

/** The instant `seconds` later (earlier when negative). */
export function addSeconds(instant: Instant, seconds: number): Instant {
  return instant + seconds * millisecondsInSecond;
}

/** Seconds from `from` to `to`, negative when `to` is earlier; fractions are kept. */
export function secondsBetween(from: Instant, to: Instant): number {
  return (to - from) / millisecondsInSecond;
}

/** ISO 8601 in UTC with `Z` and milliseconds: `2026-03-03T22:20:45.000Z`. */
export function formatInstant(instant: Instant): string {
  return new Date(instant).toISOString();
}

const isoInstant = /^(\d{4}-\d{2}-\d{2})T\d{2}:\d{2}(:\d{2}(\.\d{1,9})?)?(Z|[+-]\d{2}:\d{2})$/;

/** Reads ISO 8601 with a zone (`Z` or an offset); anything else, also a date that does not exist, is null. */
export function parseInstant(text: string): Instant | null {
  const date = isoInstant.exec(text)?.[1];
  if (date === undefined || !isDay(date)) return null;
  const instant = Date.parse(text);
  return Number.isNaN(instant) ? null : instant;
}

/** Whether a day exists: the engine takes 30 February for 2 March. */
function isDay(date: CalendarDate): boolean {
  const midnight = Date.parse(`${date}T00:00:00Z`);
  return !Number.isNaN(midnight) && formatInstant(midnight).startsWith(date);
}
