import {
  type AlertCause,
  type AlertState,
  type CalendarDate,
  type Instant,
  type Priority,
  type WireAlert,
  formatInstant,
} from '@stubpost/shared';

/** States in which an alert stands. */
export const STANDING_STATES = ['raised', 'taken', 'set-aside'] as const satisfies readonly AlertState[];

/** One row of the table of alerts, read. */
export interface AlertRecord {
  id: string;
  version: number;
  terminalCode: string;
  serviceDate: CalendarDate;
  subjectKind: string;
  subjectId: string;
  turnId: string | null;
  cause: AlertCause;
  priority: Priority;
  state: AlertState;
  subject: string;
  text: string;
  action: string;
  actor: string;
  byWhen: Instant | null;
  lines: string[];
  raisedAt: Instant;
  takenAt: Instant | null;
  takenBy: string | null;
  takenById: string | null;
  setAsideUntil: Instant | null;
  setAsideReason: string | null;
  setAsideBy: string | null;
  clearedAt: Instant | null;
  closedAt: Instant | null;
  closedBy: string | null;
  closedCause: string | null;
  previousId: string | null;
  createdAt: Instant;
}

/** A row as the driver hands it over. */
export type RawAlert = Record<string, string | number | null>;

/** Property and column of each field, in the order of the INSERT. */
export const alertColumns = [
  ['id', 'id'],
  ['version', 'version'],
  ['terminalCode', 'terminal_code'],
  ['serviceDate', 'service_date'],
  ['subjectKind', 'subject_kind'],
  ['subjectId', 'subject_id'],
  ['turnId', 'turn_id'],
  ['cause', 'cause'],
  ['priority', 'priority'],
  ['state', 'state'],
  ['subject', 'subject'],
  ['text', 'text'],
  ['action', 'action'],
  ['actor', 'actor'],
  ['byWhen', 'by_when'],
  ['lines', 'lines'],
  ['raisedAt', 'raised_at'],
  ['takenAt', 'taken_at'],
  ['takenBy', 'taken_by'],
  ['takenById', 'taken_by_id'],
  ['setAsideUntil', 'set_aside_until'],
  ['setAsideReason', 'set_aside_reason'],
  ['setAsideBy', 'set_aside_by'],
  ['clearedAt', 'cleared_at'],
  ['closedAt', 'closed_at'],
  ['closedBy', 'closed_by'],
  ['closedCause', 'closed_cause'],
  ['previousId', 'previous_id'],
  ['createdAt', 'created_at'],
] as const satisfies readonly (readonly [keyof AlertRecord, string])[];

const instant = (value: RawAlert[string] | undefined): Instant | null =>
  value === null || value === undefined ? null : Number(value);
const text = (value: RawAlert[string] | undefined): string | null =>
  value === null || value === undefined ? null : String(value);

/** Reads a raw row. */
export function alertRecordOf(raw: RawAlert): AlertRecord {
  return {
    id: String(raw['id']),
    version: Number(raw['version']),
    terminalCode: String(raw['terminal_code']),
    serviceDate: String(raw['service_date']),
    subjectKind: String(raw['subject_kind']),
    subjectId: String(raw['subject_id']),
    turnId: text(raw['turn_id']),
    cause: raw['cause'] as AlertCause,
    priority: raw['priority'] as Priority,
    state: raw['state'] as AlertState,
    subject: String(raw['subject']),
    text: String(raw['text']),
    action: String(raw['action']),
    actor: String(raw['actor']),
    byWhen: instant(raw['by_when']),
    lines: JSON.parse(String(raw['lines'])) as string[],
    raisedAt: Number(raw['raised_at']),
    takenAt: instant(raw['taken_at']),
    takenBy: text(raw['taken_by']),
    takenById: text(raw['taken_by_id']),
    setAsideUntil: instant(raw['set_aside_until']),
    setAsideReason: text(raw['set_aside_reason']),
    setAsideBy: text(raw['set_aside_by']),
    clearedAt: instant(raw['cleared_at']),
    closedAt: instant(raw['closed_at']),
    closedBy: text(raw['closed_by']),
    closedCause: text(raw['closed_cause']),
    previousId: text(raw['previous_id']),
    createdAt: Number(raw['created_at']),
  };
}

/** A field as it goes into its column. */
export function alertColumnValue(alert: AlertRecord, property: keyof AlertRecord): string | number | null {
  const value = alert[property];
  return Array.isArray(value) ? JSON.stringify(value) : value;
}

/** Whether the alert stands. */
export function isStanding(alert: Pick<AlertRecord, 'state'>): boolean {
  return STANDING_STATES.some((state) => state === alert.state);
}

const wireInstant = (value: Instant | null): string | null => (value === null ? null : formatInstant(value));

/** An alert as every route gives it. */
export function wireAlertOf(alert: AlertRecord): WireAlert {
  return {
    id: alert.id,
    version: alert.version,
    cause: alert.cause,
    priority: alert.priority,
    state: alert.state,
    terminal: alert.terminalCode,
    turnId: alert.turnId,
    subject: alert.subject,
    raisedAt: formatInstant(alert.raisedAt),
    takenAt: wireInstant(alert.takenAt),
    takenBy: alert.takenBy,
    setAsideUntil: wireInstant(alert.setAsideUntil),
    setAsideReason: alert.setAsideReason,
    clearedAt: wireInstant(alert.clearedAt),
    closedAt: wireInstant(alert.closedAt),
    closedCause: alert.closedCause,
    text: alert.text,
    action: alert.action,
    actor: alert.actor,
    byWhen: wireInstant(alert.byWhen),
    lines: alert.lines,
    previousId: alert.previousId,
  };
}
