import { useState } from 'react';
import type { CrewRole } from '@stubpost/shared';
import { CREW_WORDS } from '../model/crew-words';
import { Foot } from './foot';
import styles from './phone-parts.module.css';
import { RecordBar } from './record-bar';
import { TrainFacts } from './train-facts';
import { TurnPicture } from './turn-picture';
import { useTurnScene } from './turn-context';

/** A turn the person is not on: who has it, and one bar to take it. */
export function TakeTurn({
  onTaken,
  onHelp,
  onPhone,
}: {
  onTaken: (role: CrewRole) => void;
  onHelp: () => void;
  onPhone: () => void;
}) {
  const { turn, me, now, marker } = useTurnScene();
  const [role, setRole] = useState<CrewRole>(me.roles[0] ?? 'conductor');
  const holder = turn.crew.find((member) => member.as === role);
  return (
    <>
      <div className={styles.main}>
        <TrainFacts turn={turn} now={now} marker={marker} />
        <TurnPicture turn={turn} now={now} />
        <section className={styles.next} aria-label="Crew">
          <p className="muted">Crew of this turn</p>
          <ul className={styles.lines}>
            {(['conductor', 'engineer'] as const).map((as) => (
              <li key={as} className={styles.line}>
                {CREW_WORDS[as]}
                <b className={styles.push}>
                  {turn.crew.find((member) => member.as === as)?.name ?? 'nobody yet'}
                </b>
              </li>
            ))}
          </ul>
          {holder !== undefined && <p>Taking it puts you in the place of {holder.name}.</p>}
        </section>
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
        <button type="button" className={`${styles.button} ${styles.wide}`} onClick={onHelp}>
          Record an entry without taking it
        </button>
      </div>
      <Foot onPhone={onPhone}>
        <RecordBar
          barKey={`crew:${role}`}
          isOwnChange={me.roles.length > 1}
          over={`As ${role}`}
          onRecord={() => onTaken(role)}
        >
          I have this turn
        </RecordBar>
      </Foot>
    </>
  );
}
