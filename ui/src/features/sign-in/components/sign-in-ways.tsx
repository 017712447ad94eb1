import type { SignedInPerson } from '@stubpost/shared';
import { useState } from 'react';
import { useMedia } from '../../../lib/use-media';
import { rememberWay, usualWay, type SignInWay } from '../model/sign-in-way';
import { BadgeForm } from './badge-form';
import { SignInForm } from './sign-in-form';
import styles from './sign-in.module.css';

/** The form for one way of signing in, and the way to the other. */
export function SignInWays({ onSignedIn }: { onSignedIn: (person: SignedInPerson) => void }) {
  const isPhone = useMedia('(max-width: 560px)');
  const [chosen, setChosen] = useState<SignInWay | null>(null);
  const way = chosen ?? usualWay(isPhone);
  const other: SignInWay = way === 'badge' ? 'email' : 'badge';
  const done = (person: SignedInPerson): void => {
    rememberWay(way);
    onSignedIn(person);
  };
  return (
    <div className={styles.ways}>
      {way === 'badge' ? <BadgeForm onSignedIn={done} /> : <SignInForm onSignedIn={done} />}
      <button type="button" className={styles.other} onClick={() => setChosen(other)}>
        {other === 'badge' ? 'Sign in with badge and PIN' : 'Sign in with e-mail and password'}
      </button>
    </div>
  );
}
