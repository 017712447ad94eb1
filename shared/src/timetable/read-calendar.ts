import type { CalendarDate } from '../lib/instant';
import { problemsOf, type DraftService, type RowReader, type TimetableDraft } from './draft';
import { weekdayColumns, type FeedFile } from './feed-files';
import { parseFeedDate } from './service-day';

function dateReader(draft: TimetableDraft, file: FeedFile) {
  const { refuse } = problemsOf(draft, file);
  return (text: string, column: string, line: number): CalendarDate | null => {
    const date = parseFeedDate(text);
    if (date === null) refuse(line, 'date.unreadable', `“${text}” in ${column} is not a date like 20260308.`);
    return date;
  };
}

/** The weekly rule of each service. */
export function calendarReader(draft: TimetableDraft): RowReader {
  const { refuse, leaveOut } = problemsOf(draft, 'calendar.txt');
  const readDate = dateReader(draft, 'calendar.txt');
  return (field, line) => {
    const serviceId = field('service_id');
    const from = readDate(field('start_date'), 'start_date', line);
    const to = readDate(field('end_date'), 'end_date', line);
    const flags = weekdayColumns.map((column) => field(column));
    const odd = flags.findIndex((flag) => flag !== '0' && flag !== '1');
    if (odd >= 0) {
      refuse(line, 'day.unreadable', `“${flags[odd]}” in ${weekdayColumns[odd]} is neither 0 nor 1.`);
      return;
    }
    if (draft.services.has(serviceId)) {
      leaveOut(line, 'service.twice', `Service “${serviceId}” stands above already. This row is left out.`);
      return;
    }
    const weekdays = flags.map((flag) => flag === '1');
    draft.services.set(serviceId, { ...emptyService(serviceId, 'calendar.txt', line), weekdays, from, to });
  };
}

function emptyService(serviceId: string, file: FeedFile, line: number): DraftService {
  const weekdays = weekdayColumns.map(() => false);
  return { serviceId, weekdays, from: null, to: null, added: new Set(), removed: new Set(), file, line };
}

/** Days added to a service and days taken away. A file may name all its days here and have no weekly rule. */
export function calendarDateReader(draft: TimetableDraft): RowReader {
  const { leaveOut, note } = problemsOf(draft, 'calendar_dates.txt');
  const readDate = dateReader(draft, 'calendar_dates.txt');
  return (field, line) => {
    const serviceId = field('service_id');
    const date = readDate(field('date'), 'date', line);
    if (date === null) return;
    const type = field('exception_type');
    if (type !== '1' && type !== '2') {
      leaveOut(
        line,
        'day.kind_unknown',
        `“${type}” is neither 1 (added) nor 2 (removed). The day is left out.`,
      );
      return;
    }
    const service = draft.services.get(serviceId) ?? emptyService(serviceId, 'calendar_dates.txt', line);
    draft.services.set(serviceId, service);
    if ((type === '1' ? service.removed : service.added).has(date)) {
      note(line, 'day.twice', `Service “${serviceId}” is both added and removed on ${date}. It is removed.`);
    }
    (type === '1' ? service.added : service.removed).add(date);
  };
}
