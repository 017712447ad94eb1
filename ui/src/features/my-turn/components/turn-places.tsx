import { useCallback, useState } from 'react';
import { useEntryQueue } from '../api/use-entry-queue';
import { actKey, isSettled, nextAct, type NextAct } from '../model/next-act';
import { ActPlace, draftOf, type ActWays } from './act-place';
import { AllSteps } from './all-steps';
import { DoneBar } from './done-bar';
import { EntriesOnPhone } from './entries-on-phone';
import { Foot } from './foot';
import type { EntryToWithdraw } from './last-entry';
import { NotePlace } from './note-place';
import styles from './phone-parts.module.css';
import { ReasonPlace } from './reason-place';
import { RecordBar } from './record-bar';
import { SecondTouch } from './second-touch';
import { TakeTurn } from './take-turn';
import { TrainFacts } from './train-facts';
import { useTurnScene, type Recorded } from './turn-context';
import type { ActOnPage } from './use-act';

/** What is on the page now. */
type Place =
  | { kind: 'act' }
  | { kind: 'second'; page: ActOnPage }
  | { kind: 'steps' }
  | { kind: 'cannot-do'; step: string; label: string }
  | { kind: 'note' }
  | { kind: 'withdraw'; entry: EntryToWithdraw }
  | { kind: 'phone' };

const cannotDoReasons = [
  'Waiting for the engineer',
  'Waiting for the conductor',
  'Equipment will not answer',
  'Not safe to go there',
];
const withdrawReasons = ['Wrong step', 'Wrong train', 'Wrong time'];
const undoReason = 'withdrawn by same hand';

/** The page of a turn and the pages behind its buttons. */
export function TurnPlaces() {
  const scene = useTurnScene();
  const { turn, steps, me, record, now, marker } = scene;
  const queue = useEntryQueue();
  const [place, setPlace] = useState<Place>({ kind: 'act' });
  const [picked, setPicked] = useState<string | null>(null);
  const [done, setDone] = useState<Recorded | null>(null);
  const [isHelping, setHelping] = useState(false);

  const pickedStep = turn.steps.find((step) => step.key === picked && !isSettled(step));
  const act: NextAct = pickedStep === undefined ? nextAct(turn, steps) : { kind: 'step', step: pickedStep };
  const toAct = (): void => setPlace({ kind: 'act' });
  const endUndo = useCallback(() => setDone(null), []);

  const keep = (recorded: Recorded): void => {
    setDone(recorded);
    setPicked(null);
    toAct();
  };
  const takeBack = (): void => {
    if (done !== null)
      record(
        { kind: 'withdrawn', target: done.entryId, reason: undoReason },
        { label: `Undo: ${done.label}` },
      );
    setDone(null);
  };
  const tellDesk = (note: string): void =>
    keep(record({ kind: 'note', note }, { label: 'Note to the desk' }));

  const ways: ActWays = {
    onRecord: (draft, label, earlier) => keep(record(draft, { label, earlier })),
    onSecond: (page) => setPlace({ kind: 'second', page }),
    onSteps: () => setPlace({ kind: 'steps' }),
    onCannotDo: () => {
      if (act.kind === 'step')
        setPlace({ kind: 'cannot-do', step: act.step.key, label: act.step.shortLabel });
    },
    onNote: () => setPlace({ kind: 'note' }),
    onTellDesk: tellDesk,
    onWithdraw: (entry) => setPlace({ kind: 'withdraw', entry }),
    onPhone: () => setPlace({ kind: 'phone' }),
  };
  const about = `Train ${turn.outbound?.train ?? turn.inbound?.train ?? ''}, track ${turn.track ?? 'not known'}`;

  if (
    me.role === null &&
    !isHelping &&
    turn.annulled === null &&
    me.roles.length > 0 &&
    place.kind === 'act'
  ) {
    return (
      <TakeTurn
        onTaken={(role) =>
          record({ kind: 'crew', person: me.id, as: role }, { label: `I have this turn, ${role}` })
        }
        onHelp={() => setHelping(true)}
        onPhone={ways.onPhone}
      />
    );
  }

  // Somebody else recorded the release meanwhile: there is nothing left for a second touch.
  const shown =
    place.kind === 'second' && actKey(place.page.act) !== actKey(act) ? { kind: 'act' as const } : place;
  switch (shown.kind) {
    case 'act':
      return (
        <ActPlace
          key={actKey(act)}
          act={act}
          isPicked={pickedStep !== undefined}
          doneBar={
            done === null ? null : (
              <DoneBar
                key={done.entryId}
                done={done}
                zone={turn.zone}
                where={whereWords(done, queue.state.waiting)}
                onUndo={takeBack}
                onOver={endUndo}
              />
            )
          }
          onGoOn={endUndo}
          {...ways}
        />
      );
    case 'second':
      return (
        <>
          <div className={styles.main}>
            <TrainFacts turn={turn} now={now} marker={marker} />
            <SecondTouch
              page={shown.page}
              onRecord={() => {
                const draft = draftOf(shown.page.act, shown.page.reading);
                if (draft !== null) ways.onRecord(draft, 'Handbrakes released', shown.page.earlier);
              }}
            />
          </div>
          <Foot onPhone={ways.onPhone}>
            <RecordBar barKey="not-yet" isOwnChange hollow over="Handbrake released" onRecord={toAct}>
              Not yet, go back
            </RecordBar>
          </Foot>
        </>
      );
    case 'steps':
      return (
        <Sub>
          <AllSteps
            onPick={(key) => {
              setPicked(key);
              setDone(null);
              toAct();
            }}
            onBack={toAct}
          />
        </Sub>
      );
    case 'cannot-do':
      return (
        <Sub>
          <ReasonPlace
            title={`Can’t do: ${shown.label}`}
            about={about}
            reasons={cannotDoReasons}
            action="Send to desk"
            onReason={(reason) =>
              keep(
                record(
                  { kind: 'cannot-do', step: shown.step, reason },
                  { label: `Can’t do: ${shown.label}` },
                ),
              )
            }
            onBack={toAct}
          />
        </Sub>
      );
    case 'note':
      return (
        <Sub>
          <NotePlace about={about} onNote={tellDesk} onBack={toAct} />
        </Sub>
      );
    case 'withdraw':
      return (
        <Sub>
          <ReasonPlace
            title="Withdraw"
            about={`${shown.entry.words}. The first entry stays in the log.`}
            reasons={withdrawReasons}
            action="Withdraw it"
            onReason={(reason) => {
              record(
                { kind: 'withdrawn', target: shown.entry.entryId, reason },
                { label: `Withdrawn: ${shown.entry.words}` },
              );
              toAct();
            }}
            onBack={toAct}
          />
        </Sub>
      );
    case 'phone':
      return (
        <Sub>
          <EntriesOnPhone queue={queue} state={queue.state} zone={turn.zone} onBack={toAct} />
        </Sub>
      );
  }
}

/** A page behind a button: no bar, so that nothing is recorded by the way. */
function Sub({ children }: { children: React.ReactNode }) {
  return <div className={styles.main}>{children}</div>;
}

function whereWords(done: Recorded, waiting: readonly { request: { id: string }; tries: number }[]): string {
  const entry = waiting.find(({ request }) => request.id === done.entryId);
  if (entry === undefined) return 'sent';
  return entry.tries === 0 ? 'on phone, sending' : 'on phone, not sent';
}
