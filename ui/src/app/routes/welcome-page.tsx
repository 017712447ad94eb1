import { useQuery } from '@tanstack/react-query';
import { Navigate, useNavigate } from 'react-router-dom';
import { PageHeader } from '../../components/page-header';
import { ErrorState, LoadingRows } from '../../components/page-states';
import { FirstAdministratorForm } from '../../features/set-up/components/first-administrator-form';
import { homeOf } from '../../lib/home';
import { setupQuery } from '../../lib/service-facts';
import styles from './enter.module.css';

/** First page of an empty installation. */
export function WelcomePage() {
  const { data, error, refetch } = useQuery(setupQuery);
  const navigate = useNavigate();
  if (data?.needed === false) return <Navigate to="/" replace />;
  return (
    <div className={styles.narrow}>
      <PageHeader title="Set up Stubpost" />
      <p>
        This installation is empty. The first administrator adds people and terminals, and imports the
        timetable. What happens at the trains is recorded by others: the administrator records nothing.
      </p>
      {error !== null && <ErrorState error={error} onRetry={() => void refetch()} />}
      {data === undefined && error === null && <LoadingRows what="the installation" rows={3} />}
      {data?.needed === true && (
        <FirstAdministratorForm onMade={(person) => void navigate(homeOf(person), { replace: true })} />
      )}
    </div>
  );
}
