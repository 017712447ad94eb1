import styles from './phone-parts.module.css';
import { ReasonField } from './reason-field';
import { useHeadingFocus } from './use-heading-focus';
import { useReason } from './use-reason';

export interface ReasonPlaceProps {
  title: string;
  /** What it is about, in one line. */
  about: string;
  /** Reasons to touch. */
  reasons: readonly string[];
  /** Words on the button that records: "Withdraw it". */
  action: string;
  onReason: (reason: string) => void;
  onBack: () => void;
}

/** Asks for a reason: one touch for the usual ones, words for any other. */
export function ReasonPlace({ title, about, reasons, action, onReason, onBack }: ReasonPlaceProps) {
  const heading = useHeadingFocus();
  const { reason, field } = useReason();
  return (
    <>
      <div>
        <h1 tabIndex={-1} ref={heading}>
          {title}
        </h1>
        <p>{about}</p>
      </div>
      <ReasonField reasons={reasons} {...field} />
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
