import { useLayoutEffect, useRef, type ReactNode } from 'react';
import { readDeviceClock } from '../../../lib/use-now';
import { touchCounts, type BarMemory } from '../model/done-window';
import styles from './phone-foot.module.css';

/**
 * Remembers what the bar shows, since when, and whether that came by itself. A bar that appears counts as changed by
 * itself too: the touch that brought the page up, or was meant for Undo, must not record.
 */
function useBarMemory(key: string, isOwnChange: boolean) {
  const memory = useRef<BarMemory | null>(null);
  useLayoutEffect(() => {
    if (memory.current?.key === key) return;
    memory.current = { key, changedAt: readDeviceClock(), byItself: !isOwnChange };
  }, [key, isOwnChange]);
  return memory;
}

export interface RecordBarProps {
  /** Names the act under the thumb. */
  barKey: string;
  /** The person brought the present act about (chose a step, put in a value): touches count at once. */
  isOwnChange?: boolean;
  /** Small words above and below the large ones. */
  over?: string;
  children: ReactNode;
  under?: string;
  hollow?: boolean;
  /** The second bar of a release, whose words are a whole record. */
  isSecond?: boolean;
  onRecord: () => void;
}

/**
 * The one bar. It acts when the thumb is lifted; sliding off calls it off, as with every button. A touch that came down
 * on another act, or within a second after the act changed by itself, does nothing.
 */
export function RecordBar({
  barKey,
  isOwnChange = false,
  over,
  children,
  under,
  hollow = false,
  isSecond = false,
  onRecord,
}: RecordBarProps) {
  const memory = useBarMemory(barKey, isOwnChange);
  const downOn = useRef<string | null>(null);
  const release = (): void => {
    const touch = { downOn: downOn.current, releasedAt: readDeviceClock() };
    downOn.current = null;
    if (memory.current !== null && touchCounts(memory.current, touch)) onRecord();
  };
  return (
    <button
      type="button"
      className={`${styles.bar} ${hollow ? styles.hollow : ''} ${isSecond ? styles.second : ''}`}
      onPointerDown={() => {
        downOn.current = memory.current?.key ?? null;
      }}
      onPointerCancel={() => {
        downOn.current = null;
      }}
      onClick={release}
    >
      {over !== undefined && <span>{over}</span>}
      <b>{children}</b>
      {under !== undefined && <span>{under}</span>}
    </button>
  );
}

/** The bar's place while there is nothing to touch: what it waits for. */
export function ShutBar({ children, under }: { children: ReactNode; under: string }) {
  return (
    <p className={`${styles.bar} ${styles.shut}`}>
      <b>{children}</b>
      <span>{under}</span>
    </p>
  );
}
