import { isCalendarDate, type CalendarDate } from '@stubpost/shared';

/** A service day as the date picker holds it: the same day on this computer's calendar. */
export function toPickerDate(day: CalendarDate): Date {
  const [year = 1970, month = 1, dayOfMonth = 1] = day.split('-').map(Number);
  return new Date(year, month - 1, dayOfMonth);
}

/** Back from the date picker. */
export function fromPickerDate(picked: Date): CalendarDate {
  const two = (value: number): string => String(value).padStart(2, '0');
  return `${String(picked.getFullYear()).padStart(4, '0')}-${two(picked.getMonth() + 1)}-${two(picked.getDate())}`;
}

/** Reads a day typed as 2026-03-09; false, as the picker wants it, when it is none. */
export function parsePickerDate(text: string): Date | false {
  const typed = text.trim();
  return isCalendarDate(typed) ? toPickerDate(typed) : false;
}
