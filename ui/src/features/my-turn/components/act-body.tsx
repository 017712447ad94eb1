import { actLabel } from '../model/next-act';
import { ActInputs } from './act-inputs';
import { ActLines, SecondaryButtons } from './act-lines';
import type { ActWays } from './act-ways';
import { AskedOfMe } from './asked-of-me';
import { Finished } from './finished';
import { LaterTime } from './later-time';
import { LockNotice, LockWords } from './lock-notice';
import { NextStep } from './next-step';
import { OpenCount } from './open-count';
import styles from './phone-parts.module.css';
import { UnsentNotice } from './unsent-notice';
import type { ActOnPage } from './use-act';

export interface ActBodyProps {
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
  const hasKeys = page.active !== null && !isAfter && !isShut;
  if (act.kind === 'nothing') return <Finished ways={ways} />;
  return (
    <>
      <UnsentNotice />
      <AskedOfMe ways={ways} />
      {brakes.shortCount !== null && !isAfter && (
        <OpenCount
          count={brakes.shortCount}
          {...(page.waitsFor === null && !isShut
            ? { onRelease: () => ways.onGo({ kind: 'second', page }) }
            : {})}
          onTellDesk={(note) => ways.onRecord({ kind: 'note', note }, 'Sent to desk', null)}
        />
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
      {!hasKeys && <ActLines act={act} ways={ways} />}
      <SecondaryButtons page={page} ways={ways} isAfter={isAfter} hasKeys={hasKeys} />
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
