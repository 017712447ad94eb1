import { FormGroup, InputGroup } from '@blueprintjs/core';
import type { WirePerson } from '@stubpost/shared';
import { useState } from 'react';
import { Link } from 'react-router-dom';
import { formatSince } from '../../../lib/time-display';
import { useNow } from '../../../lib/use-now';
import { findPeople } from '../model/find-people';
import { rolesInWords } from '../model/role-words';
import styles from './people.module.css';

function standing(person: WirePerson): string {
  if (!person.active) return 'may not sign in';
  if (!person.hasPassword) return 'no password yet';
  return person.sessions === 1 ? '1 session' : `${person.sessions} sessions`;
}

function badgeWords({ badge, hasPin }: WirePerson): string {
  if (badge === null) return '–';
  return hasPin ? `${badge}, PIN set` : badge;
}

/** Everybody with a sign-in, by name; a text narrows the list. The name opens the person. */
export function PeopleTable({
  people,
  chosenId,
}: {
  people: readonly WirePerson[];
  chosenId: string | null;
}) {
  const now = useNow(10);
  const [text, setText] = useState('');
  const found = findPeople(people, text);
  return (
    <>
      <div className="sp-fields">
        <FormGroup label="Find by name, e-mail or role" labelFor="find-people">
          <InputGroup id="find-people" type="search" value={text} onValueChange={setText} />
        </FormGroup>
        <span role="status" className={styles.count}>
          {found.length === people.length
            ? `${people.length} people`
            : `${found.length} of ${people.length} people`}
        </span>
      </div>
      <div className="sp-table-scroll" role="region" aria-label="People" tabIndex={0}>
        <table className="sp-table">
          <thead>
            <tr>
              <th scope="col">Name</th>
              <th scope="col">E-mail, telephone</th>
              <th scope="col">Badge</th>
              <th scope="col">Roles</th>
              <th scope="col">Sign-in</th>
              <th scope="col">Last seen</th>
            </tr>
          </thead>
          <tbody>
            {found.map((person) => (
              <tr key={person.id} className={person.id === chosenId ? styles.chosen : undefined}>
                <th scope="row">
                  <Link
                    to={`?person=${person.id}`}
                    aria-current={person.id === chosenId ? 'true' : undefined}
                  >
                    {person.name}
                  </Link>
                </th>
                <td>
                  {person.email}
                  {person.phone !== null && <div className="muted nowrap">{person.phone}</div>}
                </td>
                <td className="nowrap">{badgeWords(person)}</td>
                <td>{rolesInWords(person.roles)}</td>
                <td className="nowrap">{standing(person)}</td>
                <td className="nowrap">
                  {person.lastSeenAt === null ? 'never' : formatSince(person.lastSeenAt, now)}
                </td>
              </tr>
            ))}
          </tbody>
        </table>
      </div>
    </>
  );
}
