import { useState } from 'react';
import { Link } from 'react-router-dom';
import { mayRecord } from '@stubpost/shared';
import { BlueSignalFlag } from '../../../components/flags';
import { usePerson } from '../../../lib/session';
import { formatClock } from '../../../lib/time-display';
import { annulReasons } from '../model/reasons';
import type { ActWays } from './act-ways';
import { DefectPlace } from './defect-place';
import { Foot } from './foot';
import { NotePlace } from './note-place';
import { OffCrewSecond, type DangerousAct } from './off-crew-second';
import styles from './phone-parts.module.css';
import type { Place } from './place';
import { ReasonPlace } from './reason-place';
import { RecordBar } from './record-bar';
import { TrainFacts } from './train-facts';
import { TurnPicture } from './turn-picture';
import { useTurnScene } from './turn-context';
import type { Places } from './use-places';

/**
 * The turn on the phone of somebody who is not of a crew: an inspector puts a blue signal up and takes it down, a
 * dispatcher annuls. Both take away what others rely on and are asked for a second time, in another place.
 */
export function OffCrew({ onRecord }: { onRecord: Places['recordQuietly'] }) {
  const { turn } = useTurnScene();
  const [place, setPlace] = useState<Place>({ kind: 'act' });
  const [second, setSecond] = useState<DangerousAct | null>(null);
  const back = (): void => {
    setPlace({ kind: 'act' });
    setSecond(null);
  };
  const ways: ActWays = {
    onRecord: (draft, label, earlier) => {
      onRecord({ draft, label, earlier });
      back();
    },
    onGo: setPlace,
  };
  if (second !== null) return <OffCrewSecond act={second} ways={ways} onBack={back} />;
  if (place.kind === 'defect') return <DefectPlace ways={ways} onBack={back} />;
  const about = `Train ${turn.outbound?.train ?? turn.inbound?.train ?? ''}`;
  if (place.kind === 'note' || place.kind === 'annul')
    return (
      <div className={styles.main}>
        {place.kind === 'note' ? (
          <NotePlace
            about={about}
            onNote={(note) => ways.onRecord({ kind: 'note', note }, 'Note', null)}
            onBack={back}
          />
        ) : (
          <ReasonPlace
            title="Annul the turn"
            about={`${about} will not run. Its crew and the board are told.`}
            reasons={annulReasons}
            action="Go on"
            onReason={(reason) => setSecond({ kind: 'annulled', reason })}
            onBack={back}
          />
        )}
      </div>
    );
  return <Overview ways={ways} onSecond={setSecond} />;
}

function Overview({ ways, onSecond }: { ways: ActWays; onSecond: (act: DangerousAct) => void }) {
  const { turn, now, marker } = useTurnScene();
  const person = usePerson();
  const may = (kind: Parameters<typeof mayRecord>[1]): boolean => mayRecord(person, kind, turn.terminal);
  return (
    <>
      <div className={styles.main}>
        <TrainFacts turn={turn} now={now} marker={marker} />
        <TurnPicture turn={turn} now={now} />
        {turn.blueSignal !== null && (
          <p className={styles.said}>
            <span>
              <BlueSignalFlag /> up since {formatClock(turn.blueSignal.since, turn.zone)},{' '}
              {turn.blueSignal.by}. Only the person or craft that put it up takes it down.
            </span>
          </p>
        )}
        <p>Steps of the turn are recorded by its conductor and engineer.</p>
        <div className={styles.buttons}>
          {may('defect') && (
            <button type="button" className={styles.button} onClick={() => ways.onGo({ kind: 'defect' })}>
              Defect
            </button>
          )}
          {may('note') && (
            <button type="button" className={styles.button} onClick={() => ways.onGo({ kind: 'note' })}>
              Note
            </button>
          )}
          {may('annulled') && turn.annulled === null && (
            <button type="button" className={styles.button} onClick={() => ways.onGo({ kind: 'annul' })}>
              Annul
            </button>
          )}
        </div>
        <Link className={`${styles.button} ${styles.wide}`} to={`/turns/${turn.id}`}>
          Open the turn at the desk
        </Link>
      </div>
      <Foot>{may('blue-signal-up') && <BlueSignalBar ways={ways} onSecond={onSecond} />}</Foot>
    </>
  );
}

function BlueSignalBar({ ways, onSecond }: { ways: ActWays; onSecond: (act: DangerousAct) => void }) {
  const { turn } = useTurnScene();
  if (turn.blueSignal === null)
    return (
      <RecordBar
        barKey="blue-up"
        over="Record now"
        onRecord={() => ways.onRecord({ kind: 'blue-signal-up' }, 'Blue signal up', null)}
      >
        Blue signal up
      </RecordBar>
    );
  return (
    <RecordBar
      barKey="blue-down"
      over="Second touch follows"
      onRecord={() => onSecond({ kind: 'blue-signal-down' })}
    >
      Blue signal down
    </RecordBar>
  );
}
