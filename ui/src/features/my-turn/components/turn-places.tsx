import { usePrefetchQuery } from '@tanstack/react-query';
import { useState } from 'react';
import { useOutbox } from '../../../lib/outbox/use-outbox';
import { crewQuery } from '../api/turn-queries';
import { actKey } from '../model/next-act';
import { whereIs } from '../model/where-is';
import { draftOf } from './act-bar';
import { ActPlace } from './act-place';
import { DoneBar } from './done-bar';
import { Foot } from './foot';
import styles from './phone-parts.module.css';
import { OffCrew } from './off-crew';
import { RecordBar } from './record-bar';
import { SecondTouch } from './second-touch';
import { SubPlace } from './sub-place';
import { TakeTurn } from './take-turn';
import { TrainFacts } from './train-facts';
import { useTurnScene } from './turn-context';
import { usePlaces, type Places } from './use-places';

/** The page of a turn and the pages behind its buttons. */
export function TurnPlaces() {
  const { turn, me } = useTurnScene();
  const places = usePlaces();
  const [isHelping, setHelping] = useState(false);
  if (me.roles.length === 0) return <OffCrew onRecord={places.recordQuietly} />;
  const isOutside = me.role === null && !isHelping && turn.annulled === null && places.done === null;
  if (isOutside && places.place.kind === 'act') {
    return <TakeTurn ways={places.ways} onTaken={places.recordQuietly} onHelp={() => setHelping(true)} />;
  }
  if (places.place.kind === 'act') return <ActNow places={places} />;
  if (places.place.kind === 'second') return <SecondPlace places={places} />;
  return <SubPlace places={places} />;
}

function ActNow({ places }: { places: Places }) {
  const { turn } = useTurnScene();
  // A relief without a signal needs the names.
  usePrefetchQuery(crewQuery(turn.terminal));
  const { state } = useOutbox();
  const { act, done, isPicked, undo, endUndo, ways } = places;
  const bar =
    done === null ? null : (
      <DoneBar
        key={done.entryId}
        done={done}
        zone={turn.zone}
        where={whereIs(done.entryId, state)}
        onUndo={undo}
        onOver={endUndo}
      />
    );
  return (
    <ActPlace key={actKey(act)} act={act} isPicked={isPicked} doneBar={bar} onGoOn={endUndo} {...ways} />
  );
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
      <Foot>
        <RecordBar barKey="not-yet" isOwnChange hollow over="Nothing is recorded yet" onRecord={toAct}>
          Not yet, go back
        </RecordBar>
      </Foot>
    </>
  );
}
