import { SignedInAs, useSession } from '../lib/session';
import { DeskShell } from './desk-shell';
import { homeOf } from '../lib/home';
import { PhoneShell } from './phone-shell';
import { PlainShell } from './plain-shell';

/** Pages that stand in whichever bars the reader is used to: help, keys, accessibility, own sign-in. */
export function AnyShell() {
  const { person, state } = useSession();
  if (state !== 'signed-in' || person === null) return <PlainShell />;
  return <SignedInAs person={person}>{homeOf(person) === '/my' ? <PhoneShell /> : <DeskShell />}</SignedInAs>;
}
