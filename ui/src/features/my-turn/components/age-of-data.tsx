import { millisecondsInSecond, type Instant } from '@stubpost/shared';
import { formatClock, formatSince } from '../../../lib/time-display';
import styles from './phone-parts.module.css';

/** What the service told is called old after this long; it is asked every 15 s. Our choice. */
const oldAfterSeconds = 45;

/** Says how old the picture is, once it is old. What is recorded on this phone stands in it all the same. */
export function AgeOfData({
  what,
  toldAt,
  now,
  zone,
}: {
  what: string;
  toldAt: Instant | null;
  now: Instant;
  zone: string;
}) {
  if (toldAt === null || now - toldAt < oldAfterSeconds * millisecondsInSecond) return null;
  return (
    <p className={styles.said}>
      <span>
        <b>
          {what} as of {formatClock(toldAt, zone)}
        </b>
        , {formatSince(toldAt, now)}. No answer since. Your own entries stand in it.
      </span>
    </p>
  );
}
