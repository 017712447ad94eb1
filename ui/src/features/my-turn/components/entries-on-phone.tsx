import { formatClock } from '../../../lib/time-display';
import type { EntryQueue, QueueState } from '../model/entry-queue';
import { OnPhoneSign, OpenSign } from './phone-icons';
import styles from './phone-parts.module.css';

/** Entries of this phone that have no receipt yet, why, and what that asks of the person. */
export function EntriesOnPhone({
  queue,
  state,
  zone,
  onBack,
}: {
  queue: EntryQueue;
  state: QueueState;
  zone: string;
  onBack: () => void;
}) {
  const unsent = state.waiting.filter((entry) => entry.refusal === null);
  return (
    <>
      <h1>Entries on this phone</h1>
      {state.waiting.length === 0 && (
        <p>Nothing waits. {state.sentAt === null ? '' : `All sent ${formatClock(state.sentAt, zone)}.`}</p>
      )}
      {unsent.length > 0 && (
        <section className={styles.said}>
          <p>
            {state.failingSince === null ? (
              <b>Sending.</b>
            ) : (
              <b>No answer since {formatClock(state.failingSince, zone)}.</b>
            )}{' '}
            Entries keep their own time and go by themselves. Leave this page open until they are sent.
          </p>
        </section>
      )}
      <ul className={styles.lines}>
        {state.waiting.map((entry) => (
          <li key={entry.request.id}>
            <div className={styles.line}>
              {entry.refusal === null ? <OnPhoneSign /> : <OpenSign />}
              <b>{entry.label}</b>
              <span className={styles.push}>{formatClock(entry.request.observedAt, zone)}</span>
            </div>
            {entry.refusal !== null && (
              <>
                <p>Not taken: {entry.refusal.message}</p>
                <button
                  type="button"
                  className={`${styles.line} ${styles.underlined}`}
                  onClick={() => queue.dismiss(entry.request.id)}
                >
                  I have read it, take it off this phone
                </button>
              </>
            )}
          </li>
        ))}
      </ul>
      <div className={styles.buttons}>
        {unsent.length > 0 && (
          <button type="button" className={styles.button} onClick={queue.poke}>
            Try now
          </button>
        )}
        <button type="button" className={styles.button} onClick={onBack}>
          Back
        </button>
      </div>
    </>
  );
}
