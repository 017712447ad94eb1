import { useState } from 'react';
import type { CrewRole, WireTurn } from '@stubpost/shared';
import { CREW_WORDS } from '../model/crew-words';
import { reliefConsequence } from '../model/relief';
import type { ActWays } from './act-ways';
import { AskedOfMe } from './asked-of-me';
import { Foot } from './foot';
import styles from './phone-parts.module.css';
import { RecordBar } from './record-bar';
import { Standing } from './standing';
import { TrainFacts } from './train-facts';
import { TurnPicture } from './turn-picture';
import { useTurnScene } from './turn-context';
import type { Places } from './use-places';

type CrewMember = WireTurn['crew'][number];

/** A turn the person is not on: who has it, and one bar to take it; from somebody else it is a relief, face to face or not. */
export function TakeTurn({
  ways,
  onTaken,
  onHelp,
}: {
  ways: ActWays;
  /** Without a place for Undo: the first step may be due at once. */
  onTaken: Places['recordQuietly'];
  onHelp: () => void;
}) {
  const { turn, me, now, marker } = useTurnScene();
  const [role, setRole] = useState<CrewRole>(me.roles[0] ?? 'conductor');
  const holder = turn.crew.find((member) => member.as === role);
  return (
    <>
      <div className={styles.main}>
        <TrainFacts turn={turn} now={now} marker={marker} />
        {/* Somebody who was relieved is no longer on the turn and still has to say whether it was face to face. */}
        <AskedOfMe ways={ways} />
        {holder === undefined && <TurnPicture turn={turn} now={now} />}
        <Crew />
        {me.roles.length > 1 && (
          <div className={styles.buttons} role="group" aria-label="As">
            {me.roles.map((each) => (
              <button
                key={each}
                type="button"
                className={styles.button}
                aria-pressed={each === role}
                onClick={() => setRole(each)}
              >
                As {each}
              </button>
            ))}
          </div>
        )}
        {holder !== undefined && (
          <section className={styles.said} aria-label="Relief">
            <h2>Take over from {holder.name}?</h2>
            <p>{reliefConsequence(role)} It counts as face to face once both have said so.</p>
            <Standing />
          </section>
        )}
        <button type="button" className={`${styles.button} ${styles.wide}`} onClick={onHelp}>
          Record an entry without taking it
        </button>
      </div>
      <Foot>
        {holder === undefined ? (
          <TakeBar role={role} onTaken={onTaken} />
        ) : (
          <ReliefBars role={role} holder={holder} onTaken={onTaken} />
        )}
      </Foot>
    </>
  );
}

function Crew() {
  const { turn } = useTurnScene();
  return (
    <section className={styles.next} aria-labelledby="crew-of-turn">
      <h2 id="crew-of-turn" className={styles.small}>
        Crew of this turn
      </h2>
      <dl className={styles.lines}>
        {(['conductor', 'engineer'] as const).map((as) => (
          <div key={as} className={styles.line}>
            <dt>{CREW_WORDS[as]}</dt>
            <dd className={styles.push}>
              <b>{turn.crew.find((member) => member.as === as)?.name ?? 'nobody yet'}</b>
            </dd>
          </div>
        ))}
      </dl>
    </section>
  );
}

interface BarProps {
  role: CrewRole;
  onTaken: Places['recordQuietly'];
}

function TakeBar({ role, onTaken }: BarProps) {
  const { me } = useTurnScene();
  return (
    <RecordBar
      barKey={`crew:${role}`}
      isOwnChange={me.roles.length > 1}
      over={`As ${role}`}
      onRecord={() =>
        onTaken({ draft: { kind: 'crew', person: me.id, as: role }, label: `I have this turn, ${role}` })
      }
    >
      I have this turn
    </RecordBar>
  );
}

function ReliefBars({ role, holder, onTaken }: BarProps & { holder: CrewMember }) {
  const { me } = useTurnScene();
  const takeOver = (faceToFace: boolean): void =>
    onTaken({
      draft: { kind: 'relief', out: holder.personId, in: me.id, as: role, faceToFace },
      label: `Took over from ${holder.name}`,
    });
  return (
    <>
      <RecordBar
        barKey={`away:${role}`}
        isOwnChange={me.roles.length > 1}
        hollow
        onRecord={() => takeOver(false)}
      >
        Not face to face
      </RecordBar>
      <RecordBar
        barKey={`face:${role}`}
        isOwnChange={me.roles.length > 1}
        hollow
        onRecord={() => takeOver(true)}
      >
        Face to face
      </RecordBar>
    </>
  );
}
