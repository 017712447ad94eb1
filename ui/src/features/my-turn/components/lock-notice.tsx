import { BlueSignalFlag } from '../../../components/flags';
import { formatClock, formatRelative, formatTime } from '../../../lib/time-display';
import type { ActLock } from '../model/act-lock';
import styles from './phone-parts.module.css';
import { useTurnScene } from './turn-context';

/** Why the bar is shut, and the way past it: what has happened is recorded all the same. */
export function LockNotice({ lock, onLift }: { lock: ActLock; onLift: () => void }) {
  return (
    <section className={styles.said} aria-label="Why the bar is shut">
      <LockWords lock={lock} />
      <button type="button" className={`${styles.button} ${styles.wide}`} onClick={onLift}>
        {lock.kind === 'briefing' ? 'Not in the cab: record it' : 'It has happened: record it'}
      </button>
    </section>
  );
}

/** Standing words above an opened bar whose order is off. */
export function LockWords({ lock }: { lock: ActLock }) {
  const { turn, now } = useTurnScene();
  switch (lock.kind) {
    case 'blue-signal':
      return (
        <p>
          <BlueSignalFlag /> up since {formatClock(lock.since, turn.zone)}, {lock.by}. Only the person or
          craft that put it up takes it down.
        </p>
      );
    case 'briefing':
      return (
        <p>
          <b>The safety briefing comes first.</b> This step is made in the controlling cab: your railroad asks
          for a briefing with every crew member, and everybody’s agreement, before a device is used there. 49
          CFR 220.309.
        </p>
      );
    case 'missing':
      return (
        <p>
          <b>Not recorded before it: {lock.labels.join(', ')}.</b>
        </p>
      );
    case 'too-early':
      return (
        <p>
          <b>Not before {formatTime(lock.notBefore, turn.zone)}</b> by the plan,{' '}
          {formatRelative(lock.notBefore, now)}.
        </p>
      );
  }
}

/** The reason in the few words that fit into the bar. */
export function lockWord(lock: ActLock): string {
  switch (lock.kind) {
    case 'blue-signal':
      return 'blue signal up';
    case 'missing':
      return `waits for: ${lock.labels[0] ?? ''}${lock.labels.length > 1 ? ` and ${lock.labels.length - 1} more` : ''}`;
    case 'too-early':
      return 'too early by the plan';
    case 'briefing':
      return 'waits for the briefing';
  }
}
