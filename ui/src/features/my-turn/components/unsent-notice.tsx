import { formatClock } from '../../../lib/time-display';
import { useOutbox } from '../../../lib/outbox/use-outbox';
import { AgeOfData } from './age-of-data';
import { UnkeptNotice } from './outbox-notices';
import styles from './phone-parts.module.css';
import { useTurnScene } from './turn-context';

/** Says plainly that entries are on the phone only, what that asks of the person, and how old the picture is. Nothing while all is well. */
export function UnsentNotice() {
  const { failingSince, storage } = useOutbox().state;
  const { turn, toldAt, now } = useTurnScene();
  if (storage === 'refused') return <UnkeptNotice isUnkept />;
  if (failingSince === null) return <AgeOfData what="Turn" toldAt={toldAt} now={now} zone={turn.zone} />;
  return (
    <p className={styles.said} role="status">
      <span>
        <b>No answer since {formatClock(failingSince, turn.zone)}.</b> Entries are kept on this phone with
        their own time and go by themselves.
      </span>
    </p>
  );
}
