import type { WireReading } from '@stubpost/shared';
import type { ReactNode } from 'react';
import { SafetyCaution } from '../../../components/caution';
import { barWords } from '../model/act-words';
import { controlsBar, type ControlsBar } from '../model/controls';
import type { EntryDraft } from '../model/entry-draft';
import { actKey, actLabel, hasLeft, type NextAct } from '../model/next-act';
import { ActInputs } from './act-inputs';
import { AtTheControls } from './at-the-controls';
import { Foot } from './foot';
import { LastEntry, type EntryToWithdraw } from './last-entry';
import { LaterTime } from './later-time';
import { LockNotice, LockWords, lockWord } from './lock-notice';
import { NextStep } from './next-step';
import { OpenCount } from './open-count';
import styles from './phone-parts.module.css';
import { OnwardSign } from './phone-icons';
import { RecordBar, ShutBar } from './record-bar';
import { SpareWords } from './spare-words';
import { TrainFacts } from './train-facts';
import { TurnPicture } from './turn-picture';
import { useTurnScene } from './turn-context';
import { useAct, type ActOnPage } from './use-act';

/** Where the buttons of the page lead. */
export interface ActWays {
  onRecord: (draft: EntryDraft, label: string, earlier: number | null) => void;
  /** To the second touch of a release. */
  onSecond: (page: ActOnPage) => void;
  onSteps: () => void;
  onCannotDo: () => void;
  onNote: () => void;
  onTellDesk: (words: string) => void;
  onWithdraw: (entry: EntryToWithdraw) => void;
  onPhone: () => void;
}

export interface ActPlaceProps extends ActWays {
  act: NextAct;
  /** The person chose this step out of the plan's order. */
  isPicked: boolean;
  /** While the last act can be undone its bar stands in the foot, and this act is what comes after. */
  doneBar: ReactNode;
  /** Brings this act under the bar although the last one can still be undone. */
  onGoOn: () => void;
}

/** What an act becomes in the log. */
export function draftOf(act: NextAct, reading: WireReading | undefined): EntryDraft | null {
  switch (act.kind) {
    case 'arrival':
    case 'departure':
      return { kind: act.kind };
    case 'step':
      return { kind: 'step-done', step: act.step.key, ...(reading === undefined ? {} : { reading }) };
    case 'nothing':
      return null;
  }
}

/** One act on the page of a turn: what it is, what it asks for, and the bar. */
export function ActPlace(props: ActPlaceProps) {
  const { act, doneBar, isPicked } = props;
  const { turn, now, steps, me, marker, nextArrivalAt } = useTurnScene();
  const page = useAct(act);
  const bar = controlsBar({ turn, steps, personId: me.id, act, now, nextArrivalAt });
  const isAfter = doneBar !== null;
  const hasInputs = page.fields.length > 0 && !isAfter;
  return (
    <>
      <div className={styles.main}>
        <TrainFacts turn={turn} now={now} marker={marker} />
        {bar === null || bar.kind === 'own-act' ? <Standing isCompact={hasInputs || page.asksTime} /> : null}
        {bar !== null && !isAfter ? (
          <AtTheControls bar={bar} />
        ) : (
          <ActBody page={page} lead={leadOf(isAfter, isPicked)} isAfter={isAfter} ways={props} />
        )}
      </div>
      <Foot onPhone={props.onPhone}>
        {doneBar ?? <ActBar page={page} bar={bar} isPicked={isPicked} ways={props} />}
      </Foot>
    </>
  );
}

const leadOf = (isAfter: boolean, isPicked: boolean): string =>
  isAfter ? 'After this' : isPicked ? 'Chosen step' : 'Next step';

/** The picture of the turn; where the page needs the room, only how it stands, and only when somebody must act. */
function Standing({ isCompact }: { isCompact: boolean }) {
  const { turn, now } = useTurnScene();
  if (!isCompact) return <TurnPicture turn={turn} now={now} />;
  if (turn.health === 'on-plan' || hasLeft(turn)) return null;
  return (
    <p>
      <SpareWords turn={turn} />
    </p>
  );
}

interface ActBodyProps {
  page: ActOnPage;
  lead: string;
  isAfter: boolean;
  ways: ActPlaceProps;
}

