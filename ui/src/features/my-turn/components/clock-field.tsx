import type { Instant } from '@stubpost/shared';
import { useId, useState } from 'react';
import { momentOfClock } from '../model/entered-later';
import styles from './phone-parts.module.css';
import { useTurnScene } from './turn-context';

/** A time typed by the 24-hour clock, up to now. Nothing stands in it at first. */
export function ClockField({
  label,
  onMoment,
}: {
  label: string;
  /** The moment typed; null while it cannot be read. */
  onMoment: (moment: Instant | null) => void;
}) {
  const { turn, now } = useTurnScene();
  const id = useId();
  const [typed, setTyped] = useState('');
  const isWrong = typed !== '' && momentOfClock(typed, turn.zone, now) === null;
  return (
    <div className={styles.field}>
      <label htmlFor={id}>{label}</label>
      <input
        id={id}
        inputMode="numeric"
        autoComplete="off"
        value={typed}
        aria-invalid={isWrong}
        aria-describedby={`${id}-hint`}
        onChange={(event) => {
          setTyped(event.target.value);
          onMoment(momentOfClock(event.target.value, turn.zone, now));
        }}
      />
      <p id={`${id}-hint`} className={isWrong ? styles.problem : 'muted'}>
        {isWrong ? 'Not a time that has been. Four digits, such as 1722' : 'Four digits, or six with seconds'}
      </p>
    </div>
  );
}
