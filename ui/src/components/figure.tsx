import type { ReactNode } from 'react';
import styles from './figure.module.css';

/** One number with what it is: label above, figure large, remark (n, threshold, interval) below. */
export function Figure({ label, value, remark }: { label: string; value: ReactNode; remark?: ReactNode }) {
  return (
    <div className={styles.figure}>
      <span className={styles.label}>{label}</span>
      <b className={styles.value}>{value}</b>
      {remark !== undefined && <span className={styles.label}>{remark}</span>}
    </div>
  );
}
