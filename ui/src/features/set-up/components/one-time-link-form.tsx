import { Button } from '@blueprintjs/core';
import type { SignedInPerson, WireLink } from '@stubpost/shared';
import { useState, type FormEvent } from 'react';
import { PasswordField } from '../../../components/password-field';
import { errorText } from '../../../lib/error-texts';
import { PASSWORD_HINT, passwordProblem } from '../../../lib/password-words';
import { useOneTimeLink } from '../api/one-time-link';

export interface OneTimeLinkFormProps {
  token: string;
  link: WireLink;
  onSet: (person: SignedInPerson) => void;
}

/** Choose a password, once. Opening the page uses nothing up: programs that look into mails follow links. */
export function OneTimeLinkForm({ token, link, onSet }: OneTimeLinkFormProps) {
  const [password, setPassword] = useState('');
  const [problem, setProblem] = useState<string | null>(null);
  const use = useOneTimeLink(token, onSet);
  const submit = (event: FormEvent): void => {
    event.preventDefault();
    const found = passwordProblem(password);
    setProblem(found);
    if (found === null) use.mutate(password);
  };

  return (
    <form className="sp-panel" onSubmit={submit} noValidate>
      <p>
        For <b>{link.name}</b>, who signs in as {link.email}.
      </p>
      {use.isError && (
        <p className="sp-problems" role="alert">
          {errorText(use.error)}
        </p>
      )}
      <input type="text" autoComplete="username" value={link.email} readOnly hidden />
      <PasswordField
        id="link-password"
        label="New password"
        hint={PASSWORD_HINT}
        problem={problem ?? undefined}
        value={password}
        onChange={setPassword}
      />
      <div className="sp-actions">
        <Button type="submit" intent="primary" loading={use.isPending}>
          Set password and sign in
        </Button>
      </div>
    </form>
  );
}
