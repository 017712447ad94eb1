import { Button, FormGroup, InputGroup } from '@blueprintjs/core';
import {
  createPersonSchema,
  type CreatedPerson,
  type CreatePersonRequest,
  type RoleGrant,
  type WireTerminal,
} from '@stubpost/shared';
import { useState, type FormEvent } from 'react';
import { FieldSummary, type FieldProblem } from '../../../components/field-summary';
import { errorText } from '../../../lib/error-texts';
import { useAddPerson } from '../api/people';
import { BADGE_HINT } from '../model/badge-words';
import { PHONE_HINT, PHONE_PROBLEM } from '../model/phone-words';
import { tidyGrants } from '../model/role-words';
import { LinkOnce } from './link-once';
import { RolesEditor } from './roles-editor';

interface Draft {
  name: string;
  email: string;
  badge: string;
  phone: string;
  roles: RoleGrant[];
}

const EMPTY: Draft = { name: '', email: '', badge: '', phone: '', roles: [] };

/** Badge and telephone are left out where their fields are empty. */
function requestOf({ badge, phone, ...draft }: Draft): CreatePersonRequest {
  return {
    ...draft,
    roles: tidyGrants(draft.roles),
    ...(badge.trim() === '' ? {} : { badge }),
    ...(phone.trim() === '' ? {} : { phone }),
  };
}

function problemsOf(draft: Draft): FieldProblem[] {
  const parsed = createPersonSchema.safeParse(requestOf(draft));
  const wrong = new Set(parsed.success ? [] : parsed.error.issues.map(({ path }) => String(path[0])));
  return [
    ...(wrong.has('name') ? [{ fieldId: 'add-name', words: 'Name is missing.' }] : []),
    ...(wrong.has('email') ? [{ fieldId: 'add-email', words: 'E-mail is not an address.' }] : []),
    ...(wrong.has('badge')
      ? [{ fieldId: 'add-badge', words: 'Badge: 2 to 12 letters, digits or dashes.' }]
      : []),
    ...(wrong.has('phone') ? [{ fieldId: 'add-phone', words: PHONE_PROBLEM }] : []),
    ...(draft.roles.length === 0
      ? [{ fieldId: 'add-roles', words: 'No role: the person could sign in and see nothing.' }]
      : []),
  ];
}

/** Adds a person. They choose their own password by the one-time link, so nobody else ever knows it. */
export function AddPerson({ terminals, zone }: { terminals: readonly WireTerminal[]; zone: string }) {
  const [draft, setDraft] = useState<Draft>(EMPTY);
  const [problems, setProblems] = useState<FieldProblem[]>([]);
  const [added, setAdded] = useState<CreatedPerson | null>(null);
  const add = useAddPerson();
  const submit = (event: FormEvent): void => {
    event.preventDefault();
    const found = problemsOf(draft);
    setProblems(found);
    if (found.length > 0) return;
    add.mutate(requestOf(draft), {
      onSuccess: (person) => {
        setAdded(person);
        setDraft(EMPTY);
      },
    });
  };

  return (
    <form className="sp-panel" onSubmit={submit} noValidate aria-labelledby="add-person">
      <header>
        <h2 id="add-person">Add a person</h2>
      </header>
      {added?.link !== undefined && <LinkOnce link={added.link} name={added.name} zone={zone} />}
      <FieldSummary problems={problems} />
      {add.isError && (
        <p className="sp-problems" role="alert">
          {errorText(add.error)}
        </p>
      )}
      <FormGroup label="Name, as it stands in the record" labelFor="add-name">
        <InputGroup
          id="add-name"
          autoComplete="off"
          value={draft.name}
          onValueChange={(name) => setDraft({ ...draft, name })}
        />
      </FormGroup>
      <FormGroup label="E-mail, to sign in with" labelFor="add-email">
        <InputGroup
          id="add-email"
          type="email"
          autoComplete="off"
          value={draft.email}
          onValueChange={(email) => setDraft({ ...draft, email })}
        />
      </FormGroup>
      <FormGroup label="Badge, to sign in with on shared phones" labelFor="add-badge" helperText={BADGE_HINT}>
        <InputGroup
          id="add-badge"
          autoComplete="off"
          value={draft.badge}
          onValueChange={(badge) => setDraft({ ...draft, badge })}
        />
      </FormGroup>
      <FormGroup label="Telephone" labelFor="add-phone" helperText={PHONE_HINT}>
        <InputGroup
          id="add-phone"
          type="tel"
          autoComplete="off"
          value={draft.phone}
          onValueChange={(phone) => setDraft({ ...draft, phone })}
        />
      </FormGroup>
      <div id="add-roles" tabIndex={-1}>
        <RolesEditor
          grants={draft.roles}
          terminals={terminals}
          onChange={(roles) => setDraft({ ...draft, roles })}
        />
      </div>
      <div className="sp-actions">
        <Button type="submit" intent="primary" loading={add.isPending}>
          Add and make a link
        </Button>
      </div>
    </form>
  );
}
