import type { WireTerminal } from '@stubpost/shared';
import { Link, Outlet, useLocation, useMatch } from 'react-router-dom';
import { Clock } from '../components/clock';
import { PartBoundary } from '../components/part-boundary';
import { PostMark } from '../components/post-mark';
import { errorText } from '../lib/error-texts';
import { LiveProvider } from '../lib/live';
import { lockPhone } from '../lib/lock/phone-lock';
import { usePerson } from '../lib/session';
import { useTerminalChoice } from '../lib/terminal-choice';
import { DemoLabel } from './demo-label';
import { NewerVersion } from './newer-version';
import { NotEncrypted } from './not-encrypted';
import { PhoneClock } from './phone-clock';
import { OtherZone } from './other-zone';
import { useSignOut } from './sign-out';
import styles from './phone-shell.module.css';

const ownZone = Intl.DateTimeFormat().resolvedOptions().timeZone;

function PhoneHead({ zone }: { zone: string }) {
  const isMyTurns = useMatch('/my') !== null;
  return (
    <header className={styles.head}>
      {isMyTurns ? (
        <span className={styles.brand}>
          <PostMark size={26} />
          Stubpost
        </span>
      ) : (
        <Link to="/my">
          <span aria-hidden="true" className={styles.back} />
          My turns
        </Link>
      )}
      <DemoLabel short />
      <Clock zone={zone} className={styles.clock ?? ''} />
    </header>
  );
}

function PhoneFoot({ terminal }: { terminal: WireTerminal | null }) {
  const signOut = useSignOut();
  const person = usePerson();
  return (
    <footer className={styles.foot}>
      <Link to="/help">Help</Link>
      <Link to="/board">Board</Link>
      <Link to="/me">Me</Link>
      <button type="button" onClick={() => lockPhone(person.id)}>
        Lock, other person
      </button>
      <button type="button" onClick={() => signOut.mutate()}>
        Sign out
      </button>
      {signOut.isError && <p role="alert">{errorText(signOut.error)} What you recorded is kept.</p>}
      {terminal !== null && <OtherZone terminal={terminal} />}
    </footer>
  );
}

/** Bars of the crew's phone: the way back and the clock on top; everything else belongs to the page. */
export function PhoneShell() {
  const { terminal } = useTerminalChoice();
  const { pathname } = useLocation();
  const zone = terminal?.zone ?? ownZone;
  return (
    <LiveProvider terminal={terminal?.code ?? null}>
      <div className={`${styles.phone} phone`}>
        <NotEncrypted />
        <PhoneHead zone={zone} />
        <PhoneClock />
        <NewerVersion />
        <main className={styles.main} id="page">
          <PartBoundary key={pathname} part="This page" rest="What is on this phone is kept.">
            <Outlet />
          </PartBoundary>
        </main>
        <PhoneFoot terminal={terminal} />
      </div>
    </LiveProvider>
  );
}
