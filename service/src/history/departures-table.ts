import { dateSchema, millisecondsInHour, parseInstant, type Instant } from '@stubpost/shared';
import type { RowProblem } from './history-import.entity';

/** One row of a table of past departures, read and checked. */
export interface PastDeparture {
  line: number;
  terminalCode: string;
  serviceDate: string;
  train: string;
  set: string | null;
  track: string | null;
  scheduledArrivalAt: Instant | null;
  actualArrivalAt: Instant | null;
  scheduledDepartureAt: Instant;
  actualDepartureAt: Instant | null;
  annulled: boolean;
}

/** Columns that a table must have, and those that it may have; in any order. */
export const requiredColumns = [
  'serviceDate',
  'terminal',
  'train',
  'scheduledDepartureAt',
  'actualDepartureAt',
] as const;
export const optionalColumns = ['set', 'track', 'scheduledArrivalAt', 'actualArrivalAt', 'annulled'] as const;

/** A service date and a time that lie further apart than this do not belong together: a service day ends within 48 h. */
const farthestFromServiceDate = 60 * millisecondsInHour;

type Fields = Readonly<Record<string, string>>;

/** What is wrong with a header, in words; nothing when it will do. */
export function problemsOfHeader(columns: readonly string[]): RowProblem[] {
  const known: readonly string[] = [...requiredColumns, ...optionalColumns];
  const missing = requiredColumns.filter((column) => !columns.includes(column));
  const unknown = columns.filter((column) => !known.includes(column));
  const twice = columns.filter((column, index) => columns.indexOf(column) !== index);
  return [
    ...missing.map((column) => ({ line: 1, message: `the column ${column} is missing` })),
    ...unknown.map((column) => ({ line: 1, message: `the column "${column}" is not known` })),
    ...twice.map((column) => ({ line: 1, message: `the column ${column} stands twice` })),
  ];
}

function readInstant(fields: Fields, column: string, problems: string[]): Instant | null {
  const text = fields[column] ?? '';
  if (text === '') return null;
  const instant = parseInstant(text);
  if (instant === null)
    problems.push(`${column} "${text}" is not a time with a zone, such as 2026-03-03T22:40:00Z`);
  return instant;
}

function readAnnulled(fields: Fields, problems: string[]): boolean {
  const text = (fields['annulled'] ?? '').toLowerCase();
  if (text !== '' && text !== 'true' && text !== 'false')
    problems.push(`annulled "${text}" is neither true nor false`);
  return text === 'true';
}

/** Reads one row; what is wrong with it comes back in words and the row is then null. */
export function readDeparture(
  fields: Fields,
  line: number,
): { row: PastDeparture | null; problems: RowProblem[] } {
  const problems: string[] = [];
  const filled = (column: string): string => {
    const text = fields[column] ?? '';
    if (text === '') problems.push(`${column} is empty`);
    return text;
  };
  const serviceDate = filled('serviceDate');
  if (serviceDate !== '' && !dateSchema.safeParse(serviceDate).success)
    problems.push(`serviceDate "${serviceDate}" is not a date such as 2026-03-03`);
  const terminalCode = filled('terminal');
  const train = filled('train');
  if (train.length > 20) problems.push('train is longer than 20 characters');
  filled('scheduledDepartureAt');
  const scheduledDepartureAt = readInstant(fields, 'scheduledDepartureAt', problems);
  const row = {
    line,
    terminalCode,
    serviceDate,
    train,
    set: fields['set'] || null,
    track: fields['track'] || null,
    scheduledArrivalAt: readInstant(fields, 'scheduledArrivalAt', problems),
    actualArrivalAt: readInstant(fields, 'actualArrivalAt', problems),
    actualDepartureAt: readInstant(fields, 'actualDepartureAt', problems),
    annulled: readAnnulled(fields, problems),
  };
  if (row.annulled && row.actualDepartureAt !== null)
    problems.push('an annulled train has no actualDepartureAt');
  if (problems.length === 0 && scheduledDepartureAt !== null) {
    const apart = Math.abs(scheduledDepartureAt - Date.parse(`${serviceDate}T12:00:00Z`));
    if (apart > farthestFromServiceDate)
      problems.push(
        `scheduledDepartureAt ${fields['scheduledDepartureAt']} is far from its service date ${serviceDate}`,
      );
  }
  if (problems.length > 0 || scheduledDepartureAt === null)
    return { row: null, problems: problems.map((message) => ({ line, message })) };
  return { row: { ...row, scheduledDepartureAt }, problems: [] };
}

/** Names a departure: the same one twice is a mistake in the table. */
export function keyOfDeparture(
  row: Pick<PastDeparture, 'terminalCode' | 'serviceDate' | 'train' | 'scheduledDepartureAt'>,
): string {
  return [row.terminalCode, row.serviceDate, row.train, row.scheduledDepartureAt].join('|');
}
