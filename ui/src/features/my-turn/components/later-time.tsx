import { useId, useState } from 'react';
import type { Instant } from '@stubpost/shared';
import { formatClock, formatRelative } from '../../../lib/time-display';
import { minutesAgo, minutesAgoChoices, momentOfClock } from '../model/entered-later';
import styles from './phone-parts.module.css';
import { useTurnScene } from './turn-context';

export interface LaterTimeProps {
  /** The time chosen so far; null before the first choice. There is no default. */
  chosen: Instant | null;
  onChoose: (moment: Instant | null) => void;
  /** Back to recording now; absent where an act can only be entered later. */
  onNow?: () => void;
}

/** When it happened, for an act that is recorded after it: so many minutes ago, or a time typed. */
export function LaterTime({ chosen, onChoose, onNow }: LaterTimeProps) {
  const { turn, now } = useTurnScene();
  const id = useId();
  const [typed, setTyped] = useState('');
  const [ago, setAgo] = useState<number | null>(null);
  const typedMoment = momentOfClock(typed, turn.zone, now);

  const choose = (minutes: number): void => {
    setAgo(minutes);
    setTyped('');
    onChoose(minutesAgo(now, minutes));
  };
  const type = (text: string): void => {
    setTyped(text);
    setAgo(null);
    onChoose(momentOfClock(text, turn.zone, now));
  };

  return (
    <section className={styles.next} aria-label="When it happened">
      <h3>When did it happen?</h3>
      <div className={styles.pairs}>
        {minutesAgoChoices.map((minutes) => (
          <button
            key={minutes}
            type="button"
            className={styles.button}
            aria-pressed={ago === minutes}
            onClick={() => choose(minutes)}
          >
            {minutes} min ago
          </button>
        ))}
      </div>
      <div className={styles.field}>
        <label htmlFor={id}>Or the time, 24-hour clock</label>
        <input
          id={id}
          inputMode="numeric"
          autoComplete="off"
          value={typed}
          aria-describedby={`${id}-hint`}
          onChange={(event) => type(event.target.value)}
        />
        <p id={`${id}-hint`} className={typed !== '' && typedMoment === null ? styles.problem : 'muted'}>
          {typed !== '' && typedMoment === null
            ? 'Not a time that has been. Four digits, such as 1722'
            : 'Four digits, or six with seconds'}
        </p>
      </div>
      {chosen !== null && (
        <p role="status">
          Recorded as <b>{formatClock(chosen, turn.zone)}</b>, {formatRelative(chosen, now)}, entered later.
        </p>
      )}
      {onNow !== undefined && (
        <button type="button" className={`${styles.button} ${styles.wide}`} onClick={onNow}>
          Record it as now instead
        </button>
      )}
    </section>
  );
}
