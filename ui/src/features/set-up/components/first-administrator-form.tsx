import { Button, FormGroup, InputGroup } from '@blueprintjs/core';
import { firstAdministratorSchema, type SignedInPerson } from '@stubpost/shared';
import { useState, type FormEvent } from 'react';
import { FieldSummary, type FieldProblem } from '../../../components/field-summary';
import { PasswordField } from '../../../components/password-field';
import { errorText } from '../../../lib/error-texts';
import { PASSWORD_HINT, passwordProblem } from '../../../lib/password-words';
import { useMakeFirstAdministrator } from '../api/first-administrator';

interface Draft {
  name: string;
  email: string;
  password: string;
}

/** What is wrong with the draft, field by field. */
export function draftProblems(draft: Draft): FieldProblem[] {
  const parsed = firstAdministratorSchema.safeParse({ ...draft, password: draft.password || '-' });
  const wrong = new Set(parsed.success ? [] : parsed.error.issues.map(({ path }) => String(path[0])));
  const password = passwordProblem(draft.password);
  return [
    ...(wrong.has('name') ? [{ fieldId: 'first-name', words: 'Name is missing.' }] : []),
    ...(wrong.has('email') ? [{ fieldId: 'first-email', words: 'E-mail is not an address.' }] : []),
    ...(password === null ? [] : [{ fieldId: 'first-password', words: `Password: ${password}` }]),
  ];
}

/** The one form of an empty installation. */
export function FirstAdministratorForm({ onMade }: { onMade: (person: SignedInPerson) => void }) {
  const [draft, setDraft] = useState<Draft>({ name: '', email: '', password: '' });
  const [problems, setProblems] = useState<FieldProblem[]>([]);
  const make = useMakeFirstAdministrator(onMade);
  const set = (field: keyof Draft) => (value: string) => setDraft({ ...draft, [field]: value });
  const submit = (event: FormEvent): void => {
    event.preventDefault();
    const found = draftProblems(draft);
    setProblems(found);
    if (found.length === 0) make.mutate(draft);
  };

  return (
    <form className="sp-panel" onSubmit={submit} noValidate>
      <FieldSummary problems={problems} />
      {make.isError && (
        <p className="sp-problems" role="alert">
          {errorText(make.error)}
        </p>
      )}
      <FormGroup label="Name, as it will stand in the record" labelFor="first-name">
        <InputGroup id="first-name" autoComplete="name" value={draft.name} onValueChange={set('name')} />
      </FormGroup>
      <FormGroup label="E-mail, to sign in with" labelFor="first-email">
        <InputGroup
          id="first-email"
          type="email"
          autoComplete="username"
          value={draft.email}
          onValueChange={set('email')}
        />
      </FormGroup>
      <PasswordField
        id="first-password"
        label="Password"
        hint={PASSWORD_HINT}
        value={draft.password}
        onChange={set('password')}
      />
      <div className="sp-actions">
        <Button type="submit" intent="primary" loading={make.isPending}>
          Make the first administrator
        </Button>
      </div>
    </form>
  );
}
