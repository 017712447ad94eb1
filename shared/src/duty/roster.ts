import type { Instant } from '../lib/instant';
import { formatClock } from '../lib/zone-time';
import type { Priority } from '../lateness/finding';

/** Ways by which somebody away from the board is told. */
export const MESSAGE_CHANNELS = ['e-mail', 'sms'] as const;
export type MessageChannel = (typeof MESSAGE_CHANNELS)[number];

/** What somebody is on the roster as. */
export const DUTIES = ['desk', 'deputy'] as const;
export type Duty = (typeof DUTIES)[number];

/** Who can be told, from the nearest to the farthest: the rungs that an alert climbs while nobody takes it. */
export const RUNGS = ['desk', 'deputy', 'supervisor'] as const;
export type Rung = (typeof RUNGS)[number];

/** Somebody's time on duty, from an instant up to but not including another. */
export interface DutyShift {
  personId: string;
  as: Duty;
  from: Instant;
  until: Instant;
}

/** Hours of the day in the terminal's zone, `HH:MM`, the end not included; they may run over midnight. */
export interface QuietHours {
  from: string;
  until: string;
}

/** Somebody who can be told. */
export interface DutyPerson {
  id: string;
  name: string;
  /** Whether the person supervises the terminal: the last rung. */
  isSupervisor: boolean;
  quiet: QuietHours | null;
}

/** At which second of standing untaken an alert reaches a rung, and by which ways it is told there. */
export interface EscalationStep {
  priority: Priority;
  afterSeconds: number;
  rung: Rung;
  channels: readonly MessageChannel[];
}

/** Everything that decides who is told at one terminal. */
export interface DutyRoster {
  /** IANA zone of the quiet hours. */
  zone: string;
  shifts: readonly DutyShift[];
  /** Those who may act on alerts there; anybody else on a shift is passed over. */
  people: readonly DutyPerson[];
  steps: readonly EscalationStep[];
}

const BOTH = ['e-mail', 'sms'] as const;

/**
 * Steps until a supervisor changes them; our choice. Act now reaches the desk at once by both ways and a supervisor
 * within 3 min; Act soon waits longer between rungs; Watch stands on the board alone for 5 min, then mails the desk.
 */
export const shippedEscalation: readonly EscalationStep[] = [
  { priority: 'act-now', afterSeconds: 0, rung: 'desk', channels: BOTH },
  { priority: 'act-now', afterSeconds: 60, rung: 'deputy', channels: BOTH },
  { priority: 'act-now', afterSeconds: 180, rung: 'supervisor', channels: BOTH },
  { priority: 'act-soon', afterSeconds: 0, rung: 'desk', channels: ['e-mail'] },
  { priority: 'act-soon', afterSeconds: 180, rung: 'deputy', channels: BOTH },
  { priority: 'act-soon', afterSeconds: 600, rung: 'supervisor', channels: BOTH },
  { priority: 'watch', afterSeconds: 300, rung: 'desk', channels: ['e-mail'] },
];

/** Ids of the people with a duty at an instant, without doubles, in the order of their shifts. */
export function onDuty(shifts: readonly DutyShift[], duty: Duty, now: Instant): string[] {
  const running = shifts.filter((shift) => shift.as === duty && shift.from <= now && now < shift.until);
  return [...new Set(running.map((shift) => shift.personId))];
}

/**
 * Whether an instant lies in somebody's quiet hours. `{ from: '22:00', until: '06:00' }` covers 22:00 and 05:59, not
 * 06:00; equal ends cover nothing.
 */
export function isQuiet(quiet: QuietHours | null, zone: string, now: Instant): boolean {
  if (quiet === null) return false;
  const clock = formatClock(now, zone);
  const { from, until } = quiet;
  return from <= until ? from <= clock && clock < until : clock >= from || clock < until;
}
