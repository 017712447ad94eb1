import { randomUUID } from 'node:crypto';
import { Injectable } from '@nestjs/common';
import type { Instant } from '@stubpost/shared';
import { Reader } from '../database/reader';
import type { Transaction } from '../database/unit-of-work';
import type { PastDeparture } from './departures-table';
import { HistoryImportRow, type RowProblem } from './history-import.entity';

const columns = `id, import_id, terminal_code, service_date, train, set_label, track, scheduled_arrival_at,
  actual_arrival_at, scheduled_departure_at, actual_departure_at, annulled`;
const columnCount = 12;
/** SQLite takes 32,766 values in one statement; this stays far below. */
const rowsPerStatement = 400;

/** Imports of past departures and the rows they bring. */
@Injectable()
export class HistoryImportsRepository {
  constructor(private readonly reader: Reader) {}

  find(id: string): Promise<HistoryImportRow | null> {
    return this.reader.manager.findOneBy(HistoryImportRow, { id });
  }

  latest(): Promise<HistoryImportRow[]> {
    return this.reader.manager.find(HistoryImportRow, { order: { createdAt: 'DESC' }, take: 20 });
  }

  async start(
    transaction: Transaction,
    row: { id: string; fileName: string; uploadedBy: string; now: Instant },
  ): Promise<void> {
    await transaction.execute(
      `INSERT INTO history_import (id, state, file_name, row_count, problems, uploaded_by, created_at)
       VALUES (?, 'reading', ?, 0, '[]', ?, ?)`,
      [row.id, row.fileName, row.uploadedBy, row.now],
    );
  }

  async finish(
    transaction: Transaction,
    id: string,
    outcome: { state: 'loaded' | 'refused'; rows: number; problems: RowProblem[] },
  ): Promise<void> {
    await transaction.execute(
      `UPDATE history_import SET state = ?, row_count = ?, problems = ? WHERE id = ?`,
      [outcome.state, outcome.rows, JSON.stringify(outcome.problems), id],
    );
  }

  /** Imports that were being read when the service ended; none of their rows were kept. */
  async refuseUnfinished(transaction: Transaction, problem: RowProblem): Promise<void> {
    await transaction.execute(
      `UPDATE history_import SET state = 'refused', problems = ? WHERE state = 'reading'`,
      [JSON.stringify([problem])],
    );
  }

  /** Rows that are loaded already, of those asked about: their lines in the new table. */
  async linesAlreadyLoaded(transaction: Transaction, rows: readonly PastDeparture[]): Promise<number[]> {
    const lines: number[] = [];
    for (const row of rows) {
      const found = await transaction.query<unknown[]>(
        `SELECT 1 FROM past_departure
         WHERE terminal_code = ? AND service_date = ? AND train = ? AND scheduled_departure_at = ?`,
        [row.terminalCode, row.serviceDate, row.train, row.scheduledDepartureAt],
      );
      if (found.length > 0) lines.push(row.line);
    }
    return lines;
  }

  async insertRows(
    transaction: Transaction,
    importId: string,
    rows: readonly PastDeparture[],
  ): Promise<void> {
    for (let start = 0; start < rows.length; start += rowsPerStatement) {
      const chunk = rows.slice(start, start + rowsPerStatement);
      const places = chunk.map(() => `(${Array(columnCount).fill('?').join(', ')})`).join(', ');
      const values = chunk.flatMap((row) => [
        randomUUID(),
        importId,
        row.terminalCode,
        row.serviceDate,
        row.train,
        row.set,
        row.track,
        row.scheduledArrivalAt,
        row.actualArrivalAt,
        row.scheduledDepartureAt,
        row.actualDepartureAt,
        row.annulled ? 1 : 0,
      ]);
      await transaction.execute(`INSERT INTO past_departure (${columns}) VALUES ${places}`, values);
    }
  }
}
