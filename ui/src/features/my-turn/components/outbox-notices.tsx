import { formatClock } from '../../../lib/time-display';
import type { LostEntry } from '../../../lib/outbox/outbox-tally';
import styles from './phone-parts.module.css';

/** The phone refuses to keep anything: entries live as long as this page, and the person must know. */
export function UnkeptNotice({ isUnkept }: { isUnkept: boolean }) {
  if (!isUnkept) return null;
  return (
    <div className={styles.said} role="alert">
      <p>
        <b>This phone keeps nothing: its storage is full or shut.</b> Leave this page open until all is sent.
        Private windows and a full phone do this.
      </p>
    </div>
  );
}

/** Entries that were on this phone and are gone without a receipt. */
export function LostNotice({
  lost,
  zone,
  onRead,
}: {
  lost: readonly LostEntry[];
  zone: string;
  onRead: () => void;
}) {
  if (lost.length === 0) return null;
  return (
    <div className={styles.said} role="alert">
      <p>
        <b>{lost.length === 1 ? '1 entry is lost.' : `${lost.length} entries are lost.`}</b> Kept on this
        phone, not sent, and here no more. The desk has been told. If it happened, record it again as entered
        later.
      </p>
      <ul>
        {lost.map(({ id, label, about, observedAt }) => (
          <li key={id}>
            {label}, {formatClock(observedAt, zone)}
            {about === '' ? '' : `, ${about}`}
          </li>
        ))}
      </ul>
      <button type="button" className={`${styles.line} ${styles.underlined}`} onClick={onRead}>
        I have read it
      </button>
    </div>
  );
}
