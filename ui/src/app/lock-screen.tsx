import { pinLongest, type SignedInPerson } from '@stubpost/shared';
import { useQuery, useQueryClient } from '@tanstack/react-query';
import { useRef, useState, type FormEvent } from 'react';
import { BigField, PinPad } from '../components/pin-pad';
import { PostMark } from '../components/post-mark';
import { errorText } from '../lib/error-texts';
import { unlockPhone } from '../lib/lock/phone-lock';
import { tryUnlock, unlockKind, type UnlockOutcome } from '../lib/lock/unlock-check';
import { outboxOf } from '../lib/outbox/use-outbox';
import { demoQuery } from '../lib/service-facts';
import { readDeviceClock } from '../lib/use-now';
import styles from './lock-screen.module.css';
import { useSignOut } from './sign-out';

/** The phone is locked: its person opens it, or somebody else takes it. Shows nothing of what is on it. */
export function LockScreen({ person }: { person: SignedInPerson }) {
  const kind = unlockKind(person.id);
  const unsent = outboxOf(useQueryClient(), person.id).getState().waiting.length;
  return (
    <div className={`${styles.lock} phone`}>
      <header className={styles.head}>
        <PostMark size={26} />
        <b>Stubpost</b>
      </header>
      <main className={styles.main}>
        <div>
          <h1>Locked</h1>
          <p>
            {person.name} is signed in.{' '}
            {unsent === 0 ? 'Nothing waits to be sent.' : 'What waits to be sent goes by itself.'}
          </p>
        </div>
        {kind === null ? <WithoutCheck /> : <UnlockForm person={person} isPin={kind === 'pin'} />}
        <OtherPerson />
      </main>
    </div>
  );
}

function UnlockForm({ person, isPin }: { person: SignedInPerson; isPin: boolean }) {
  const [secret, setSecret] = useState('');
  const [outcome, setOutcome] = useState<UnlockOutcome | null>(null);
  const [isBusy, setBusy] = useState(false);
  const field = useRef<HTMLInputElement>(null);
  const submit = (event: FormEvent): void => {
    event.preventDefault();
    setBusy(true);
    void tryUnlock(person.id, secret, readDeviceClock()).then((result) => {
      setBusy(false);
      setSecret('');
      setOutcome(result);
      if (result.kind === 'open') unlockPhone();
      else field.current?.focus();
    });
  };
  if (outcome?.kind === 'sign-in')
    return <p role="alert">Too many tries. Sign in again; what you recorded is kept.</p>;
  return (
    <form className={styles.form} onSubmit={submit}>
      {outcome !== null && outcome.kind !== 'open' && <p role="alert">{outcomeWords(outcome, isPin)}</p>}
      <BigField
        label={isPin ? 'PIN' : 'Password'}
        type="password"
        value={secret}
        onChange={setSecret}
        autoComplete="current-password"
        inputMode={isPin ? 'numeric' : 'text'}
        inputRef={field}
      />
      {isPin && <PinPad value={secret} onChange={setSecret} longest={pinLongest} />}
      <button type="submit" className={styles.bar} disabled={isBusy}>
        Unlock
      </button>
    </form>
  );
}

function outcomeWords(outcome: Exclude<UnlockOutcome, { kind: 'open' | 'sign-in' }>, isPin: boolean): string {
  if (outcome.kind === 'wait') return `Try again in ${outcome.seconds} s.`;
  return `That is not the ${isPin ? 'PIN' : 'password'}. ${outcome.triesLeft} tries left.`;
}

/** Nothing on this phone knows the person's secret. In a demo nobody has one; elsewhere signing in again is the way. */
function WithoutCheck() {
  const { data: demo } = useQuery(demoQuery);
  if (demo?.demo !== true)
    return <p>Sign in again to go on. What you recorded is kept and goes when you are back.</p>;
  return (
    <button type="button" className={styles.bar} onClick={unlockPhone}>
      Go on: this is a demo
    </button>
  );
}

/** Ends the session, so that the next one can sign in. What waits stays on the phone and stays its writer's. */
function OtherPerson() {
  const signOut = useSignOut();
  return (
    <div className={styles.form}>
      {signOut.isError && (
        <p role="alert">
          {errorText(signOut.error)} Another person can sign in only with a signal; what you recorded is kept.
        </p>
      )}
      <button
        type="button"
        className={styles.other}
        disabled={signOut.isPending}
        onClick={() => signOut.mutate()}
      >
        Sign in again, or as another person
      </button>
    </div>
  );
}
