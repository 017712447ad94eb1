import { HTMLTable } from '@blueprintjs/core';
import { useQuery } from '@tanstack/react-query';
import { useState } from 'react';
import { Link } from 'react-router-dom';
import { ErrorState, LoadingRows } from '../../../components/page-states';
import { formatClock, formatLateness, formatServiceDate, formatTime } from '../../../lib/time-display';
import { departuresFile, departuresQuery } from '../api/on-time-queries';
import { formatCount } from '../model/figures-text';
import type { HistorySearch } from '../model/history-search';
import styles from './history.module.css';

/** Rows drawn at once; the file holds them all. */
const mostRowsShown = 500;

const verdict = (onTime: boolean | null): string =>
  onTime === null ? 'not counted' : onTime ? 'on time' : 'late';

function Rows({ terminal, zone, search }: { terminal: string; zone: string; search: HistorySearch }) {
  const { data, error, refetch } = useQuery(departuresQuery(terminal, search));
  if (error !== null) return <ErrorState error={error} onRetry={() => void refetch()} />;
  if (data === undefined) return <LoadingRows what="departures" onRetry={() => void refetch()} />;
  return (
    <>
      {data.length > mostRowsShown && (
        <p className="muted">
          The last {formatCount(mostRowsShown)} of {formatCount(data.length)} are shown; the file holds all.
        </p>
      )}
      <div className={styles.rows} tabIndex={0} role="region" aria-label="Departures behind the figures">
        <HTMLTable className="sp-table">
          <thead>
            <tr>
              {[
                'Service date',
                'Train',
                'Track',
                'Set',
                'Scheduled',
                'Left',
                'Delay',
                'Counts as',
                'From',
              ].map((name) => (
                <th key={name} scope="col">
                  {name}
                </th>
              ))}
            </tr>
          </thead>
          <tbody>
            {data
              .slice(-mostRowsShown)
              .reverse()
              .map((row) => (
                <tr key={`${row.serviceDate} ${row.train} ${row.scheduledDepartureAt}`}>
                  <td className="nowrap">{formatServiceDate(row.serviceDate)}</td>
                  <th scope="row">
                    {row.turnId === null ? row.train : <Link to={`/turns/${row.turnId}`}>{row.train}</Link>}
                  </th>
                  <td>{row.track ?? '–'}</td>
                  <td>{row.set ?? '–'}</td>
                  <td>{formatTime(row.scheduledDepartureAt, zone)}</td>
                  <td>
                    {row.actualDepartureAt === null
                      ? row.annulled
                        ? 'annulled'
                        : 'no record'
                      : formatClock(row.actualDepartureAt, zone)}
                  </td>
                  <td>{row.delaySeconds === null ? '–' : formatLateness(row.delaySeconds)}</td>
                  <td>{verdict(row.onTime)}</td>
                  <td>{row.origin === 'recorded' ? 'the record' : 'a loaded table'}</td>
                </tr>
              ))}
          </tbody>
        </HTMLTable>
      </div>
    </>
  );
}

/** The departures behind the figures: shown when asked for, and as a file. */
export function DeparturesPanel(props: { terminal: string; zone: string; search: HistorySearch }) {
  const [isOpen, setOpen] = useState(false);
  return (
    <section className="sp-panel" aria-labelledby="rows">
      <header>
        <h2 id="rows">Departures behind the figures</h2>
        <a href={departuresFile(props.terminal, props.search)} download>
          Departures as CSV
        </a>
      </header>
      <details className={styles.twin} onToggle={(event) => setOpen(event.currentTarget.open)}>
        <summary>Show the departures</summary>
        {isOpen && <Rows {...props} />}
      </details>
    </section>
  );
}
