import { useState } from 'react';
import { useOutbox } from '../../../lib/outbox/use-outbox';
import { whereIs } from '../model/where-is';
import type { ActWays } from './act-ways';
import { DefectPlace } from './defect-place';
import { DoneBar } from './done-bar';
import { NotePlace } from './note-place';
import styles from './phone-parts.module.css';
import type { Place } from './place';
import { emptyTieUp, type TieUpForm } from '../model/tie-up';
import { TieUpPlace } from './tie-up-place';
import { TiedUp } from './tied-up';
import { useTurnScene } from './turn-context';
import { useDone } from './use-done';
import { useTopOfPlace } from './use-places';
import { useReason } from './use-reason';

/** The page of a tie-up and the pages behind its buttons. */
export function TieUpPlaces() {
  const { turn } = useTurnScene();
  const outbox = useOutbox().state;
  const { done, keep, undo, endUndo } = useDone();
  const [place, setPlace] = useState<Place>({ kind: 'act' });
  // Kept here, so that a defect reported half-way takes nothing of it away.
  const [form, setForm] = useState<TieUpForm>(emptyTieUp);
  const reason = useReason();
  const isTiedUp = (turn.tiedUp ?? null) !== null || done?.label.startsWith('Tied up') === true;
  useTopOfPlace(`${place.kind} ${isTiedUp}`);
  const toAct = (): void => setPlace({ kind: 'act' });
  const ways: ActWays = {
    onRecord: (draft, label, earlier) => {
      keep(draft, { label, earlier }, toAct);
    },
    onGo: setPlace,
  };
  const bar =
    done === null ? null : (
      <DoneBar
        key={done.entryId}
        done={done}
        zone={turn.zone}
        where={whereIs(done.entryId, outbox)}
        onUndo={undo}
        onOver={endUndo}
      />
    );
  if (place.kind === 'defect') return <DefectPlace ways={ways} onBack={toAct} />;
  if (place.kind === 'note')
    return (
      <div className={styles.main}>
        <NotePlace
          about={`Set ${turn.set ?? 'not known'}, track ${turn.track ?? 'not known'}`}
          onNote={(note) => ways.onRecord({ kind: 'note', note }, 'Note to the desk', null)}
          onBack={toAct}
        />
      </div>
    );
  if (isTiedUp) return <TiedUp ways={ways} doneBar={bar} />;
  return <TieUpPlace ways={ways} doneBar={bar} form={form} onForm={setForm} reasoned={reason} />;
}
