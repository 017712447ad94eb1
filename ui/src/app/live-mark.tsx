import { useEffect } from 'react';
import { announce } from '../lib/announcer';
import { useLiveState } from '../lib/live';
import { formatClock } from '../lib/time-display';
import styles from './shell.module.css';

/** Whether what is on screen is of this moment. When not, the words take the place of the mark, so that no row moves. */
export function LiveMark({ zone }: { zone: string }) {
  const { live, lastWordAt, retryInSeconds } = useLiveState();
  const isLost = !live && lastWordAt !== null;
  useEffect(() => {
    if (isLost) announce('Not live. The page asks for news every 15 seconds');
  }, [isLost]);

  if (lastWordAt === null && retryInSeconds === 0) return <span className={styles.live}>Connecting</span>;
  const clock = lastWordAt === null ? 'none yet' : formatClock(lastWordAt, zone);
  if (live) {
    return (
      <span className={styles.live} data-live="on">
        <b>Live</b>
        <span className={styles.lastWord}>last word from the server {clock}</span>
      </span>
    );
  }
  return (
    <span className={styles.notLive} data-live="off">
      <span>
        <b>Not live.</b> Last update {clock}. Trying again in {retryInSeconds} s
      </span>
    </span>
  );
}
