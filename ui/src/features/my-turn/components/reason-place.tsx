import { useId, useState } from 'react';
import styles from './phone-parts.module.css';
import { useHeadingFocus } from './use-heading-focus';

/** Longest reason the log takes. */
const longestReason = 300;

export interface ReasonPlaceProps {
  title: string;
  /** What it is about, in one line. */
  about: string;
  /** Reasons to touch. */
  reasons: readonly string[];
  /** Words on the button that records: "Record: can’t do". */
  action: string;
  onReason: (reason: string) => void;
  onBack: () => void;
}

/** Asks for a reason: one touch for the usual ones, words for any other. */
export function ReasonPlace({ title, about, reasons, action, onReason, onBack }: ReasonPlaceProps) {
  const id = useId();
  const heading = useHeadingFocus();
  const [chosen, setChosen] = useState<string | null>(null);
  const [typed, setTyped] = useState('');
  const reason = (typed.trim() === '' ? chosen : typed.trim()) ?? '';
  return (
    <>
      <div>
        <h1 tabIndex={-1} ref={heading}>
          {title}
        </h1>
        <p>{about}</p>
      </div>
      <div className={styles.choices} role="group" aria-label="Reason">
        {reasons.map((each) => (
          <button
            key={each}
            type="button"
            className={`${styles.button} ${styles.wide}`}
            aria-pressed={each === chosen && typed.trim() === ''}
            onClick={() => {
              setChosen(each);
              setTyped('');
            }}
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
          onChange={(event) => setTyped(event.target.value)}
        />
      </div>
      <div className={styles.buttons}>
        <button type="button" className={styles.button} onClick={onBack}>
          Back
        </button>
        <button
          type="button"
          className={styles.button}
          disabled={reason === ''}
          onClick={() => onReason(reason)}
        >
          {action}
        </button>
      </div>
    </>
  );
}