function ActBody({ page, lead, isAfter, ways }: ActBodyProps) {
  const { act, lock, isLockLifted, brakes } = page;
  const isDue = act.kind === 'step' && (act.step.state === 'due' || act.step.state === 'overdue');
  if (act.kind === 'nothing') return <Finished ways={ways} />;
  return (
    <>
      {brakes.shortCount !== null && !isAfter && (
        <OpenCount count={brakes.shortCount} onTellDesk={ways.onTellDesk} />
      )}
      <NextStep
        act={act}
        lead={lead}
        isBrief={(page.fields.length > 0 || page.asksTime) && !isAfter}
        {...hintOf(page, isAfter)}
      >
        {!isAfter && <ActInputs page={page} />}
        {isAfter && isDue && (
          <button type="button" className={`${styles.button} ${styles.wide}`} onClick={ways.onGoOn}>
            Go on to {actLabel(act)}
          </button>
        )}
      </NextStep>
      {!isAfter && lock !== null && !isLockLifted && <LockNotice lock={lock} onLift={page.liftLock} />}
      {!isAfter && lock !== null && isLockLifted && (
        <div className={styles.said}>
          <LockWords lock={lock} />
        </div>
      )}
      {!isAfter && page.asksTime && (
        <LaterTime
          chosen={page.earlier}
          onChoose={page.setEarlier}
          {...(page.mustBeLater ? {} : { onNow: () => page.setAsksTime(false) })}
        />
      )}
      {/* Where keys stand above the bar, nothing that takes back stands between them. */}
      {(isAfter || page.active === null) && <Lines ways={ways} />}
      <SecondaryButtons page={page} ways={ways} isAfter={isAfter} />
    </>
  );
}

/** On a page with keys the boxes say whose reading it is; nothing is said twice. */
function hintOf(page: ActOnPage, isAfter: boolean): { hint?: string } {
  if (page.brakes.hand !== null) return { hint: handHint(page) };
  return page.active !== null && !isAfter ? { hint: '' } : {};
}

function handHint({ brakes }: ActOnPage): string {
  if (brakes.hand === 'set')
    return brakes.cars.length > 0 ? 'Touch each car where one was set.' : 'Count those that were set.';
  return brakes.cars.length > 0
    ? 'Touch each car where one was released.'
    : 'Count those that were released.';
}

function Lines({ ways }: { ways: ActWays }) {
  const { turn } = useTurnScene();
  const recorded = turn.steps.filter((step) => step.doneAt !== null).length;
  return (
    <div className={styles.lines}>
      <LastEntry onWithdraw={ways.onWithdraw} />
      {turn.steps.length > 0 && (
        <button type="button" className={styles.line} onClick={ways.onSteps}>
          All steps
          <span className={styles.push}>
            {recorded} of {turn.steps.length} recorded
          </span>
          <OnwardSign size={22} />
        </button>
      )}
    </div>
  );
}

function SecondaryButtons({ page, ways, isAfter }: { page: ActOnPage; ways: ActWays; isAfter: boolean }) {
  return (
    <div className={styles.buttons}>
      {page.act.kind === 'step' && (
        <button type="button" className={styles.button} onClick={ways.onCannotDo}>
          Can’t do
        </button>
      )}
      {!isAfter && !page.asksTime && (
        <button type="button" className={styles.button} onClick={() => page.setAsksTime(true)}>
          Earlier
        </button>
      )}
      <button type="button" className={styles.button} onClick={ways.onNote}>
        Desk
      </button>
    </div>
  );
}

/** Nothing is left to record: says why, with the caution that this is no word about the train. */
function Finished({ ways }: { ways: ActWays }) {
  const { turn } = useTurnScene();
  return (
    <>
      <section className={styles.next} aria-label="Next step">
        <h2>{turn.annulled === null ? 'Nothing left to record' : 'Annulled'}</h2>
        {turn.annulled !== null && <p>{turn.annulled.reason}</p>}
      </section>
      <Lines ways={ways} />
      <button type="button" className={`${styles.button} ${styles.wide}`} onClick={ways.onNote}>
        Note to the desk
      </button>
      <SafetyCaution />
    </>
  );
}

interface ActBarProps {
  page: ActOnPage;
  bar: ControlsBar | null;
  isPicked: boolean;
  ways: ActPlaceProps;
}

/** The bar of an act: shut with its reason, open with its name. */
function ActBar({ page, bar, isPicked, ways }: ActBarProps) {
  const { turn } = useTurnScene();
  const { act, lock, reading, earlier, brakes } = page;
  const label = actLabel(act);
  if (bar !== null) {
    return (
      <ShutBar
        under={bar.kind === 'at-controls' ? 'until the next arrival' : 'the conductor or the desk records it'}
      >
        No bar here
      </ShutBar>
    );
  }
  const draft = draftOf(act, reading);
  if (draft === null)
    return (
      <ShutBar under={turn.annulled === null ? 'every step is recorded' : 'this turn does not run'}>
        Nothing open
      </ShutBar>
    );
  if (lock !== null && !page.isLockLifted) return <ShutBar under={lockWord(lock)}>{label}</ShutBar>;
  if (page.waitsFor !== null) return <ShutBar under={page.waitsFor}>{label}</ShutBar>;
  const words = barWords(label, brakes.hand, reading);
  const touch = (): void =>
    brakes.hand === 'released' ? ways.onSecond(page) : ways.onRecord(draft, words, earlier);
  const isOwn = isPicked || page.isLockLifted || page.fields.length > 0 || page.asksTime;
  return (
    <RecordBar
      barKey={actKey(act)}
      isOwnChange={isOwn}
      over={earlier === null ? 'Record now' : 'Record for earlier'}
      onRecord={touch}
    >
      {words}
    </RecordBar>
  );
}
