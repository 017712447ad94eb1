import { useQuery } from '@tanstack/react-query';
import { Link, useNavigate, useParams } from 'react-router-dom';
import { PageHeader } from '../../components/page-header';
import { EmptyState, LoadingRows } from '../../components/page-states';
import { OneTimeLinkForm } from '../../features/set-up/components/one-time-link-form';
import { linkQuery } from '../../features/set-up/api/one-time-link';
import { errorText } from '../../lib/error-texts';
import { homeOf } from '../../lib/home';
import styles from './enter.module.css';

/** What a one-time link opens: a password of one's own. */
export function LinkPage() {
  const { token = '' } = useParams();
  const navigate = useNavigate();
  const { data, error } = useQuery(linkQuery(token));
  return (
    <div className={styles.narrow}>
      <PageHeader title="Set your password" />
      {error !== null && (
        <EmptyState words={errorText(error)}>
          <Link to="/sign-in">To the sign-in page</Link>
        </EmptyState>
      )}
      {data === undefined && error === null && <LoadingRows what="the link" rows={3} />}
      {data !== undefined && (
        <OneTimeLinkForm
          token={token}
          link={data}
          onSet={(person) => void navigate(homeOf(person), { replace: true })}
        />
      )}
    </div>
  );
}
