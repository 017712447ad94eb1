import { recordLine } from '../model/record-words';
import { recordsOf, wayBack } from '../model/turn-records';
import { RadioSign } from './phone-icons';
import styles from './phone-parts.module.css';
import type { Place } from './place';
import { useTurnScene } from './turn-context';

/** The newest record of the turn with the way to take it back or have it corrected. */
export function NewestRecord({ onGo }: { onGo: (place: Place) => void }) {
  const { turn, entries, me } = useTurnScene();
  const record = recordsOf(turn, entries).at(-1);
  if (record === undefined) return null;
  const way = wayBack(record, turn, me.id);
  return (
    <div className={styles.line}>
      {record.source === 'by-radio' && <RadioSign />}
      <span className={styles.grows}>{recordLine({ ...record, reading: null }, turn.zone)}</span>
      {way !== null && (
        <button
          type="button"
          className={`${styles.link} ${styles.push}`}
          aria-label={`${way === 'withdraw' ? 'Withdraw' : 'Correct'} ${record.label}`}
          onClick={() =>
            onGo(way === 'withdraw' ? { kind: 'withdraw', record } : { kind: 'correct', record })
          }
        >
          {way === 'withdraw' ? 'Withdraw' : 'Correct'}
        </button>
      )}
    </div>
  );
}
