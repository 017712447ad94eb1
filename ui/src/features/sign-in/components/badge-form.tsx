import { pinLongest, pinShortest, type SignedInPerson } from '@stubpost/shared';
import { useRef, useState, type FormEvent } from 'react';
import { BigField, PinPad } from '../../../components/pin-pad';
import { isRefusal } from '../../../lib/api-client';
import { errorText } from '../../../lib/error-texts';
import { lockAfterMinutes } from '../../../lib/lock/phone-lock';
import { useOthersWaiting } from '../../../lib/outbox/use-others-waiting';
import { useSignIn } from '../api/sign-in';
import styles from './sign-in.module.css';

/** Badge with PIN or password, for phones that a crew shares. A wrong pair leaves the badge standing. */
export function BadgeForm({ onSignedIn }: { onSignedIn: (person: SignedInPerson) => void }) {
  const [badge, setBadge] = useState('');
  const [secret, setSecret] = useState('');
  const [hasPin, setHasPin] = useState(true);
  const secretField = useRef<HTMLInputElement>(null);
  const signIn = useSignIn(onSignedIn);
  const others = useOthersWaiting();

  const submit = (event: FormEvent): void => {
    event.preventDefault();
    const request = hasPin ? { badge, pin: secret } : { badge, password: secret };
    signIn.mutate(
      { with: 'password', request },
      {
        onError: () => {
          setSecret('');
          secretField.current?.focus();
        },
      },
    );
  };

  return (
    <form className={`sp-panel ${styles.badge}`} onSubmit={submit} aria-labelledby="sign-in-title">
      <header>
        <h2 id="sign-in-title">Sign in</h2>
      </header>
      {signIn.isError && (
        <p className="sp-problems" role="alert">
          {isRefusal(signIn.error, 'session.wrong_credentials')
            ? `Badge and ${hasPin ? 'PIN' : 'password'} do not fit together.`
            : errorText(signIn.error)}
        </p>
      )}
      <BigField label="Badge" value={badge} onChange={setBadge} autoComplete="username" maxLength={12} />
      <BigField
        key={hasPin ? 'pin' : 'password'}
        label={hasPin ? `PIN, ${pinShortest} to ${pinLongest} digits` : 'Password'}
        type="password"
        value={secret}
        onChange={setSecret}
        autoComplete="current-password"
        inputMode={hasPin ? 'numeric' : 'text'}
        inputRef={secretField}
      />
      {hasPin && <PinPad value={secret} onChange={setSecret} longest={pinLongest} />}
      <button type="submit" className={styles.bar} disabled={signIn.isPending}>
        Sign in
      </button>
      <button
        type="button"
        className={styles.other}
        onClick={() => {
          setHasPin(!hasPin);
          setSecret('');
        }}
      >
        {hasPin ? 'No PIN: use the password' : 'Use the PIN'}
      </button>
      <p>
        This phone locks after {lockAfterMinutes} minutes without a touch.
        {others > 0 && ` ${othersWords(others)}`}
      </p>
    </form>
  );
}

function othersWords(count: number): string {
  return count === 1
    ? '1 entry waits here to be sent; it stays its writer’s and goes when they sign in here.'
    : `${count} entries wait here to be sent; they stay their writer’s and go when that person signs in here.`;
}
