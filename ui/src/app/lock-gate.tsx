import { Outlet } from 'react-router-dom';
import { usePhoneLock } from '../lib/lock/phone-lock';
import { usePerson } from '../lib/session';
import { LockScreen } from './lock-screen';
import { PhoneKeeper } from './phone-keeper';

/**
 * Stands before the pages of people who work on the phone: keeps their entries on the way, and locks after ten minutes
 * without a touch. What was on the page is taken away, not covered; entries go on being sent.
 */
export function LockGate() {
  const person = usePerson();
  const isLocked = usePhoneLock(person.id, true);
  return (
    <>
      <PhoneKeeper />
      {isLocked ? <LockScreen person={person} /> : <Outlet />}
    </>
  );
}
