import { ALL_TERMINALS, type SignedInPerson } from '@stubpost/shared';
import { ROLE_WORDS } from '../../../components/words';

/** What the person may do, and where. */
export function OwnRoles({ person }: { person: SignedInPerson }) {
  return (
    <section className="sp-panel" aria-labelledby="own-roles">
      <header>
        <h2 id="own-roles">{person.name}</h2>
      </header>
      {person.roles.length === 0 && <p>No role yet. The administrator gives roles by terminal.</p>}
      <ul>
        {person.roles.map(({ role, terminal }) => (
          <li key={`${role} ${terminal}`}>
            {ROLE_WORDS[role]}, {terminal === ALL_TERMINALS ? 'all terminals' : `terminal ${terminal}`}
          </li>
        ))}
      </ul>
    </section>
  );
}
