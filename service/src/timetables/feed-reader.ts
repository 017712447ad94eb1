import { pipeline } from 'node:stream';
import {
  createTimetableReading,
  PROBLEM_SEVERITIES,
  summarise,
  type FeedFile,
  type FeedRow,
  type ImportProblem,
  type RouteTypes,
  type TimetableReading,
  type TimetableSummary,
} from '@stubpost/shared';
import { CsvError, parse } from 'csv-parse';
import type { FeedLimits } from './feed-limits';
import { FeedRefused } from './feed-refused';
import { FeedZip } from './feed-zip';

/** What is to be read, and how. */
export interface FeedReadRequest {
  path: string;
  routeTypes: RouteTypes;
  limits: FeedLimits;
  /** Shortest turn of the step plan, in seconds; turns below are named as short by design. */
  shortestTurnSeconds: number;
}

/** How far the reading is: what is being done, and the share of all, 0 to 1. */
export interface FeedProgress {
  stage: string;
  share: number;
}

/** What came out of a zip: a timetable as JSON text with its summary, or the reasons why there is none. */
export type FeedReadAnswer =
  | { ok: true; content: string; summary: TimetableSummary; problems: ImportProblem[] }
  | { ok: false; problems: ImportProblem[] };

/** Reading the files is this share of the work; the rest is summing up all days. */
const shareOfFiles = 0.85;

/** Reads a zip from beginning to end. Never throws for what the zip holds. */
export async function readFeed(
  request: FeedReadRequest,
  onProgress: (progress: FeedProgress) => void,
): Promise<FeedReadAnswer> {
  try {
    const outcome = await readZip(request, onProgress);
    if (!outcome.ok) return { ok: false, problems: outcome.error };
    onProgress({ stage: 'Summing up all days', share: shareOfFiles });
    const { timetable, problems } = outcome.value;
    const summed = summarise(timetable, request.shortestTurnSeconds);
    return {
      ok: true,
      content: JSON.stringify(timetable),
      summary: summed.summary,
      problems: inOrder([...problems, ...summed.problems]),
    };
  } catch (error) {
    if (error instanceof FeedRefused) return { ok: false, problems: [error.problem] };
    throw error;
  }
}

function inOrder(problems: ImportProblem[]): ImportProblem[] {
  return PROBLEM_SEVERITIES.flatMap((severity) =>
    problems.filter((problem) => problem.severity === severity),
  );
}

async function readZip(request: FeedReadRequest, onProgress: (progress: FeedProgress) => void) {
  const zip = await FeedZip.open(request.path, request.limits);
  try {
    const reading = createTimetableReading(request.routeTypes);
    const counter = new RowCounter(request.limits, zip.unpackedBytes, onProgress);
    for (const file of zip.files) {
      counter.begin(file);
      await readFile(zip, file, { reading, counter, limits: request.limits });
    }
    return reading.finish();
  } finally {
    zip.close();
  }
}

interface FileReading {
  reading: TimetableReading;
  counter: RowCounter;
  limits: FeedLimits;
}

/** A row as the parser gives it: cells, and lines of the file read up to its end. */
interface ParsedRow {
  record: string[];
  info: { lines: number };
}

async function readFile(
  zip: FeedZip,
  file: FeedFile,
  { reading, counter, limits }: FileReading,
): Promise<void> {
  const { source, check } = await zip.read(file, (bytes) => counter.addBytes(bytes));
  const parser = parse({
    bom: true,
    info: true,
    relax_column_count: true,
    relax_quotes: true,
    skip_empty_lines: true,
    max_record_size: limits.rowCharacters,
  });
  const failed = new Promise<unknown>((resolve) => {
    pipeline(source, check, parser, (error) => resolve(error));
  });
  let take: ((row: FeedRow) => void) | null = null;
  try {
    for await (const row of parser as AsyncIterable<ParsedRow>) {
      counter.addRow(file);
      if (take === null) take = reading.open(file, row.record);
      else take({ line: firstLineOf(row), cells: row.record });
    }
    const error = await failed;
    if (error instanceof Error) throw error;
  } catch (error) {
    throw refusalFrom(file, error);
  }
  if (take === null) reading.open(file, []);
}

/** The parser counts lines to the end of a row; a value may hold line breaks of its own. */
function firstLineOf({ record, info }: ParsedRow): number {
  const breaks = record.reduce(
    (sum, cell) => sum + (cell.includes('\n') ? cell.split('\n').length - 1 : 0),
    0,
  );
  return info.lines - breaks;
}

function refusalFrom(file: FeedFile, error: unknown): Error {
  if (error instanceof FeedRefused) return error;
  if (error instanceof CsvError) {
    const line = typeof error['lines'] === 'number' ? error['lines'] : null;
    const message =
      error.code === 'CSV_QUOTE_NOT_CLOSED'
        ? 'A quotation mark is opened and never closed.'
        : `The table cannot be read from here on (${error.code}).`;
    return new FeedRefused({ file, line, code: 'file.unreadable', message });
  }
  const why = error instanceof Error ? ` (${error.message})` : '';
  return new FeedRefused({ file, code: 'zip.damaged', message: `${file} is damaged inside the zip${why}.` });
}

/** Counts what has been read, tells how far it is, and stops at the limit. */
class RowCounter {
  private rows = 0;
  private bytes = 0;
  private stage = '';

  constructor(
    private readonly limits: FeedLimits,
    private readonly allBytes: number,
    private readonly onProgress: (progress: FeedProgress) => void,
  ) {}

  begin(file: FeedFile): void {
    this.stage = `Reading ${file}`;
    this.tell();
  }

  addBytes(bytes: number): void {
    this.bytes += bytes;
    this.tell();
  }

  addRow(file: FeedFile): void {
    this.rows += 1;
    if (this.rows <= this.limits.rows) return;
    const message = `The files hold more than ${this.limits.rows} rows.`;
    throw new FeedRefused({ file, code: 'limit.rows', message });
  }

  private tell(): void {
    const share = this.allBytes === 0 ? 0 : Math.min(1, this.bytes / this.allBytes);
    this.onProgress({ stage: this.stage, share: share * shareOfFiles });
  }
}
