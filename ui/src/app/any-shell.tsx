import { lazy, Suspense } from 'react';
import { homeOf } from '../lib/home';
import { SignedInAs, useSession } from '../lib/session';
import { PhoneShell } from './phone-shell';
import { PlainShell } from './plain-shell';
import { PageOnItsWay } from './route-fault';

const DeskShell = lazy(() => import('./desk-shell').then(({ DeskShell: shell }) => ({ default: shell })));

/** Pages that stand in whichever bars the reader is used to: help, keys, accessibility, own sign-in. */
export function AnyShell() {
  const { person } = useSession();
  if (person === null) return <PlainShell />;
  if (homeOf(person) === '/my') {
    return (
      <SignedInAs person={person}>
        <PhoneShell />
      </SignedInAs>
    );
  }
  return (
    <SignedInAs person={person}>
      <Suspense fallback={<PageOnItsWay />}>
        <DeskShell />
      </Suspense>
    </SignedInAs>
  );
}
