import { FEED_FILES, type FeedTables } from '@stubpost/shared';
import { demoTimetableFiles, type ServicePeriod } from '../railroad/timetable-files';

/** The demo's files as tables in memory; they hold neither quotes nor commas inside a field. */
export function demoTables(period: ServicePeriod): FeedTables {
  const files = demoTimetableFiles(period);
  const tables: FeedTables = {};
  for (const file of FEED_FILES) {
    const text = files[file];
    if (text === undefined) continue;
    const [header = [], ...rows] = text
      .trimEnd()
      .split('\n')
      .map((line) => line.split(','));
    tables[file] = { header, rows: rows.map((cells, index) => ({ line: index + 2, cells })) };
  }
  return tables;
}
