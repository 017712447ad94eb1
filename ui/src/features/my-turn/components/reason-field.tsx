import { useId } from 'react';
import styles from './phone-parts.module.css';

/** Longest reason the log takes. */
const longestReason = 300;

/** A reason: one touch for the usual ones, words for any other. Words win over a touch. */
export function ReasonField({
  reasons,
  chosen,
  typed,
  onChosen,
  onTyped,
}: {
  reasons: readonly string[];
  chosen: string | null;
  typed: string;
  onChosen: (reason: string) => void;
  onTyped: (words: string) => void;
}) {
  const id = useId();
  return (
    <>
      <div className={styles.choices} role="group" aria-label="Reason">
        {reasons.map((each) => (
          <button
            key={each}
            type="button"
            className={`${styles.button} ${styles.wide}`}
            aria-pressed={each === chosen && typed.trim() === ''}
            onClick={() => onChosen(each)}
          >
            {each}
          </button>
        ))}
      </div>
      <div className={styles.field}>
        <label htmlFor={id}>Other, in your words</label>
        <input
          id={id}
          maxLength={longestReason}
          autoComplete="off"
          className={styles.words}
          value={typed}
          onChange={(event) => onTyped(event.target.value)}
        />
      </div>
    </>
  );
}
