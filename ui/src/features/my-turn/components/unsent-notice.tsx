import { formatClock } from '../../../lib/time-display';
import { useEntryQueue } from '../api/use-entry-queue';
import styles from './phone-parts.module.css';
import { useTurnScene } from './turn-context';

/** Says plainly that entries are on the phone only, and what that asks of the person. Nothing while sending works. */
export function UnsentNotice() {
  const { failingSince } = useEntryQueue().state;
  const { turn } = useTurnScene();
  if (failingSince === null) return null;
  return (
    <p className={styles.said} role="status">
      <span>
        <b>No answer since {formatClock(failingSince, turn.zone)}.</b> Entries keep their own time and go by
        themselves. Leave this page open.
      </span>
    </p>
  );
}
