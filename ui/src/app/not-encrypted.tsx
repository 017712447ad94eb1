import { pageOrigin } from '../config/environment';
import styles from './shell.module.css';

/** Stands as long as the page came over plain http from another machine. */
export function NotEncrypted() {
  if (!pageOrigin(window.location).isUnencrypted) return null;
  return <p className={styles.notEncrypted}>Not encrypted: phones cannot work offline.</p>;
}
