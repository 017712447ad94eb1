import {
  type Duty,
  type DutyRoster,
  formatInstant,
  type Instant,
  longestShiftHours,
  type MessageChannel,
  type Priority,
  type UpdateDutyRosterRequest,
  whoIsTold,
  type WireDutyRoster,
  type WireDutyShift,
} from '@stubpost/shared';
import { instantOfWallTime, readTimeOfDay } from '../../../lib/time-entry';

/** A roster as it is being edited. */
export type RosterDraft = Pick<WireDutyRoster, 'shifts' | 'people' | 'steps'>;

/** What a person's time on duty is typed as. */
export interface ShiftDraft {
  personId: string;
  as: Duty;
  date: string;
  from: string;
  until: string;
  /** On how many days in a row. */
  days: string;
}

/** What the service is asked to keep. */
export function requestOf(draft: RosterDraft, version: number): UpdateDutyRosterRequest {
  const quietHours = draft.people.flatMap(({ id, quiet }) =>
    quiet === null ? [] : [{ personId: id, ...quiet }],
  );
  return { version, shifts: draft.shifts, steps: draft.steps, quietHours };
}

const clock = /^([01]\d|2[0-3]):[0-5]\d$/;

/** What is wrong with the quiet hours of a draft, or null. */
export function quietProblem({ people }: RosterDraft): string | null {
  const wrong = people.find(
    ({ quiet }) => quiet !== null && !(clock.test(quiet.from) && clock.test(quiet.until)),
  );
  return wrong === undefined ? null : `Quiet hours of ${wrong.name}: both times, such as 22:00 and 05:00.`;
}

const dayAfter = (date: string, days: number): string =>
  formatInstant(Date.parse(`${date}T12:00:00Z`) + days * 86_400_000).slice(0, 10);

/**
 * The shifts that a form describes, one a day; an end at or before the beginning is that of the next morning. A text
 * says what is wrong.
 */
export function shiftsOf(draft: ShiftDraft, zone: string): WireDutyShift[] | string {
  const [from, until, days] = [readTimeOfDay(draft.from), readTimeOfDay(draft.until), Number(draft.days)];
  if (draft.personId === '') return 'Choose a person.';
  if (Number.isNaN(Date.parse(`${draft.date}T12:00:00Z`))) return 'Day: choose a date.';
  if (from === null || until === null) return 'Times are typed as 06:00.';
  if (!Number.isInteger(days) || days < 1 || days > 31) return 'Days: a whole number from 1 to 31.';
  const end = until <= from ? until + 86_400 : until;
  if (end - from > longestShiftHours * 3600) return `At most ${longestShiftHours} h in one piece.`;
  return Array.from({ length: days }, (_, index) => {
    const date = dayAfter(draft.date, index);
    return {
      personId: draft.personId,
      as: draft.as,
      from: formatInstant(instantOfWallTime(date, from, zone)),
      until: formatInstant(instantOfWallTime(end >= 86_400 ? dayAfter(date, 1) : date, end % 86_400, zone)),
    };
  });
}

/** Shifts with others added, in the order of their beginning; the same one twice is one. */
export function withShifts(
  shifts: readonly WireDutyShift[],
  added: readonly WireDutyShift[],
): WireDutyShift[] {
  const key = ({ personId, as, from, until }: WireDutyShift): string => [personId, as, from, until].join(' ');
  const all = new Map([...shifts, ...added].map((shift) => [key(shift), shift]));
  return [...all.values()].sort((a, b) => Date.parse(a.from) - Date.parse(b.from));
}

/** Who would be told of an alert that is raised now and that nobody takes, by the draft as it stands. */
export interface ToldLine {
  afterSeconds: number;
  name: string;
  channels: MessageChannel[];
}

export function toldLines(draft: RosterDraft, zone: string, priority: Priority, now: Instant): ToldLine[] {
  const roster: DutyRoster = {
    zone,
    people: draft.people,
    steps: draft.steps,
    shifts: draft.shifts.map((shift) => ({
      ...shift,
      from: Date.parse(shift.from),
      until: Date.parse(shift.until),
    })),
  };
  const alert = { priority, state: 'raised', raisedAt: now, takenAt: null } as const;
  const lines = new Map<string, ToldLine>();
  for (const told of whoIsTold(alert, roster, now + 2 * 3_600_000)) {
    const key = `${told.afterSeconds} ${told.personId}`;
    const name = draft.people.find(({ id }) => id === told.personId)?.name ?? '';
    const line = lines.get(key) ?? { afterSeconds: told.afterSeconds, name, channels: [] };
    lines.set(key, { ...line, channels: [...line.channels, told.channel] });
  }
  return [...lines.values()];
}
