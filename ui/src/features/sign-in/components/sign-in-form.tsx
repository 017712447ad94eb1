import { Button, FormGroup, InputGroup } from '@blueprintjs/core';
import type { SignedInPerson } from '@stubpost/shared';
import { useRef, useState, type FormEvent } from 'react';
import { errorText } from '../../../lib/error-texts';
import { useSignIn } from '../api/sign-in';
import styles from './sign-in.module.css';

/** E-mail and password. Nothing is asked twice, pasting is allowed, and a wrong pair leaves the e-mail standing. */
export function SignInForm({ onSignedIn }: { onSignedIn: (person: SignedInPerson) => void }) {
  const [email, setEmail] = useState('');
  const [password, setPassword] = useState('');
  const passwordField = useRef<HTMLInputElement>(null);
  const signIn = useSignIn(onSignedIn);

  const submit = (event: FormEvent): void => {
    event.preventDefault();
    signIn.mutate(
      { with: 'password', request: { email, password } },
      {
        onError: () => {
          setPassword('');
          passwordField.current?.focus();
        },
      },
    );
  };

  return (
    <form className={`sp-panel ${styles.form}`} onSubmit={submit} aria-labelledby="sign-in-title">
      <header>
        <h2 id="sign-in-title">Sign in</h2>
      </header>
      {signIn.isError && (
        <p className="sp-problems" role="alert">
          {errorText(signIn.error)}
        </p>
      )}
      <FormGroup label="E-mail" labelFor="sign-in-email">
        <InputGroup
          id="sign-in-email"
          type="email"
          size="large"
          autoComplete="username"
          required
          value={email}
          onValueChange={setEmail}
        />
      </FormGroup>
      <FormGroup label="Password" labelFor="sign-in-password">
        <InputGroup
          id="sign-in-password"
          type="password"
          size="large"
          autoComplete="current-password"
          required
          value={password}
          onValueChange={setPassword}
          inputRef={passwordField}
        />
      </FormGroup>
      <Button type="submit" intent="primary" size="large" fill loading={signIn.isPending}>
        Sign in
      </Button>
      <p className="small muted">
        No sign-in, or password lost? The administrator makes a link that sets a new one.
      </p>
    </form>
  );
}
