import { useState, type ReactNode } from 'react';
import { Link } from 'react-router-dom';
import { useEntryQueue } from '../api/use-entry-queue';
import { actKey } from '../model/next-act';
import { draftOf } from './act-bar';
import { ActPlace } from './act-place';
import { AllSteps } from './all-steps';
import { DoneBar } from './done-bar';
import { EntriesOnPhone } from './entries-on-phone';
import { Foot } from './foot';
import { NotePlace } from './note-place';
import styles from './phone-parts.module.css';
import { ReasonPlace } from './reason-place';
import { RecordBar } from './record-bar';
import { SecondTouch } from './second-touch';
import { TakeTurn } from './take-turn';
import { TrainFacts } from './train-facts';
import { TurnPicture } from './turn-picture';
import { useTurnScene, type Recorded } from './turn-context';
import { usePlaces, type Places } from './use-places';

const cannotDoReasons = [
  'Waiting for the engineer',
  'Waiting for the conductor',
  'Equipment will not answer',
  'Not safe to go there',
];
const withdrawReasons = ['Wrong step', 'Wrong train', 'Wrong time'];

/** The page of a turn and the pages behind its buttons. */
export function TurnPlaces() {
  const { turn, me, record } = useTurnScene();
  const places = usePlaces();
  const [isHelping, setHelping] = useState(false);
  if (me.roles.length === 0) return <NotCrew />;
  const isOutside = me.role === null && me.roles.length > 0 && !isHelping && turn.annulled === null;
  if (isOutside && places.place.kind === 'act') {
    return (
      <TakeTurn
        onTaken={(role) =>
          record({ kind: 'crew', person: me.id, as: role }, { label: `I have this turn, ${role}` })
        }
        onHelp={() => setHelping(true)}
        onPhone={places.ways.onPhone}
      />
    );
  }
  if (places.place.kind === 'act') return <ActNow places={places} />;
  if (places.place.kind === 'second') return <SecondPlace places={places} />;
  return (
    <div className={styles.main}>
      <SubPlace places={places} />
    </div>
  );
}

/** Somebody who may record, but not from a crew's phone: the desk has a page of its own for the turn. */
function NotCrew() {
  const { turn, now, marker } = useTurnScene();
  return (
    <div className={styles.main}>
      <TrainFacts turn={turn} now={now} marker={marker} />
      <TurnPicture turn={turn} now={now} />
      <p className={styles.said}>Only a conductor or an engineer of this terminal records from the phone.</p>
      <Link className={`${styles.button} ${styles.wide}`} to={`/turns/${turn.id}`}>
        Open the turn at the desk
      </Link>
    </div>
  );
}

function ActNow({ places }: { places: Places }) {
  const { turn } = useTurnScene();
  const { state } = useEntryQueue();
  const { act, done, isPicked, undo, endUndo, ways } = places;
  const bar =
    done === null ? null : (
      <DoneBar
        key={done.entryId}
        done={done}
        zone={turn.zone}
        where={whereWords(done, state.waiting)}
        onUndo={undo}
        onOver={endUndo}
      />
    );
  return (
    <ActPlace key={actKey(act)} act={act} isPicked={isPicked} doneBar={bar} onGoOn={endUndo} {...ways} />
  );
}

function whereWords(done: Recorded, waiting: readonly { request: { id: string }; tries: number }[]): string {
  const entry = waiting.find(({ request }) => request.id === done.entryId);
  if (entry === undefined) return 'sent';
  return entry.tries === 0 ? 'on phone, sending' : 'on phone, not sent';
}

/** The second touch of a release: its bar above, the way back where the first bar was. */
function SecondPlace({ places }: { places: Places }) {
  const { turn, now, marker } = useTurnScene();
  const { place, ways, toAct } = places;
  if (place.kind !== 'second') return null;
  const { act, reading, earlier } = place.page;
  const touch = (): void => {
    const draft = draftOf(act, reading);
    if (draft !== null) ways.onRecord(draft, 'Handbrakes released', earlier);
  };
  return (
    <>
      <div className={styles.main}>
        <TrainFacts turn={turn} now={now} marker={marker} />
        <SecondTouch page={place.page} onRecord={touch} />
      </div>
      <Foot onPhone={ways.onPhone}>
        <RecordBar barKey="not-yet" isOwnChange hollow over="Handbrake released" onRecord={toAct}>
          Not yet, go back
        </RecordBar>
      </Foot>
    </>
  );
}

/** Pages behind a button. They have no bar, so that nothing is recorded by the way. */
function SubPlace({ places }: { places: Places }): ReactNode {
  const { turn } = useTurnScene();
  const queue = useEntryQueue();
  const { place, toAct, ways } = places;
  const about = `Train ${turn.outbound?.train ?? turn.inbound?.train ?? ''}, track ${turn.track ?? 'not known'}`;
  switch (place.kind) {
    case 'act':
    case 'second':
      return null;
    case 'steps':
      return <AllSteps onPick={places.pick} onBriefing={places.briefing} onBack={toAct} />;
    case 'cannot-do':
      return (
        <ReasonPlace
          title={`Can’t do: ${place.label}`}
          about={about}
          reasons={cannotDoReasons}
          action="Send to desk"
          onReason={(reason) => places.cannotDo(place.step, place.label, reason)}
          onBack={toAct}
        />
      );
    case 'note':
      return <NotePlace about={about} onNote={ways.onTellDesk} onBack={toAct} />;
    case 'withdraw':
      return (
        <ReasonPlace
          title="Withdraw"
          about={`${place.entry.words}. The first entry stays in the log.`}
          reasons={withdrawReasons}
          action="Withdraw it"
          onReason={(reason) => places.withdraw(place.entry, reason)}
          onBack={toAct}
        />
      );
    case 'phone':
      return <EntriesOnPhone queue={queue} state={queue.state} zone={turn.zone} onBack={toAct} />;
  }
}
