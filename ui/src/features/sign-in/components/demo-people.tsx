import { Button } from '@blueprintjs/core';
import type { SignedInPerson, WireDemo } from '@stubpost/shared';
import { ROLE_WORDS } from '../../../components/words';
import { errorText } from '../../../lib/error-texts';
import { HOME_NAMES, homeOfRole } from '../../../lib/home';
import { useSignIn } from '../api/sign-in';
import styles from './sign-in.module.css';

type DemoPerson = NonNullable<WireDemo['people']>[number];

interface RowProps {
  person: DemoPerson;
  isBusy: boolean;
  onPick: (personId: string) => void;
}

function DemoRow({ person, isBusy, onPick }: RowProps) {
  const role = ROLE_WORDS[person.role];
  return (
    <tr>
      <th scope="row">{role}</th>
      <td>{person.name}</td>
      <td className={`muted ${styles.opens}`}>{HOME_NAMES[homeOfRole(person.role)]}</td>
      <td className="number">
        <Button
          aria-label={`Sign in as ${role} ${person.name}`}
          disabled={isBusy}
          onClick={() => onPick(person.id)}
        >
          Sign in
        </Button>
      </td>
    </tr>
  );
}

/** The invented people of a demo, one of each role, to be signed in as with one click. */
export function DemoPeople({
  demo,
  onSignedIn,
}: {
  demo: WireDemo;
  onSignedIn: (person: SignedInPerson) => void;
}) {
  const signIn = useSignIn(onSignedIn);
  const people = demo.people ?? [];
  return (
    <section className="sp-panel" aria-labelledby="demo-title">
      <header>
        <h2 id="demo-title">This is a demo. Sign in as</h2>
      </header>
      {signIn.isError && (
        <p className="sp-problems" role="alert">
          {errorText(signIn.error)}
        </p>
      )}
      {demo.state === 'filling' && <p role="status">{demo.message ?? 'History is being filled in.'}</p>}
      {people.length > 0 && (
        <table className={`sp-table ${styles.people}`}>
          <thead>
            <tr>
              <th scope="col">Role</th>
              <th scope="col">Person, invented</th>
              <th scope="col" className={styles.opens}>
                Opens
              </th>
              <th scope="col">
                <span className="unseen">Sign in</span>
              </th>
            </tr>
          </thead>
          <tbody>
            {people.map((person) => (
              <DemoRow
                key={person.role}
                person={person}
                isBusy={signIn.isPending}
                onPick={(personId) => signIn.mutate({ with: 'demo', request: { personId } })}
              />
            ))}
          </tbody>
        </table>
      )}
      <footer>
        Railroad, places, trains and people are invented, and the limits are examples. Crews act by themselves
        as time passes.
      </footer>
    </section>
  );
}
