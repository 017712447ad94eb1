import type { NextAct } from '../model/next-act';
import type { ActWays } from './act-ways';
import { NewestRecord } from './newest-record';
import { CardSign, OnwardSign } from './phone-icons';
import styles from './phone-parts.module.css';
import { useTurnScene } from './turn-context';
import type { ActOnPage } from './use-act';
import { useTurnPlan } from './use-turn-rules';

/** Under the act: its instruction card, the newest record, the way to all steps. */
export function ActLines({ act, ways }: { act: NextAct; ways: ActWays }) {
  const { turn, steps } = useTurnScene();
  const plan = useTurnPlan();
  const recorded = turn.steps.filter((step) => step.doneAt !== null).length;
  const card = act.kind === 'step' ? steps.find((step) => step.key === act.step.key)?.instruction : undefined;
  return (
    <div className={styles.lines}>
      {act.kind === 'step' && card !== undefined && (
        <button
          type="button"
          className={styles.line}
          onClick={() => ways.onGo({ kind: 'card', step: act.step.key })}
        >
          <CardSign size={26} />
          Instruction card
          {plan !== undefined && <span className={styles.push}>version {plan.version}</span>}
          <OnwardSign size={22} />
        </button>
      )}
      <NewestRecord onGo={ways.onGo} />
      {turn.steps.length > 0 && (
        <button type="button" className={styles.line} onClick={() => ways.onGo({ kind: 'steps' })}>
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

/** The ways round an act: it cannot be done, it was earlier, something is broken, a word to the desk, somebody else takes over. */
export function SecondaryButtons({
  page,
  ways,
  isAfter,
  hasKeys,
}: {
  page: ActOnPage;
  ways: ActWays;
  isAfter: boolean;
  /** A number pad stands on the page, and no lines that lead to the steps and the card. */
  hasKeys: boolean;
}) {
  const { me } = useTurnScene();
  const { act } = page;
  const button = (words: string, onClick: () => void) => (
    <button type="button" className={styles.button} onClick={onClick}>
      {words}
    </button>
  );
  return (
    <div className={styles.buttons}>
      {act.kind === 'step' &&
        button('Can’t do', () =>
          ways.onGo({ kind: 'cannot-do', step: act.step.key, label: act.step.shortLabel }),
        )}
      {hasKeys && button('All steps', () => ways.onGo({ kind: 'steps' }))}
      {button('Defect', () => ways.onGo({ kind: 'defect' }))}
      {button('Desk', () => ways.onGo({ kind: 'note' }))}
      {!isAfter && !page.asksTime && button('Earlier', () => page.setAsksTime(true))}
      {me.role !== null && button('Hand over', () => ways.onGo({ kind: 'relief' }))}
    </div>
  );
}
