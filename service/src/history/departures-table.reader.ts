import { setImmediate as nextTurn } from 'node:timers/promises';
import { Readable } from 'node:stream';
import { CsvError, parse } from 'csv-parse';
import { keyOfDeparture, problemsOfHeader, readDeparture, type PastDeparture } from './departures-table';
import type { RowProblem } from './history-import.entity';

/** Most rows of one table, and most problems that are told. Our choice: ten years of a busy terminal. */
const mostRows = 500_000;
const mostProblemsTold = 200;
const rowsPerTurn = 500;

/** A table as read: its rows, or, when `problems` is not empty, why none of it is loaded. */
export interface ReadTable {
  rows: PastDeparture[];
  problems: RowProblem[];
}

interface CsvRow {
  record: string[];
  info: { lines: number };
}

function fieldsOf(header: readonly string[], record: readonly string[]): Record<string, string> {
  return Object.fromEntries(header.map((column, index) => [column, (record[index] ?? '').trim()]));
}

/** A table while it is being read. */
class TableReading {
  readonly rows: PastDeparture[] = [];
  readonly problems: RowProblem[] = [];
  private readonly lineOfKey = new Map<string, number>();
  private header: string[] | null = null;
  private seen = 0;

  /** Takes the next row; false when there is no use in going on. */
  async take({ record, info }: CsvRow): Promise<boolean> {
    if (this.header === null) return this.takeHeader(record);
    this.seen += 1;
    if (this.seen % rowsPerTurn === 0) await nextTurn();
    if (this.seen > mostRows) {
      this.complain(info.lines, `more than ${mostRows.toLocaleString('en-US')} rows`);
      return false;
    }
    this.takeRow(this.header, record, info.lines);
    return this.problems.length < mostProblemsTold;
  }

  complain(line: number | null, message: string): void {
    this.problems.push({ line, message });
  }

  private takeHeader(record: readonly string[]): boolean {
    this.header = record.map((column) => column.trim());
    this.problems.push(...problemsOfHeader(this.header));
    return this.problems.length === 0;
  }

  private takeRow(header: readonly string[], record: readonly string[], line: number): void {
    if (record.length !== header.length) {
      this.complain(line, `has ${record.length} fields, the header has ${header.length}`);
      return;
    }
    const { row, problems } = readDeparture(fieldsOf(header, record), line);
    this.problems.push(...problems);
    if (row === null) return;
    const key = keyOfDeparture(row);
    const earlier = this.lineOfKey.get(key);
    if (earlier !== undefined) {
      this.complain(line, `the same departure stands in line ${earlier}`);
      return;
    }
    this.lineOfKey.set(key, line);
    this.rows.push(row);
  }
}

/**
 * Reads a CSV of past departures (UTF-8, with or without byte order mark, either line ending, quotes as in RFC 4180)
 * without holding up other requests. Every wrong row is named by its line; the same departure twice is wrong.
 */
export async function readDeparturesTable(content: Buffer): Promise<ReadTable> {
  const reading = new TableReading();
  const parser = Readable.from([content]).pipe(
    parse({ bom: true, info: true, relax_column_count: true, skip_empty_lines: true }),
  );
  try {
    for await (const row of parser as AsyncIterable<CsvRow>) if (!(await reading.take(row))) break;
  } catch (error) {
    if (!(error instanceof CsvError)) throw error;
    reading.complain(typeof error['lines'] === 'number' ? error['lines'] : null, error.message);
  }
  const { rows, problems } = reading;
  if (problems.length === 0 && rows.length === 0) reading.complain(null, 'the table has no rows');
  return { rows, problems };
}
