import { useId, useState } from 'react';
import styles from './phone-parts.module.css';
import { useHeadingFocus } from './use-heading-focus';

/** Longest note the log takes. */
const longestNote = 1000;

/** A few words to the desk, kept with the turn. */
export function NotePlace({
  about,
  onNote,
  onBack,
}: {
  about: string;
  onNote: (note: string) => void;
  onBack: () => void;
}) {
  const id = useId();
  const heading = useHeadingFocus();
  const [note, setNote] = useState('');
  return (
    <>
      <div>
        <h1 tabIndex={-1} ref={heading}>
          Note to the desk
        </h1>
        <p>{about}</p>
      </div>
      <div className={styles.field}>
        <label htmlFor={id}>What the desk should know</label>
        <textarea
          id={id}
          maxLength={longestNote}
          value={note}
          onChange={(event) => setNote(event.target.value)}
        />
        <p className="muted">
          It stays with the turn, with your name and the time. For anything urgent use the radio.
        </p>
      </div>
      <div className={styles.buttons}>
        <button type="button" className={styles.button} onClick={onBack}>
          Back
        </button>
        <button
          type="button"
          className={styles.button}
          disabled={note.trim() === ''}
          onClick={() => onNote(note.trim())}
        >
          Send to desk
        </button>
      </div>
    </>
  );
}
