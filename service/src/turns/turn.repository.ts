import { Injectable } from '@nestjs/common';
import type { CalendarDate, Instant } from '@stubpost/shared';
import type { Transaction } from '../database/unit-of-work';
import { type RawTurn, type TurnRecord, columnValue, turnColumns, turnRecordOf } from './turn-record';

const columnNames = turnColumns.map(([, column]) => `"${column}"`).join(', ');
const insertSql = `INSERT INTO turn (${columnNames}) VALUES (${turnColumns.map(() => '?').join(', ')})`;

/** Columns that follow the entries; everything else of a turn is set when it is opened. */
const followingColumns = [
  'track',
  'set',
  'expectedArrivalAt',
  'arrivalAt',
  'heldUntil',
  'departureAt',
  'annulledAt',
  'entryCount',
  'correctionCount',
  'waitingCount',
  'crew',
  'carriedCrew',
  'spanFrom',
  'spanTo',
  'settledAt',
  'withdrawnAt',
] as const satisfies readonly (keyof TurnRecord)[];

/** Columns that a timetable may set again while nothing has happened. */
const plannedColumns = [
  'kind',
  'timetableId',
  'inboundTrain',
  'outboundTrain',
  'scheduledArrivalAt',
  'scheduledDepartureAt',
  'plannedTrack',
  'plannedSet',
  'reverses',
  'planId',
] as const satisfies readonly (keyof TurnRecord)[];

const columnOf = new Map<keyof TurnRecord, string>(turnColumns);
const setting = (properties: readonly (keyof TurnRecord)[]): string =>
  properties.map((property) => `"${columnOf.get(property)}" = ?`).join(', ');

const followSql = `UPDATE turn SET version = version + 1, ${setting(followingColumns)} WHERE id = ? AND version = ?`;
const replanSql = `UPDATE turn SET version = version + 1, ${setting([...plannedColumns, ...followingColumns])} WHERE id = ? AND version = ?`;

/** Write side of the table of turns: every statement that changes it, inside a unit of work. */
@Injectable()
export class TurnRepository {
  async findById(transaction: Transaction, id: string): Promise<TurnRecord | null> {
    const rows = await transaction.query<RawTurn[]>('SELECT * FROM turn WHERE id = ?', [id]);
    return rows[0] === undefined ? null : turnRecordOf(rows[0]);
  }

  /** Turns a timetable opened for a day at a terminal, taken back ones too. */
  async findPlannedOn(
    transaction: Transaction,
    terminalCode: string,
    serviceDate: CalendarDate,
  ): Promise<TurnRecord[]> {
    const rows = await transaction.query<RawTurn[]>(
      'SELECT * FROM turn WHERE terminal_code = ? AND service_date = ? AND pair_key IS NOT NULL',
      [terminalCode, serviceDate],
    );
    return rows.map(turnRecordOf);
  }

  /** The turn a set makes next to a moment, after it or before it, no further away than a limit; null without one. */
  async findOfSet(
    transaction: Transaction,
    set: string,
    question: { side: 'after' | 'before'; of: Instant; limit: Instant; except: string },
  ): Promise<TurnRecord | null> {
    const { side, of, limit, except } = question;
    const [low, high, order] = side === 'after' ? [of, limit, 'ASC'] : [limit, of, 'DESC'];
    const rows = await transaction.query<RawTurn[]>(
      `SELECT * FROM turn WHERE set_label = ? AND span_from >= ? AND span_from <= ? AND id <> ?
       AND withdrawn_at IS NULL ORDER BY span_from ${order}, id ${order} LIMIT 1`,
      [set, low, high, except],
    );
    return rows[0] === undefined ? null : turnRecordOf(rows[0]);
  }

