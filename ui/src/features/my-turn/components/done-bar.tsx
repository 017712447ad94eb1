import { useEffect, useLayoutEffect, useRef, useState } from 'react';
import { formatClock } from '../../../lib/time-display';
import { readDeviceClock } from '../../../lib/use-now';
import { undoState } from '../model/done-window';
import { UndoSign } from './phone-icons';
import styles from './phone-foot.module.css';
import type { Recorded } from './turn-context';
import { nextHeadingId } from './use-places';

/** How often the seconds on Undo are looked at. */
const lookMilliseconds = 200;

export interface DoneBarProps {
  done: Recorded;
  zone: string;
  /** Where the entry is: "on phone, sending", "sent". */
  where: string;
  onUndo: () => void;
  /** The ten seconds are over. */
  onOver: () => void;
}

/** What was just recorded, with Undo on the right third. Undo is deaf for the first second. */
export function DoneBar({ done, zone, where, onUndo, onOver }: DoneBarProps) {
  // The device's own clock: only the length of time counts here, and it must not jump when the clock is corrected.
  const [now, setNow] = useState(readDeviceClock);
  const undo = undoState(done.touchedAt, Math.max(now, done.touchedAt));
  const words = useFocusOfBar();

  useEffect(() => {
    const timer = setInterval(() => setNow(readDeviceClock()), lookMilliseconds);
    return () => clearInterval(timer);
  }, []);

  const isOver = undo.kind === 'gone';
  useEffect(() => {
    if (isOver) onOver();
  }, [isOver, onOver]);

  const takeBack = (): void => {
    if (undoState(done.touchedAt, readDeviceClock()).kind === 'open') onUndo();
  };

  return (
    <div className={`${styles.bar} ${styles.done}`} role="group" aria-label={done.label}>
      <div ref={words} tabIndex={-1}>
        <span>{done.label}</span>
        <b>Done {formatClock(done.observedAt, zone)}</b>
        <span>{where}</span>
      </div>
      <button type="button" className={styles.undo} aria-disabled={undo.kind !== 'open'} onClick={takeBack}>
        <UndoSign size={30} />
        <b>Undo</b>
        <span aria-hidden="true">{undo.kind === 'gone' ? '0 s' : `${undo.secondsLeft} s`}</span>
      </button>
    </div>
  );
}

/**
 * The bar that was touched is gone, and its focus with it: what was done takes it over, so that Undo is one Tab away.
 * When this bar goes in turn, with the focus in it, the next act takes it.
 */
function useFocusOfBar() {
  const words = useRef<HTMLDivElement>(null);
  useLayoutEffect(() => {
    const own = words.current;
    if (document.activeElement === null || document.activeElement === document.body)
      own?.focus({ preventScroll: true });
    return () => {
      if (own?.parentElement?.contains(document.activeElement) === true)
        setTimeout(() => document.getElementById(nextHeadingId)?.focus({ preventScroll: true }), 0);
    };
  }, []);
  return words;
}
