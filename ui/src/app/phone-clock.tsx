import { clockWords } from '../lib/clock-words';
import { clockOffsetMilliseconds, useNow } from '../lib/use-now';
import styles from './phone-shell.module.css';

/** Says by how much the phone's clock is wrong, once that is more than two seconds. */
export function PhoneClock() {
  useNow(5);
  const words = clockWords(clockOffsetMilliseconds());
  return words === null ? null : (
    <p className={styles.clockOff}>Phone clock {words}. Times here are the server’s; every entry says so.</p>
  );
}
