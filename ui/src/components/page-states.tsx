import { Button } from '@blueprintjs/core';
import { useEffect, useState, type ReactNode } from 'react';
import { errorText } from '../lib/error-texts';
import { ApiError } from '../lib/api-client';
import styles from './page-states.module.css';

/** Nothing to show, in words, with a way on where there is one. */
export function EmptyState({ words, children }: { words: string; children?: ReactNode }) {
  return (
    <div className={styles.state}>
      <p>{words}</p>
      {children !== undefined && <div className="sp-actions">{children}</div>}
    </div>
  );
}

const patienceMilliseconds = 4000;

export interface LoadingRowsProps {
  /** What is loading: "turns for Tue 3 Mar". */
  what: string;
  /** Rows that will stand here, so that nothing jumps. 6 by default. */
  rows?: number;
  /** Height of one row in pixels, 30 by default. */
  rowHeight?: number;
  /** Offered after four seconds. */
  onRetry?: () => void;
}

/** Rows of the final height while something loads; after four seconds it says so and offers to try again. */
export function LoadingRows({ what, rows = 6, rowHeight = 30, onRetry }: LoadingRowsProps) {
  const [isSlow, setSlow] = useState(false);
  useEffect(() => {
    const timer = setTimeout(() => setSlow(true), patienceMilliseconds);
    return () => clearTimeout(timer);
  }, []);
  return (
    <div className={styles.loading}>
      <p role="status">
        {isSlow ? `Loading ${what}. Still loading` : `Loading ${what}`}{' '}
        {isSlow && onRetry !== undefined && (
          <Button size="small" onClick={onRetry}>
            Retry
          </Button>
        )}
      </p>
      <div aria-hidden="true">
        {Array.from({ length: rows }, (_, index) => (
          <div key={index} className={styles.row} style={{ height: rowHeight }}>
            <span className={styles.bone} />
          </div>
        ))}
      </div>
    </div>
  );
}

/** A part could not be shown: why, and the way to try again. */
export function ErrorState({ error, onRetry }: { error: unknown; onRetry?: () => void }) {
  return (
    <div className={styles.state} role="alert">
      <p>{errorText(error)}</p>
      {error instanceof ApiError && error.requestId !== undefined && (
        <p className="muted small">Number for the log: {error.requestId}</p>
      )}
      {onRetry !== undefined && (
        <div className="sp-actions">
          <Button onClick={onRetry}>Retry</Button>
        </div>
      )}
    </div>
  );
}