  /** When a set, or a person as its engineer, next came in somewhere after a moment; null while it has not. */
  async findNextArrival(
    transaction: Transaction,
    question: { turnId: string; set: string | null; personId: string; after: Instant },
  ): Promise<Instant | null> {
    const [row] = await transaction.query<{ arrival_at: number | string | null }[]>(
      `SELECT min(arrival_at) AS arrival_at FROM turn
       WHERE arrival_at > ? AND id <> ? AND (set_label = ? OR crew LIKE ?)`,
      [question.after, question.turnId, question.set, `%"engineer","personId":"${question.personId}"%`],
    );
    return row === undefined || row.arrival_at === null ? null : Number(row.arrival_at);
  }

  async insert(transaction: Transaction, turn: TurnRecord): Promise<void> {
    await transaction.execute(
      insertSql,
      turnColumns.map(([property]) => columnValue(turn, property)),
    );
  }

  /** Brings the copies of a row after its entries; gives the row with its new version. */
  async follow(transaction: Transaction, turn: TurnRecord): Promise<TurnRecord> {
    await this.guarded(transaction, followSql, followingColumns, turn);
    return { ...turn, version: turn.version + 1 };
  }

  /** Plans a turn anew, as long as nothing has happened. */
  async replan(transaction: Transaction, turn: TurnRecord): Promise<TurnRecord> {
    await this.guarded(transaction, replanSql, [...plannedColumns, ...followingColumns], turn);
    return { ...turn, version: turn.version + 1 };
  }

  /** Service dates, from one on, with turns on which nothing has happened yet. */
  async findDatesNotBegun(
    transaction: Transaction,
    terminalCode: string,
    from: CalendarDate,
  ): Promise<CalendarDate[]> {
    const rows = await transaction.query<{ service_date: string }[]>(
      `SELECT DISTINCT service_date FROM turn
       WHERE terminal_code = ? AND service_date >= ? AND entry_count = 0 AND settled_at IS NULL`,
      [terminalCode, from],
    );
    return rows.map((row) => row.service_date);
  }

  /** Measures the turns of a day on which nothing has happened yet against another plan. */
  async pinPlan(
    transaction: Transaction,
    pin: { terminalCode: string; serviceDate: CalendarDate; planId: string },
  ): Promise<number> {
    return transaction.execute(
      `UPDATE turn SET version = version + 1, plan_id = ? WHERE terminal_code = ? AND service_date = ?
       AND plan_id <> ? AND entry_count = 0 AND settled_at IS NULL`,
      [pin.planId, pin.terminalCode, pin.serviceDate, pin.planId],
    );
  }

  /** Counts a change of something that a turn shows but its row does not hold: its alerts, the cars of its set. */
  async touch(transaction: Transaction, id: string): Promise<number> {
    const [row] = await transaction.query<{ version: number }[]>(
      'UPDATE turn SET version = version + 1 WHERE id = ? RETURNING version',
      [id],
    );
    if (row === undefined) throw new Error(`there is no turn ${id}`);
    return row.version;
  }

  /** Counts a change of the cars of a set on every turn it still has to make. */
  async touchUnsettledOfSet(
    transaction: Transaction,
    set: string,
  ): Promise<{ id: string; version: number; terminalCode: string }[]> {
    const rows = await transaction.query<{ id: string; version: number; terminal_code: string }[]>(
      `UPDATE turn SET version = version + 1 WHERE set_label = ? AND settled_at IS NULL AND withdrawn_at IS NULL
       RETURNING id, version, terminal_code`,
      [set],
    );
    return rows.map((row) => ({ id: row.id, version: row.version, terminalCode: row.terminal_code }));
  }

  private async guarded(
    transaction: Transaction,
    sql: string,
    properties: readonly (keyof TurnRecord)[],
    turn: TurnRecord,
  ): Promise<void> {
    const values = properties.map((property) => columnValue(turn, property));
    const changed = await transaction.execute(sql, [...values, turn.id, turn.version]);
    if (changed !== 1) throw new Error(`turn ${turn.id} is not at version ${turn.version} any more`);
  }
}
