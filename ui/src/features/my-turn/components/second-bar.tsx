import { useEffect, useRef, type ReactNode } from 'react';
import styles from './phone-parts.module.css';
import { RecordBar } from './record-bar';
import { useHeadingFocus } from './use-heading-focus';

/**
 * The second bar of a dangerous act, in another place than the first, with the record in full. It comes into sight by
 * itself, also where large type has pushed it down.
 */
export function SecondBar({ children, onRecord }: { children: ReactNode; onRecord: () => void }) {
  const heading = useHeadingFocus();
  const section = useRef<HTMLElement>(null);
  useEffect(() => {
    section.current?.scrollIntoView({ block: 'nearest' });
  }, []);
  return (
    <section className={styles.next} aria-label="Second touch" ref={section}>
      <h2 className={styles.small} tabIndex={-1} ref={heading}>
        Second touch, here
      </h2>
      <RecordBar barKey="second" isOwnChange isSecond over="Record now" onRecord={onRecord}>
        {children}
      </RecordBar>
    </section>
  );
}
