import type { CountedShare } from '@stubpost/shared';
import { percent } from '../model/quality-words';
import styles from './charts.module.css';

/** One bar: a share with its interval, and what it should be where there is a target. */
export interface ShareBar {
  label: string;
  figures: CountedShare;
  target: number | null;
}

const size = { width: 440, left: 76, right: 60, top: 8, row: 34, bottom: 26 };
const ticks = [0, 0.25, 0.5, 0.75, 1];
const x = (share: number): number => size.left + (size.width - size.left - size.right) * share;

/** Shares lying down, 0 to 100 %, each with its interval as a line. The table beside it says the same. */
export function ShareBars({ bars }: { bars: readonly ShareBar[] }) {
  const foot = size.top + bars.length * size.row;
  return (
    <svg
      className={`${styles.chart} ${styles.narrow}`}
      viewBox={`0 0 ${size.width} ${foot + size.bottom}`}
      aria-hidden="true"
    >
      {ticks.map((tick) => (
        <g key={tick}>
          <line className={styles.grid} x1={x(tick)} x2={x(tick)} y1={size.top} y2={foot} />
          <text className={styles.label} x={x(tick)} y={foot + 16} textAnchor="middle">
            {tick === 1 ? '100 %' : tick * 100}
          </text>
        </g>
      ))}
      {bars.map(({ label, figures, target }, index) => {
        const middle = size.top + size.row * (index + 0.5);
        return (
          <g key={label}>
            <text className={styles.ink} x={0} y={middle + 4}>
              {label}
            </text>
            <rect
              className={styles.all}
              x={x(0)}
              y={middle - 8}
              width={x(figures.share ?? 0) - x(0)}
              height={16}
            />
            {figures.interval !== null && (
              <line
                className={styles.interval}
                x1={x(figures.interval.low)}
                x2={x(figures.interval.high)}
                y1={middle}
                y2={middle}
              />
            )}
            {target !== null && (
              <line
                className={styles.target}
                x1={x(target)}
                x2={x(target)}
                y1={middle - 13}
                y2={middle + 13}
              />
            )}
            <text className={styles.strong} x={size.width} y={middle + 4} textAnchor="end">
              {percent(figures.share)}
            </text>
          </g>
        );
      })}
    </svg>
  );
}
