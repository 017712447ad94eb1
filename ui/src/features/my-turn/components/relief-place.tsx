import type { CrewMember, CrewRole } from '@stubpost/shared';
import { useQuery } from '@tanstack/react-query';
import { useId, useState } from 'react';
import { crewQuery } from '../api/turn-queries';
import { reliefConsequence, whoFits } from '../model/relief';
import type { ActWays } from './act-ways';
import { Foot } from './foot';
import styles from './phone-parts.module.css';
import { RecordBar, ShutBar } from './record-bar';
import { Standing } from './standing';
import { useTurnScene } from './turn-context';
import { useHeadingFocus } from './use-heading-focus';

/** Hands one's job on the turn over to somebody: who, and whether face to face. The other says so on their own phone. */
export function ReliefPlace({ ways, onBack }: { ways: ActWays; onBack: () => void }) {
  const { turn, me } = useTurnScene();
  const heading = useHeadingFocus();
  const [incoming, setIncoming] = useState<CrewMember | null>(null);
  if (me.role === null) return null;
  const { role } = me;
  return (
    <>
      <div className={styles.main}>
        <div>
          <h1 tabIndex={-1} ref={heading}>
            Hand over
          </h1>
          <p>
            {turn.set === null ? 'The train' : `Set ${turn.set}`}, as {role}. How it stands:
          </p>
        </div>
        <Standing />
        {incoming === null ? (
          <WhoTakesOver role={role} onChosen={setIncoming} />
        ) : (
          <section className={styles.said} aria-label="Face to face">
            <h2>Face to face with {incoming.name}?</h2>
            <p>{reliefConsequence(role)} It counts as face to face once both have said so.</p>
            <button type="button" className={styles.link} onClick={() => setIncoming(null)}>
              Somebody else
            </button>
          </section>
        )}
        <button type="button" className={`${styles.button} ${styles.wide}`} onClick={onBack}>
          Back
        </button>
      </div>
      <Foot>
        {incoming === null ? (
          <ShutBar under="waits for who takes over">Hand over</ShutBar>
        ) : (
          <FaceBars role={role} incoming={incoming} ways={ways} />
        )}
      </Foot>
    </>
  );
}

function FaceBars({ role, incoming, ways }: { role: CrewRole; incoming: CrewMember; ways: ActWays }) {
  const { me } = useTurnScene();
  const handOver = (faceToFace: boolean): void =>
    ways.onRecord(
      { kind: 'relief', out: me.id, in: incoming.id, as: role, faceToFace },
      `Handed over to ${incoming.name}`,
      null,
    );
  return (
    <>
      <RecordBar barKey={`away:${incoming.id}`} isOwnChange hollow onRecord={() => handOver(false)}>
        Not face to face
      </RecordBar>
      <RecordBar barKey={`face:${incoming.id}`} isOwnChange hollow onRecord={() => handOver(true)}>
        Face to face
      </RecordBar>
    </>
  );
}

/** The crews of the terminal, found by a part of the name. */
function WhoTakesOver({ role, onChosen }: { role: CrewRole; onChosen: (person: CrewMember) => void }) {
  const { turn, me } = useTurnScene();
  const id = useId();
  const [typed, setTyped] = useState('');
  const { data, error } = useQuery(crewQuery(turn.terminal));
  const found = whoFits(data ?? [], { role, typed, notId: me.id });
  return (
    <section className={styles.choices} aria-labelledby={`${id}-who`}>
      <h2 id={`${id}-who`} className={styles.part}>
        Who takes over
      </h2>
      <div className={styles.field}>
        <label htmlFor={id}>Name or badge</label>
        <input
          id={id}
          type="search"
          autoComplete="off"
          className={styles.words}
          value={typed}
          onChange={(event) => setTyped(event.target.value)}
        />
      </div>
      {error !== null && (
        <p className={styles.problem}>The names are not here. Say it by radio; the desk writes it.</p>
      )}
      <ul className={styles.choices} aria-label="People">
        {found.shown.map((person) => (
          <li key={person.id}>
            <button
              type="button"
              className={`${styles.button} ${styles.wide}`}
              onClick={() => onChosen(person)}
            >
              {person.badge === undefined ? person.name : `${person.name}, badge ${person.badge}`}
            </button>
          </li>
        ))}
      </ul>
      <p role="status" className="muted">
        {data === undefined ? '' : found.words}
      </p>
    </section>
  );
}
