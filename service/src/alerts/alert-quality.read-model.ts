import { Injectable } from '@nestjs/common';
import type {
  AlertCause,
  Instant,
  InstantRange,
  PastAlert,
  PastDepartureOfTurn,
  Priority,
  WatchedTurnSpan,
} from '@stubpost/shared';
import { Reader } from '../database/reader';
import { alertRecordOf, type AlertRecord, type RawAlert } from './alert-record';

interface DepartureColumns {
  scheduled_departure_at: number | null;
  held_until: number | null;
  departure_at: number | null;
  annulled_at: number | null;
}

interface PastAlertRow extends DepartureColumns {
  cause: string;
  priority: string;
  subject_id: string;
  train: string | null;
  raised_at: number;
  taken_at: number | null;
  cleared_at: number | null;
  /** When its turn was entered; null where there is none. */
  turn_known_at: number | null;
}

interface TurnRow extends DepartureColumns {
  span_from: number;
  span_to: number;
  created_at: number;
  first_alert_at: number | null;
}

/** Alerts of a range: those that somebody could see, and those worked out from a turn that was entered later. */
export interface AlertsOfRange {
  seen: PastAlert[];
  unseen: PastAlert[];
}

/** Turns of a range: those that were known before they were over, and those that were entered afterwards. */
export interface TurnsOfRange {
  watched: WatchedTurnSpan[];
  unwatched: WatchedTurnSpan[];
}

/** Alerts of the past, and the turns on which they were raised or might have been. */
@Injectable()
export class AlertQualityReadModel {
  constructor(private readonly reader: Reader) {}

  /** Alerts of a terminal that were raised in a range. */
  async alertsRaised(terminalCode: string, range: InstantRange): Promise<AlertsOfRange> {
    const rows = await this.reader.query<PastAlertRow>(
      `SELECT a.cause, a.priority, a.subject_id, coalesce(t.outbound_train, t.inbound_train) AS train,
         a.raised_at, a.taken_at, a.cleared_at,
         t.created_at AS turn_known_at, t.scheduled_departure_at, t.held_until, t.departure_at, t.annulled_at
       FROM alert a LEFT JOIN turn t ON t.id = a.turn_id
       WHERE a.terminal_code = ? AND a.raised_at >= ? AND a.raised_at < ?
       ORDER BY a.raised_at, a.id`,
      [terminalCode, range.from, range.to],
    );
    const isSeen = (row: PastAlertRow): boolean => (instant(row.turn_known_at) ?? 0) <= Number(row.raised_at);
    return {
      seen: rows.filter(isSeen).map(pastAlertOf),
      unseen: rows.filter((row) => !isSeen(row)).map(pastAlertOf),
    };
  }

  /** Turns of a terminal that touch a range, save annulled ones. */
  async turnsOf(terminalCode: string, range: InstantRange): Promise<TurnsOfRange> {
    const rows = await this.reader.query<TurnRow>(
      `SELECT t.span_from, t.span_to, t.created_at, t.scheduled_departure_at, t.held_until, t.departure_at,
         t.annulled_at, (SELECT min(a.raised_at) FROM alert a
           WHERE a.subject_id = t.id AND a.cause = 'late-departure') AS first_alert_at
       FROM turn t
       WHERE t.terminal_code = ? AND t.span_to > ? AND t.span_from < ? AND t.withdrawn_at IS NULL
         AND t.annulled_at IS NULL`,
      [terminalCode, range.from, range.to],
    );
    const isWatched = (row: TurnRow): boolean => Number(row.created_at) < Number(row.span_to);
    return {
      watched: rows.filter(isWatched).map(watchedTurnOf),
      unwatched: rows.filter((row) => !isWatched(row)).map(watchedTurnOf),
    };
  }

  /** What stands at a terminal now, the longest standing first. */
  async standing(terminalCode: string): Promise<AlertRecord[]> {
    const rows = await this.reader.query<RawAlert>(
      `SELECT * FROM alert WHERE terminal_code = ? AND state IN ('raised', 'taken', 'set-aside')
       ORDER BY raised_at, id`,
      [terminalCode],
    );
    return rows.map(alertRecordOf);
  }
}

const instant = (value: number | null): Instant | null => (value === null ? null : Number(value));

function departureOf(row: DepartureColumns): PastDepartureOfTurn | null {
  const scheduledAt = instant(row.scheduled_departure_at);
  if (scheduledAt === null) return null;
  return {
    scheduledAt,
    heldUntil: instant(row.held_until),
    leftAt: instant(row.departure_at),
    annulled: row.annulled_at !== null,
  };
}

function pastAlertOf(row: PastAlertRow): PastAlert {
  return {
    cause: row.cause as AlertCause,
    priority: row.priority as Priority,
    subjectId: row.subject_id,
    train: row.train,
    raisedAt: Number(row.raised_at),
    takenAt: instant(row.taken_at),
    clearedAt: instant(row.cleared_at),
    departure: departureOf(row),
  };
}

/** A turn that was opened while it stood there is watched only from then on; one entered later counts as a whole. */
function watchedTurnOf(row: TurnRow): WatchedTurnSpan {
  const [from, to, knownAt] = [Number(row.span_from), Number(row.span_to), Number(row.created_at)];
  return {
    span: { from: knownAt < to ? Math.max(from, knownAt) : from, to },
    departure: departureOf(row),
    firstAlertAt: instant(row.first_alert_at),
  };
}
