import { Injectable } from '@nestjs/common';
import { ALL_TERMINALS, type AlertsQuery, PRIORITIES, type WireAlert } from '@stubpost/shared';
import { Reader } from '../database/reader';
import { type AlertRecord, type RawAlert, STANDING_STATES, alertRecordOf, wireAlertOf } from './alert-record';

/** Alerts as lists and turns show them. */
@Injectable()
export class AlertReadModel {
  constructor(private readonly reader: Reader) {}

  async find(id: string): Promise<AlertRecord | null> {
    const [raw] = await this.reader.query<RawAlert>('SELECT * FROM alert WHERE id = ?', [id]);
    return raw === undefined ? null : alertRecordOf(raw);
  }

  /** Alerts at some terminals (`*` alone is all), the most urgent first, of equal ones the oldest. */
  async list(terminals: readonly string[], state: AlertsQuery['state']): Promise<WireAlert[]> {
    const everywhere = terminals.includes(ALL_TERMINALS);
    const states = state === 'standing' ? STANDING_STATES : state === 'all' ? [] : [state];
    const conditions = [
      ...(everywhere ? [] : [`terminal_code IN (${marks(terminals)})`]),
      ...(states.length === 0 ? [] : [`state IN (${marks(states)})`]),
    ];
    const where = conditions.length === 0 ? '' : `WHERE ${conditions.join(' AND ')}`;
    const parameters = [...(everywhere ? [] : terminals), ...states];
    const rows = await this.reader.query<RawAlert>(
      `SELECT * FROM alert ${where} ORDER BY raised_at, id`,
      parameters,
    );
    return rows.map(alertRecordOf).sort(mostUrgentFirst).map(wireAlertOf);
  }

  /** Standing alerts of some turns, by turn, the most urgent first. */
  async standingOn(turnIds: readonly string[]): Promise<Map<string, AlertRecord[]>> {
    const byTurn = new Map<string, AlertRecord[]>();
    if (turnIds.length === 0) return byTurn;
    const rows = await this.reader.query<RawAlert>(
      `SELECT * FROM alert WHERE subject_id IN (${marks(turnIds)})
       AND state IN ('raised', 'taken', 'set-aside') ORDER BY raised_at, id`,
      [...turnIds],
    );
    for (const alert of rows.map(alertRecordOf).sort(mostUrgentFirst)) {
      const known = byTurn.get(alert.subjectId);
      if (known === undefined) byTurn.set(alert.subjectId, [alert]);
      else known.push(alert);
    }
    return byTurn;
  }
}

const marks = (values: readonly unknown[]): string => values.map(() => '?').join(', ');

/** Order of lists: by priority, then as they were raised. Sorting is stable. */
export function mostUrgentFirst(a: AlertRecord, b: AlertRecord): number {
  return PRIORITIES.indexOf(a.priority) - PRIORITIES.indexOf(b.priority);
}
