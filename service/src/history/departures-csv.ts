import type { DepartureRow } from '@stubpost/shared';

const columns = [
  'serviceDate',
  'terminal',
  'train',
  'track',
  'set',
  'scheduledDepartureAt',
  'actualDepartureAt',
  'annulled',
  'delaySeconds',
  'onTime',
  'origin',
] as const satisfies ReadonlyArray<keyof DepartureRow>;

/**
 * A cell of a CSV by RFC 4180. A text that a spreadsheet would take for a formula gets an apostrophe in front (OWASP,
 * CSV injection); numbers keep their sign.
 */
function cell(value: string | number | boolean | null): string {
  if (value === null) return '';
  if (typeof value !== 'string') return String(value);
  const harmless = /^[=+\-@\t\r]/.test(value) ? `'${value}` : value;
  return /[",\r\n]/.test(harmless) ? `"${harmless.replaceAll('"', '""')}"` : harmless;
}

/** The rows behind a figure as a CSV with a header; instants in ISO 8601 with `Z`, lines end with CR LF. */
export function toDeparturesCsv(rows: readonly DepartureRow[]): string {
  const lines = rows.map((row) => columns.map((column) => cell(row[column])).join(','));
  return [columns.join(','), ...lines].join('\r\n') + '\r\n';
}
