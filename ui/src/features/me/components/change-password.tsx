import { Button } from '@blueprintjs/core';
import { useState, type FormEvent } from 'react';
import { PasswordField } from '../../../components/password-field';
import { errorText } from '../../../lib/error-texts';
import { PASSWORD_HINT, passwordProblem } from '../../../lib/password-words';
import { useChangePassword } from '../api/own-sign-in';

/** One's own password: the old one to prove who is there, then the new one. */
export function ChangePassword() {
  const [current, setCurrent] = useState('');
  const [password, setPassword] = useState('');
  const [problem, setProblem] = useState<string | null>(null);
  const change = useChangePassword();
  const submit = (event: FormEvent): void => {
    event.preventDefault();
    const found = passwordProblem(password);
    setProblem(found);
    if (found !== null) return;
    change.mutate(
      { current, password },
      {
        onSuccess: () => {
          setCurrent('');
          setPassword('');
        },
      },
    );
  };

  return (
    <form className="sp-panel" onSubmit={submit} noValidate aria-labelledby="own-password">
      <header>
        <h2 id="own-password">Password</h2>
      </header>
      {change.isError && (
        <p className="sp-problems" role="alert">
          {errorText(change.error)}
        </p>
      )}
      {change.isSuccess && <p role="status">Password changed. All other sessions have ended.</p>}
      <PasswordField
        id="own-current"
        label="Current password"
        autoComplete="current-password"
        value={current}
        onChange={setCurrent}
      />
      <PasswordField
        id="own-new"
        label="New password"
        hint={PASSWORD_HINT}
        problem={problem ?? undefined}
        value={password}
        onChange={setPassword}
      />
      <div className="sp-actions">
        <Button
          type="submit"
          intent="primary"
          loading={change.isPending}
          disabled={current === '' || password === ''}
        >
          Change password
        </Button>
      </div>
    </form>
  );
}
