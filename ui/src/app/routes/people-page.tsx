import { useQuery } from '@tanstack/react-query';
import { Link, useSearchParams } from 'react-router-dom';
import { PageHeader } from '../../components/page-header';
import { ErrorState, LoadingRows } from '../../components/page-states';
import { AddPerson } from '../../features/people/components/add-person';
import { EditPerson } from '../../features/people/components/edit-person';
import { PeopleTable } from '../../features/people/components/people-table';
import { PersonAccess } from '../../features/people/components/person-access';
import { peopleQuery } from '../../features/people/api/people';
import { LeaveDemo } from '../../features/set-up/components/leave-demo';
import { demoQuery } from '../../lib/service-facts';
import { useMay } from '../../lib/session';
import { terminalsQuery, useTerminalChoice } from '../../lib/terminal-choice';
import styles from './people-page.module.css';

/** Who may sign in, and what for. */
export function PeoplePage() {
  const { data: people, error, refetch } = useQuery(peopleQuery);
  const { data: terminals = [] } = useQuery(terminalsQuery);
  const { terminal } = useTerminalChoice();
  const chosenId = useSearchParams()[0].get('person');
  const zone = terminal?.zone ?? Intl.DateTimeFormat().resolvedOptions().timeZone;
  const { data: demo } = useQuery(demoQuery);
  const mayLeave = useMay('demo.leave') && demo?.demo === true;
  const chosen = people?.find(({ id }) => id === chosenId);
  return (
    <div className="sp-page">
      <PageHeader title="People">{chosen !== undefined && <Link to="/people">Add a person</Link>}</PageHeader>
      <div className={styles.split}>
        <section className="sp-panel" aria-label="Everybody with a sign-in">
          {error !== null && <ErrorState error={error} onRetry={() => void refetch()} />}
          {people === undefined && error === null && (
            <LoadingRows what="people" onRetry={() => void refetch()} />
          )}
          {people !== undefined && <PeopleTable people={people} chosenId={chosenId} />}
        </section>
        <div className={styles.side}>
          {chosen === undefined ? (
            <>
              <AddPerson terminals={terminals} zone={zone} />
              {mayLeave && <LeaveDemo onEmpty={() => window.location.assign('/welcome')} />}
            </>
          ) : (
            <>
              <EditPerson key={`edit ${chosen.id}`} person={chosen} terminals={terminals} />
              <PersonAccess key={`access ${chosen.id}`} person={chosen} zone={zone} />
            </>
          )}
        </div>
      </div>
    </div>
  );
}
