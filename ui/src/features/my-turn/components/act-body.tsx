import { SafetyCaution } from '../../../components/caution';
import { actLabel } from '../model/next-act';
import { ActInputs } from './act-inputs';
import type { ActWays } from './act-ways';
import { LastEntry } from './last-entry';
import { LaterTime } from './later-time';
import { LockNotice, LockWords } from './lock-notice';
import { NextStep } from './next-step';
import { OpenCount } from './open-count';
import styles from './phone-parts.module.css';
import { OnwardSign } from './phone-icons';
import { useTurnScene } from './turn-context';
import { UnsentNotice } from './unsent-notice';
import type { ActOnPage } from './use-act';

interface ActBodyProps {
  page: ActOnPage;
  lead: string;
  isAfter: boolean;
  ways: ActWays;
  /** Brings this act under the bar although the last one can still be undone. */
  onGoOn: () => void;
}

/** What an act is, what it asks for, what stands in its way, and the ways round it. */
export function ActBody({ page, lead, isAfter, ways, onGoOn }: ActBodyProps) {
  const { act, lock, isLockLifted, brakes } = page;
  const isDue = act.kind === 'step' && (act.step.state === 'due' || act.step.state === 'overdue');
  // A shut bar asks for nothing yet: first its reason, then cars and keys.
  const isShut = lock !== null && !isLockLifted;
  if (act.kind === 'nothing') return <Finished ways={ways} />;
  return (
    <>
      <UnsentNotice />
      {brakes.shortCount !== null && !isAfter && (
        <OpenCount count={brakes.shortCount} onTellDesk={ways.onTellDesk} />
      )}
      <NextStep
        act={act}
        lead={lead}
        isBrief={(page.fields.length > 0 || page.asksTime) && !isAfter}
        {...hintOf(page, isAfter)}
      >
        {!isAfter && !isShut && <ActInputs page={page} />}
        {isAfter && isDue && (
          <button type="button" className={`${styles.button} ${styles.wide}`} onClick={onGoOn}>
            Go on to {actLabel(act)}
          </button>
        )}
      </NextStep>
      {!isAfter && isShut && <LockNotice lock={lock} onLift={page.liftLock} />}
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

/** The newest record, and the way to all steps. */
export function Lines({ ways }: { ways: ActWays }) {
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
      <UnsentNotice />
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
