import { DEFECT_CAUSES, type DefectCause } from '@stubpost/shared';
import { useId, useState } from 'react';
import { causeWords, defectLine } from '../model/defect-words';
import type { ActWays } from './act-ways';
import { CarBoxes } from './car-boxes';
import { Foot } from './foot';
import styles from './phone-parts.module.css';
import { RecordBar, ShutBar } from './record-bar';
import { useTurnScene } from './turn-context';
import { useHeadingFocus } from './use-heading-focus';

/** Longest note of a defect the log takes. */
const longestNote = 1000;
/** Stands among the cars for what is wrong with no single car. */
const wholeSet = 'Whole set';

/** A bad-order report in three touches: the car, the cause, send. Words are extra. */
export function DefectPlace({ ways, onBack }: { ways: ActWays; onBack: () => void }) {
  const { turn } = useTurnScene();
  const heading = useHeadingFocus();
  const [car, setCar] = useState<string | null>(null);
  const [cause, setCause] = useState<DefectCause | null>(null);
  const [note, setNote] = useState('');
  return (
    <>
      <div className={styles.main}>
        <div>
          <h1 tabIndex={-1} ref={heading}>
            Defect
          </h1>
          <p>Goes to the desk and stays with the set. What is dangerous is said by radio first.</p>
        </div>
        <section className={styles.choices} aria-labelledby="defect-car">
          <h2 id="defect-car" className={styles.part}>
            Which car
          </h2>
          <CarBoxes
            name="Cars"
            boxes={[...turn.cars, wholeSet].map((each) => ({
              car: each,
              pressed: car === each,
              word: '',
              disabled: false,
              stillSet: false,
            }))}
            onTouch={setCar}
          />
        </section>
        <section className={styles.choices} aria-labelledby="defect-cause">
          <h2 id="defect-cause" className={styles.part}>
            What is wrong
          </h2>
          <div className={styles.buttons} role="group" aria-labelledby="defect-cause">
            {DEFECT_CAUSES.map((each) => (
              <button
                key={each}
                type="button"
                className={styles.button}
                aria-pressed={cause === each}
                onClick={() => setCause(each)}
              >
                {causeWords(each)}
              </button>
            ))}
          </div>
        </section>
        <Words note={note} onNote={setNote} />
        <Reported />
        <button type="button" className={`${styles.button} ${styles.wide}`} onClick={onBack}>
          Back
        </button>
      </div>
      <Foot>
        <DefectBar car={car} cause={cause} note={note.trim()} ways={ways} />
      </Foot>
    </>
  );
}

function DefectBar({
  car,
  cause,
  note,
  ways,
}: {
  car: string | null;
  cause: DefectCause | null;
  note: string;
  ways: ActWays;
}) {
  if (car === null || cause === null)
    return <ShutBar under={car === null ? 'waits for the car' : 'waits for the cause'}>Send defect</ShutBar>;
  const content = { car: car === wholeSet ? null : car, cause, ...(note === '' ? {} : { note }) };
  const words = `Defect: ${defectLine({ car: content.car, cause })}`;
  return (
    <RecordBar
      barKey={words}
      isOwnChange
      over="Send to desk"
      onRecord={() => ways.onRecord({ kind: 'defect', ...content }, words, null)}
    >
      {words}
    </RecordBar>
  );
}

function Words({ note, onNote }: { note: string; onNote: (note: string) => void }) {
  const id = useId();
  return (
    <div className={styles.field}>
      <label htmlFor={id}>More, in your words, if needed</label>
      <input
        id={id}
        maxLength={longestNote}
        autoComplete="off"
        className={styles.words}
        value={note}
        onChange={(event) => onNote(event.target.value)}
      />
    </div>
  );
}

/** What has been reported about the set already, so that nobody reports it twice. */
function Reported() {
  const { turn } = useTurnScene();
  const defects = turn.defects ?? [];
  if (defects.length === 0) return null;
  return (
    <section className={styles.said} aria-label="Reported already">
      <p>
        <b>Reported already:</b> {defects.map((defect) => defectLine(defect)).join('; ')}.
      </p>
    </section>
  );
}
