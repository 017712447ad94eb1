import { formatClock } from '../../../lib/time-display';
import { accountWords } from '../model/record-words';
import styles from './phone-parts.module.css';
import { useTurnScene } from './turn-context';

/** The accounts of one thing that differ, the one that counts first, and who decides. Nothing where they agree. */
export function InQuestion({ step }: { step: string }) {
  const { turn } = useTurnScene();
  const question = turn.inQuestion?.find((each) => each.step === step);
  if (question === undefined) return null;
  return (
    <section className={styles.said} aria-label="In question">
      <h2>In question</h2>
      <ul className={styles.accounts}>
        {question.accounts.map((account, index) => (
          <li key={account.entryId}>
            <b>{formatClock(account.at, turn.zone)}</b> {accountWords(account)}
            {index === 0 && ', counts until then'}
          </li>
        ))}
      </ul>
      <p>The desk rules which one counts. Both stay in the record.</p>
    </section>
  );
}
