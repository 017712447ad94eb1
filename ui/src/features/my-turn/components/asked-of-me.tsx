import { asksFrom } from '../model/asks-from';
import { labelOf } from '../model/turn-records';
import type { ActWays } from './act-ways';
import { OnwardSign, OpenSign } from './phone-icons';
import styles from './phone-parts.module.css';
import { RadioAsk } from './radio-ask';
import { ReliefAsk } from './relief-ask';
import { useTurnScene } from './turn-context';

/** What others wait for this person to say: yes to a relief, yes to a step from the radio; and what is in question. */
export function AskedOfMe({ ways }: { ways: ActWays }) {
  const { turn, me } = useTurnScene();
  const questions = turn.inQuestion ?? [];
  return (
    <>
      {asksFrom(turn, me.id).map((ask) =>
        ask.kind === 'relief' ? (
          <ReliefAsk key={ask.relief.entryId} relief={ask.relief} ways={ways} />
        ) : (
          <RadioAsk key={ask.asked.entryId} asked={ask.asked} ways={ways} />
        ),
      )}
      {questions.length > 0 && (
        <div className={styles.lines}>
          {questions.map(({ step }) => (
            <button
              key={step}
              type="button"
              className={styles.line}
              onClick={() => ways.onGo({ kind: 'record', key: step })}
            >
              <OpenSign size={22} />
              <span className={styles.grows}>{labelOf(turn, step)}: in question</span>
              <OnwardSign size={22} />
            </button>
          ))}
        </div>
      )}
    </>
  );
}
