import { Button } from '@blueprintjs/core';
import type { WirePerson } from '@stubpost/shared';
import { useState, type FormEvent } from 'react';
import { PasswordField } from '../../../components/password-field';
import { errorText } from '../../../lib/error-texts';
import { PASSWORD_HINT, passwordProblem } from '../../../lib/password-words';
import { useEndSessions, useGivePassword, useMakeLink } from '../api/people';
import { LinkOnce } from './link-once';

function GivePassword({ person }: { person: WirePerson }) {
  const [password, setPassword] = useState('');
  const [problem, setProblem] = useState<string | null>(null);
  const give = useGivePassword(person.id);
  const submit = (event: FormEvent): void => {
    event.preventDefault();
    const found = passwordProblem(password);
    setProblem(found);
    if (found === null) give.mutate(password, { onSuccess: () => setPassword('') });
  };
  return (
    <form onSubmit={submit} noValidate>
      {give.isError && (
        <p className="sp-problems" role="alert">
          {errorText(give.error)}
        </p>
      )}
      {give.isSuccess && <p role="status">New password given. All sessions of {person.name} have ended.</p>}
      <PasswordField
        id="given-password"
        label="New password"
        hint={PASSWORD_HINT}
        problem={problem ?? undefined}
        value={password}
        onChange={setPassword}
      />
      <p className="sp-actions">
        <Button type="submit" loading={give.isPending} disabled={password === ''}>
          Give this password
        </Button>
      </p>
    </form>
  );
}

/** Ways in for a person, and the way out: a link, a password, the end of all sessions. */
export function PersonAccess({ person, zone }: { person: WirePerson; zone: string }) {
  const makeLink = useMakeLink(person.id);
  const end = useEndSessions(person.id);
  const problem = makeLink.error ?? end.error;
  return (
    <section className="sp-panel" aria-labelledby="person-access">
      <header>
        <h2 id="person-access">Sign-in of {person.name}</h2>
      </header>
      {problem !== null && (
        <p className="sp-problems" role="alert">
          {errorText(problem)}
        </p>
      )}
      {makeLink.data !== undefined && <LinkOnce link={makeLink.data} name={person.name} zone={zone} />}
      {end.isSuccess && <p role="status">All sessions of {person.name} have ended.</p>}
      <div className="sp-actions">
        <Button loading={makeLink.isPending} onClick={() => makeLink.mutate()}>
          Make a one-time link
        </Button>
        <Button loading={end.isPending} disabled={person.sessions === 0} onClick={() => end.mutate()}>
          {person.sessions === 0
            ? 'No sessions'
            : `End ${person.sessions} ${person.sessions === 1 ? 'session' : 'sessions'}`}
        </Button>
      </div>
      <GivePassword person={person} />
    </section>
  );
}
