import type { CalendarDate, WireTimetableHead } from '@stubpost/shared';
import { Link } from 'react-router-dom';
import { shortName, standingWords } from '../model/timetable-words';
import styles from './timetables.module.css';

/** Timetables named beside the heading; the rest stands in the list at the end of the page. */
const namedViews = 4;

/** The newest timetables, each with how it stands. */
export function TimetableViews({
  heads,
  shownId,
  today,
}: {
  heads: readonly WireTimetableHead[];
  shownId: string | undefined;
  today: CalendarDate;
}) {
  const isWorthNaming = (head: WireTimetableHead): boolean =>
    head.id === shownId || head.state === 'active' || head.state === 'ready' || head.state === 'reading';
  return (
    <nav className={styles.views} aria-label="Timetables">
      {heads
        .filter(isWorthNaming)
        .slice(0, namedViews)
        .map((head) => (
          <Link
            key={head.id}
            to={`/timetables/${head.id}`}
            {...(head.id === shownId ? { 'aria-current': 'page' as const } : {})}
          >
            {shortName(head.fileName)}, {standingWords(head, today)}
          </Link>
        ))}
    </nav>
  );
}
