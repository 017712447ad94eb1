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

/**
 * Reads a CSV of past departures (UTF-8, with or without byte order mark, either line ending, quotes as in RFC 4180)
 * without holding up other requests. Every wrong row is named by its line; the same departure twice is wrong.
 */
export async function readDeparturesTable(content: Buffer): Promise<ReadTable> {
  const rows: PastDeparture[] = [];
  const problems: RowProblem[] = [];
  const lineOfKey = new Map<string, number>();
  let header: string[] | null = null;
  const parser = Readable.from([content]).pipe(
    parse({ bom: true, info: true, relax_column_count: true, skip_empty_lines: true }),
  );
  let seen = 0;
  try {
    for await (const { record, info } of parser as AsyncIterable<CsvRow>) {
      if (header === null) {
        header = record.map((column) => column.trim());
        problems.push(...problemsOfHeader(header));
        if (problems.length > 0) break;
        continue;
      }
      seen += 1;
      if (seen > mostRows) {
        problems.push({ line: info.lines, message: `more than ${mostRows.toLocaleString('en-US')} rows` });
        break;
      }
      if (seen % rowsPerTurn === 0) await nextTurn();
      if (record.length !== header.length) {
        problems.push({
          line: info.lines,
          message: `has ${record.length} fields, the header has ${header.length}`,
        });
      } else {
        const read = readDeparture(fieldsOf(header, record), info.lines);
        problems.push(...read.problems);
        if (read.row !== null) addRow(read.row, rows, lineOfKey, problems);
      }
      if (problems.length >= mostProblemsTold) break;
    }
  } catch (error) {
    if (!(error instanceof CsvError)) throw error;
    problems.push({
      line: typeof error['lines'] === 'number' ? error['lines'] : null,
      message: error.message,
    });
  }
  if (problems.length === 0 && rows.length === 0)
    problems.push({ line: null, message: 'the table has no rows' });
  return { rows, problems };
}

function addRow(
  row: PastDeparture,
  rows: PastDeparture[],
  lineOfKey: Map<string, number>,
  problems: RowProblem[],
): void {
  const key = keyOfDeparture(row);
  const earlier = lineOfKey.get(key);
  if (earlier !== undefined) {
    problems.push({ line: row.line, message: `the same departure stands in line ${earlier}` });
    return;
  }
  lineOfKey.set(key, row.line);
  rows.push(row);
}
