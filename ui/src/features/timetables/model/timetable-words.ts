import type {
  CalendarDate,
  ProblemSeverity,
  TimetableState,
  WireTimetable,
  WireTimetableHead,
  WireTimetableSummary,
} from '@stubpost/shared';
import { formatServiceDate, formatServiceDateWithYear } from '../../../lib/time-display';

export const TIMETABLE_STATE_WORDS: Record<TimetableState, string> = {
  reading: 'being read',
  ready: 'ready',
  refused: 'refused',
  active: 'running',
  retired: 'has run',
};

export const SEVERITY_WORDS: Record<ProblemSeverity, string> = {
  refused: 'file refused',
  'left-out': 'left out',
  note: 'remark',
};

/** A count with its thousands set apart: "31,216". */
export function formatCount(count: number): string {
  return count.toLocaleString('en-US');
}

/** "1.8 MB", "70 KB". */
export function formatBytes(bytes: number): string {
  if (bytes >= 1_000_000) return `${(bytes / 1_000_000).toFixed(1)} MB`;
  return `${Math.max(1, Math.round(bytes / 1000))} KB`;
}

/** "Mon 9 Mar to Sun 7 Jun 2026"; both years where they differ. */
export function formatDays(from: CalendarDate | null, to: CalendarDate | null): string {
  if (from === null || to === null) return 'no day';
  const first =
    from.slice(0, 4) === to.slice(0, 4) ? formatServiceDate(from) : formatServiceDateWithYear(from);
  return `${first} to ${formatServiceDateWithYear(to)}`;
}

/** How a timetable stands, with its date where that matters: "running from Mon 9 Mar 2026". */
export function standingWords(head: WireTimetableHead, today: CalendarDate): string {
  if (head.state !== 'active' || head.activeFrom === null) return TIMETABLE_STATE_WORDS[head.state];
  if (head.activeFrom > today) return `from ${formatServiceDate(head.activeFrom)}`;
  if (head.activeUntil !== null) return `running until ${formatServiceDate(head.activeUntil)}`;
  return TIMETABLE_STATE_WORDS.active;
}

/** The name people give a file: without its ending. */
export function shortName(fileName: string): string {
  return fileName.replace(/\.zip$/i, '');
}

/** Which timetable the page opens with: one that is being read or waits for its day, else the running one. */
export function firstToShow(
  heads: readonly WireTimetableHead[],
  today: CalendarDate,
): WireTimetableHead | undefined {
  const [newest] = heads;
  const isWaiting = newest?.state === 'active' && newest.activeFrom !== null && newest.activeFrom > today;
  if (isWaiting || newest?.state === 'reading' || newest?.state === 'ready' || newest?.state === 'refused') {
    return newest;
  }
  return runningOn(heads, today) ?? newest;
}

/** The timetable that runs on a date. */
export function runningOn(
  heads: readonly WireTimetableHead[],
  date: CalendarDate,
): WireTimetableHead | undefined {
  return heads.find(
    ({ activeFrom, activeUntil }) =>
      activeFrom !== null && activeFrom <= date && (activeUntil === null || date <= activeUntil),
  );
}

/** A day to begin with: today where the timetable reaches so far, else its first day to come. */
export function suggestFrom(summary: WireTimetableSummary, today: CalendarDate): CalendarDate {
  return summary.firstDate !== null && summary.firstDate > today ? summary.firstDate : today;
}

/** What is odd about a day from which a timetable is to run, in words; null when nothing is. */
export function oddStart(
  summary: WireTimetableSummary,
  from: CalendarDate | null,
  today: CalendarDate,
): string | null {
  const { firstDate, lastDate } = summary;
  if (lastDate !== null && lastDate < today) {
    return `This timetable ended on ${formatServiceDateWithYear(lastDate)}. No turns will be opened.`;
  }
  if (from !== null && firstDate !== null && from < firstDate && firstDate > today) {
    return `Its first train runs on ${formatServiceDateWithYear(firstDate)}. Until then no turns will be opened.`;
  }
  return null;
}

/** How long reading took, in words: "in 3.4 s"; null while it goes on. */
export function readingTime({
  uploadedAt,
  readAt,
}: Pick<WireTimetable, 'uploadedAt' | 'readAt'>): string | null {
  if (readAt === null) return null;
  const seconds = (Date.parse(readAt) - Date.parse(uploadedAt)) / 1000;
  return seconds < 60 ? `in ${Math.max(0.1, seconds).toFixed(1)} s` : `in ${Math.round(seconds / 60)} min`;
}

/** Median layover in the table: whole minutes, halves rounded up; a dash where nothing turns. */
export function formatMedian(seconds: number | null): string {
  return seconds === null ? '–' : `${Math.round(seconds / 60)} min`;
}
