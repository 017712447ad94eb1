import type { SignedInPerson } from '@stubpost/shared';
import { useQuery } from '@tanstack/react-query';
import { Navigate, useNavigate, useSearchParams } from 'react-router-dom';
import { SafetyCaution } from '../../components/caution';
import { PageHeader } from '../../components/page-header';
import { DemoPeople } from '../../features/sign-in/components/demo-people';
import { SignInWays } from '../../features/sign-in/components/sign-in-ways';
import { TurnFigure } from '../../features/sign-in/components/turn-figure';
import { homeOf } from '../../lib/home';
import { demoQuery, setupQuery } from '../../lib/service-facts';
import { useSession } from '../../lib/session';
import styles from './enter.module.css';

/** An address inside the app to go back to, or nothing: never one of another site. */
export function safeBack(back: string | null): string | null {
  return back !== null && /^\/(?![/\\])/.test(back) ? back : null;
}

/** Who are you, and what is this? */
export function SignInPage() {
  const { person } = useSession();
  const { data: demo } = useQuery(demoQuery);
  const { data: setup } = useQuery(setupQuery);
  const navigate = useNavigate();
  const back = safeBack(useSearchParams()[0].get('back'));
  const goOn = (signedIn: SignedInPerson): void => void navigate(back ?? homeOf(signedIn), { replace: true });

  if (setup?.needed === true) return <Navigate to="/welcome" replace />;
  if (person !== null) return <Navigate to={back ?? homeOf(person)} replace />;
  return (
    <div className={styles.enter}>
      <PageHeader title="Sign in" hidden />
      <section className={styles.about}>
        <p className={styles.claim}>See each turn while something can still be done about it.</p>
        <p className={styles.lede}>
          A train stands at the bumping post. It is secured, its brakes are tested, its ends change, riders
          board, and it must leave on time. Stubpost shows every step as it is recorded, keeps the record, and
          says early which departure will not be made.
        </p>
        <TurnFigure />
        <SafetyCaution />
      </section>
      <div className={styles.ways}>
        <SignInWays onSignedIn={goOn} />
        {demo?.demo === true && <DemoPeople demo={demo} onSignedIn={goOn} />}
      </div>
    </div>
  );
}
