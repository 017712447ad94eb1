import { Button, Checkbox, FormGroup, InputGroup } from '@blueprintjs/core';
import { phoneSchema, type WirePerson, type WireTerminal } from '@stubpost/shared';
import { useQueryClient } from '@tanstack/react-query';
import { useState, type FormEvent } from 'react';
import { isRefusal } from '../../../lib/api-client';
import { errorText } from '../../../lib/error-texts';
import { peopleQuery, useChangePerson } from '../api/people';
import { tidyGrants } from '../model/role-words';
import { BADGE_HINT } from '../model/badge-words';
import { PHONE_HINT, PHONE_PROBLEM } from '../model/phone-words';
import { RolesEditor } from './roles-editor';

/**
 * Name, roles, and whether the person may sign in. The draft stays what it was when the list is read again; it is sent with
 * the version it started from, and when somebody else was faster it starts anew from theirs.
 */
export function EditPerson({
  person,
  terminals,
}: {
  person: WirePerson;
  terminals: readonly WireTerminal[];
}) {
  const client = useQueryClient();
  const [draft, setDraft] = useState(person);
  const [isPhoneWrong, setPhoneWrong] = useState(false);
  const change = useChangePerson(person.id);
  const startFromNewest = (): void => {
    const newest = client.getQueryData(peopleQuery.queryKey)?.find(({ id }) => id === person.id);
    if (newest !== undefined) setDraft(newest);
  };
  const submit = (event: FormEvent): void => {
    event.preventDefault();
    const { version, name, active } = draft;
    const typedPhone = draft.phone?.trim() ?? '';
    const badge = draft.badge === null || draft.badge.trim() === '' ? null : draft.badge;
    const phone = typedPhone === '' ? null : typedPhone;
    setPhoneWrong(phone !== null && !phoneSchema.safeParse(phone).success);
    if (phone !== null && !phoneSchema.safeParse(phone).success) return;
    change.mutate(
      { version, name, badge, phone, roles: tidyGrants(draft.roles), active },
      {
        onSuccess: setDraft,
        onError: (problem) => isRefusal(problem, 'people.changed') && startFromNewest(),
      },
    );
  };

  return (
    <form className="sp-panel" onSubmit={submit} aria-labelledby="edit-person">
      <header>
        <h2 id="edit-person">{person.name}</h2>
        <span className="muted">{person.email}</span>
      </header>
      {change.isError && (
        <p className="sp-problems" role="alert">
          {errorText(change.error)}
        </p>
      )}
      {change.isSuccess && <p role="status">Saved.</p>}
      <FormGroup label="Name; entries already made keep the name of their day" labelFor="edit-name">
        <InputGroup
          id="edit-name"
          required
          value={draft.name}
          onValueChange={(name) => setDraft({ ...draft, name })}
        />
      </FormGroup>
      <FormGroup
        label="Badge, to sign in with on shared phones"
        labelFor="edit-badge"
        helperText={draft.hasPin ? 'A PIN is set. It goes when the badge goes.' : BADGE_HINT}
      >
        <InputGroup
          id="edit-badge"
          autoComplete="off"
          value={draft.badge ?? ''}
          onValueChange={(badge) => setDraft({ ...draft, badge })}
        />
      </FormGroup>
      <FormGroup
        label="Telephone"
        labelFor="edit-phone"
        helperText={isPhoneWrong ? PHONE_PROBLEM : PHONE_HINT}
        {...(isPhoneWrong ? { intent: 'danger' as const } : {})}
      >
        <InputGroup
          id="edit-phone"
          type="tel"
          autoComplete="off"
          aria-invalid={isPhoneWrong}
          value={draft.phone ?? ''}
          onValueChange={(phone) => setDraft({ ...draft, phone })}
        />
      </FormGroup>
      <RolesEditor
        grants={draft.roles}
        terminals={terminals}
        onChange={(roles) => setDraft({ ...draft, roles })}
      />
      <Checkbox
        checked={draft.active}
        label="May sign in. Without it, sessions end and entries stay"
        onChange={() => setDraft({ ...draft, active: !draft.active })}
      />
      <div className="sp-actions">
        <Button type="submit" intent="primary" loading={change.isPending}>
          Save
        </Button>
      </div>
    </form>
  );
}
