import { Injectable } from '@nestjs/common';
import type { AlertCause } from '@stubpost/shared';
import type { Transaction } from '../database/unit-of-work';
import {
  type AlertRecord,
  type RawAlert,
  alertColumnValue,
  alertColumns,
  alertRecordOf,
} from './alert-record';

const insertSql = `INSERT INTO alert (${alertColumns.map(([, column]) => column).join(', ')})
  VALUES (${alertColumns.map(() => '?').join(', ')})`;

/** What may change about an alert once it has been raised. */
const changing = [
  'priority',
  'state',
  'subject',
  'text',
  'action',
  'actor',
  'byWhen',
  'lines',
  'takenAt',
  'takenBy',
  'takenById',
  'setAsideUntil',
  'setAsideReason',
  'setAsideBy',
  'clearedAt',
  'closedAt',
  'closedBy',
  'closedCause',
] as const satisfies readonly (keyof AlertRecord)[];
const columnOf = new Map<keyof AlertRecord, string>(alertColumns);
const updateSql = `UPDATE alert SET version = version + 1, ${changing
  .map((property) => `${columnOf.get(property)} = ?`)
  .join(', ')} WHERE id = ? AND version = ?`;

/** Write side of the table of alerts. */
@Injectable()
export class AlertRepository {
  async findById(transaction: Transaction, id: string): Promise<AlertRecord | null> {
    const [raw] = await transaction.query<RawAlert[]>('SELECT * FROM alert WHERE id = ?', [id]);
    return raw === undefined ? null : alertRecordOf(raw);
  }

  /** Alerts that stand on a subject. */
  async findStandingOn(transaction: Transaction, subjectId: string): Promise<AlertRecord[]> {
    const rows = await transaction.query<RawAlert[]>(
      `SELECT * FROM alert WHERE subject_id = ? AND state IN ('raised', 'taken', 'set-aside') ORDER BY raised_at, id`,
      [subjectId],
    );
    return rows.map(alertRecordOf);
  }

  /** The newest alert of a cause on a subject that does not stand any more. */
  async findLast(
    transaction: Transaction,
    subjectId: string,
    cause: AlertCause,
  ): Promise<AlertRecord | null> {
    const [raw] = await transaction.query<RawAlert[]>(
      `SELECT * FROM alert WHERE subject_id = ? AND cause = ? AND state IN ('cleared', 'closed')
       ORDER BY raised_at DESC, id LIMIT 1`,
      [subjectId, cause],
    );
    return raw === undefined ? null : alertRecordOf(raw);
  }

  async insert(transaction: Transaction, alert: AlertRecord): Promise<void> {
    await transaction.execute(
      insertSql,
      alertColumns.map(([property]) => alertColumnValue(alert, property)),
    );
  }

  /** Keeps a changed alert under its next version, if it still is at the version that was read. */
  async update(transaction: Transaction, alert: AlertRecord): Promise<AlertRecord> {
    const values = changing.map((property) => alertColumnValue(alert, property));
    const changed = await transaction.execute(updateSql, [...values, alert.id, alert.version]);
    if (changed !== 1) throw new Error(`alert ${alert.id} is not at version ${alert.version} any more`);
    return { ...alert, version: alert.version + 1 };
  }
}
