import { labelOf } from '../model/turn-records';
import type { ActWays } from './act-ways';
import { RadioAsk } from './radio-ask';
import { ReliefAsk } from './relief-ask';
import { OpenSign, OnwardSign } from './phone-icons';
import styles from './phone-parts.module.css';
import { useTurnScene } from './turn-context';

/** What others wait for this person to say: yes to a step from the radio, yes to a relief; and what is in question. */
export function AskedOfMe({ ways }: { ways: ActWays }) {
  const { turn, me } = useTurnScene();
  const isCrew = me.role !== null;
  const asked = isCrew ? (turn.asksAgreement ?? []) : [];
  const reliefs = (turn.reliefs ?? []).filter(({ awaits }) => awaits === me.id);
  const questions = turn.inQuestion ?? [];
  return (
    <>
      {reliefs.map((relief) => (
        <ReliefAsk key={relief.entryId} relief={relief} ways={ways} />
      ))}
      {asked.map((each) => (
        <RadioAsk key={each.entryId} asked={each} ways={ways} />
      ))}
      {questions.length > 0 && (
        <div className={styles.lines}>
          {questions.map(({ step, accounts }) => (
            <button
              key={step}
              type="button"
              className={styles.line}
              onClick={() => ways.onGo({ kind: 'record', key: step })}
            >
              <OpenSign size={22} />
              <span className={styles.grows}>
                {labelOf(turn, step)}: {accounts.length === 2 ? 'two times' : `${accounts.length} times`}, in
                question
              </span>
              <OnwardSign size={22} />
            </button>
          ))}
        </div>
      )}
    </>
  );
}
