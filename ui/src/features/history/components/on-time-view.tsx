import { keepPreviousData, useQuery } from '@tanstack/react-query';
import type { OnTimeAnswer } from '@stubpost/shared';
import { EmptyState, ErrorState, LoadingRows } from '../../../components/page-states';
import { formatServiceDateWithYear } from '../../../lib/time-display';
import { onTimeQuery } from '../api/on-time-queries';
import type { HistorySearch } from '../model/history-search';
import { GroupsTable } from './groups-table';
import { Headline } from './headline';
import { ShareColumns } from './share-columns';
import { ShareRows } from './share-rows';
import styles from './history.module.css';

function useOnTime(terminal: string, search: HistorySearch, groupBy: 'hour' | 'weekday') {
  return useQuery({ ...onTimeQuery(terminal, search, groupBy), placeholderData: keepPreviousData });
}

function HourPanel({ answer }: { answer: OnTimeAnswer }) {
  return (
    <section className="sp-panel" aria-labelledby="by-hour">
      <h2 id="by-hour">By hour of departure, share on time with 95 % interval</h2>
      <ShareColumns all={answer} groups={answer.groups} unit="hour" />
      <footer>
        In ink: the whole interval lies below the share of all hours. Hollow: fewer than 30 departures. Rule:{' '}
        {answer.rule.name}. The scale does not start at 0.
      </footer>
    </section>
  );
}

/** Headline, hours, weekdays and their tables, all by one rule. */
export function OnTimeView({ terminal, search }: { terminal: string; search: HistorySearch }) {
  const hours = useOnTime(terminal, search, 'hour');
  const weekdays = useOnTime(terminal, search, 'weekday');
  const error = hours.error ?? weekdays.error;
  const retry = (): void => void Promise.all([hours.refetch(), weekdays.refetch()]);
  if (error !== null) return <ErrorState error={error} onRetry={retry} />;
  if (hours.data === undefined || weekdays.data === undefined)
    return <LoadingRows what="on-time figures" rows={8} rowHeight={60} onRetry={retry} />;
  if (hours.data.scheduled === 0) {
    const range = `${formatServiceDateWithYear(search.from)} to ${formatServiceDateWithYear(search.to)}`;
    return <EmptyState words={`No departures at this terminal from ${range}.`} />;
  }
  const isStale = hours.isPlaceholderData || weekdays.isPlaceholderData;
  return (
    <div className={isStale ? styles.loading : undefined} aria-busy={isStale}>
      <div className={styles.stack}>
        <div className={styles.grid}>
          <Headline answer={hours.data} />
          <HourPanel answer={hours.data} />
        </div>
        <div className={styles.grid}>
          <section className="sp-panel" aria-labelledby="by-weekday">
            <h2 id="by-weekday">By weekday of service</h2>
            <ShareRows all={weekdays.data} groups={weekdays.data.groups} />
            <footer>Rule: {weekdays.data.rule.name}. The scale does not start at 0.</footer>
          </section>
          <section className="sp-panel" aria-labelledby="weekday-table">
            <h2 id="weekday-table">Table: by weekday</h2>
            <GroupsTable
              caption="On time by weekday"
              head="Weekday"
              all={weekdays.data}
              groups={weekdays.data.groups}
            />
          </section>
        </div>
        <section className="sp-panel" aria-labelledby="hour-table">
          <h2 id="hour-table">Table: by hour of departure</h2>
          <GroupsTable
            caption="On time by hour of departure"
            head="Hour"
            all={hours.data}
            groups={hours.data.groups}
          />
        </section>
      </div>
    </div>
  );
}
