import type { CalendarDate, WireTimetableHead } from '@stubpost/shared';
import { Link } from 'react-router-dom';
import { formatStamp } from '../../../lib/time-display';
import { formatBytes, formatDays, standingWords } from '../model/timetable-words';
import styles from './timetables.module.css';

/** Everything ever brought in, the newest first. */
export function AllTimetables({
  heads,
  today,
  zone,
}: {
  heads: readonly WireTimetableHead[];
  today: CalendarDate;
  zone: string;
}) {
  return (
    <section className="sp-panel" aria-labelledby="all-timetables">
      <header>
        <h2 id="all-timetables">All timetables</h2>
      </header>
      <div
        className={`sp-table-scroll ${styles.all}`}
        tabIndex={0}
        role="group"
        aria-label="All timetables, table"
      >
        <table className="sp-table">
          <thead>
            <tr>
              <th scope="col">File</th>
              <th scope="col">Stands</th>
              <th scope="col">Days</th>
              <th scope="col">Brought in</th>
              <th scope="col">By</th>
              <th scope="col" className="number">
                Size
              </th>
            </tr>
          </thead>
          <tbody>
            {heads.map((head) => (
              <tr key={head.id}>
                <th scope="row">
                  <Link to={`/timetables/${head.id}`}>{head.fileName}</Link>
                </th>
                <td>{standingWords(head, today)}</td>
                <td>{head.firstDate === null ? '–' : formatDays(head.firstDate, head.lastDate)}</td>
                <td className="nowrap">{formatStamp(head.uploadedAt, zone)}</td>
                <td>{head.uploadedBy ?? '–'}</td>
                <td className="number nowrap">{formatBytes(head.fileBytes)}</td>
              </tr>
            ))}
          </tbody>
        </table>
      </div>
    </section>
  );
}
