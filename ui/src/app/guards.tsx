import { rolesWith, may, type Permission } from '@stubpost/shared';
import { useQuery } from '@tanstack/react-query';
import { Navigate, Outlet, useLocation } from 'react-router-dom';
import { EmptyState, ErrorState, LoadingRows } from '../components/page-states';
import { PageHeader } from '../components/page-header';
import { setupQuery } from '../lib/service-facts';
import { sessionQuery, SignedInAs, useSession } from '../lib/session';
import { useTerminalChoice } from '../lib/terminal-choice';
import { homeOf } from '../lib/home';
import { LockGate } from './lock-gate';
import { PlainShell } from './plain-shell';

function Waiting() {
  const { error, refetch } = useQuery(sessionQuery);
  return (
    <PlainShell>
      <div className="sp-page">
        {error === null ? (
          <LoadingRows what="your sign-in" rows={3} onRetry={() => void refetch()} />
        ) : (
          <ErrorState error={error} onRetry={() => void refetch()} />
        )}
      </div>
    </PlainShell>
  );
}

function ToSignIn() {
  const { pathname, search } = useLocation();
  const { data, isPending } = useQuery(setupQuery);
  if (isPending) return <Waiting />;
  if (data?.needed === true) return <Navigate to="/welcome" replace />;
  const back = pathname === '/' ? '' : `?back=${encodeURIComponent(pathname + search)}`;
  return <Navigate to={`/sign-in${back}`} replace />;
}

/** Lets on whoever is signed in, on a crew's phone past its lock; leads everybody else to the sign-in page and back again. */
export function SignedInOnly() {
  const { state, person } = useSession();
  const { pathname } = useLocation();
  if (person !== null) {
    return (
      <SignedInAs person={person}>
        {homeOf(person) === '/my' || pathname.startsWith('/my') ? <LockGate /> : <Outlet />}
      </SignedInAs>
    );
  }
  return state === 'signed-out' ? <ToSignIn /> : <Waiting />;
}

function listed(roles: readonly string[]): string {
  const last = roles.at(-1) ?? '';
  return roles.length < 2 ? last : `${roles.slice(0, -1).join(', ')} or ${last}`;
}

/** Shows a page to those who have the right, and to the others which roles have it. */
export function Permitted({ permission }: { permission: Permission }) {
  const { person } = useSession();
  if (person !== null && may(person, permission)) return <Outlet />;
  return (
    <div className="sp-page">
      <PageHeader title="Not for your roles" />
      <EmptyState
        words={`Only a person with the role ${listed(rolesWith(permission))} can open this page.`}
      />
    </div>
  );
}

/** The address without a page: on to the person's own. */
export function ToHome() {
  const { person } = useSession();
  return <Navigate to={person === null ? '/sign-in' : homeOf(person)} replace />;
}

/** `/board` without a terminal: on to the terminal this browser works at, if there is one. */
export function ToBoard() {
  const { terminal, isPending, error } = useTerminalChoice();
  if (terminal !== null) return <Navigate to={`/board/${terminal.code}`} replace />;
  return (
    <div className="sp-page">
      <PageHeader title="Board" />
      {isPending && <LoadingRows what="terminals" />}
      {error !== null && <ErrorState error={error} />}
      {!isPending && error === null && (
        <EmptyState words="No terminal yet. The administrator imports a timetable or adds a terminal." />
      )}
    </div>
  );
}
