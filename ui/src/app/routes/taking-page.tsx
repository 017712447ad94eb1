import { useQuery } from '@tanstack/react-query';
import { Link, useParams } from 'react-router-dom';
import { PageHeader } from '../../components/page-header';
import { EmptyState, LoadingRows } from '../../components/page-states';
import { takingQuery } from '../../features/taking/api/taking';
import { TakingPanel } from '../../features/taking/components/taking-panel';
import { errorText } from '../../lib/error-texts';
import styles from './enter.module.css';

/** What the link in a message opens: the alert and one button. Nobody has to sign in for it. */
export function TakingPage() {
  const { token = '' } = useParams();
  const { data, error } = useQuery(takingQuery(token));
  return (
    <div className={styles.narrow}>
      <PageHeader title="Take an alert" />
      {error !== null && (
        <EmptyState words={errorText(error)}>
          <Link to="/alerts">To the alerts</Link>
        </EmptyState>
      )}
      {data === undefined && error === null && <LoadingRows what="the alert" rows={4} />}
      {data !== undefined && <TakingPanel token={token} taking={data} />}
    </div>
  );
}
