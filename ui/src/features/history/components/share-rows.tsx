import type { OnTimeFigures, OnTimeGroup } from '@stubpost/shared';
import { fewDepartures, formatCount, formatPercent, isClearlyBelow } from '../model/figures-text';
import { placeOnScale, shareScale } from '../model/share-scale';
import styles from './charts.module.css';

const size = { width: 440, left: 92, right: 96, top: 26, row: 34, bottom: 28 };

/** The same as columns, lying down: for groups with words for names. */
export function ShareRows({ all, groups }: { all: OnTimeFigures; groups: OnTimeGroup[] }) {
  const scale = shareScale(groups.flatMap((group) => (group.interval === null ? [] : [group.interval])));
  const height = size.top + groups.length * size.row + size.bottom;
  const plotWidth = size.width - size.left - size.right;
  const x = (share: number): number => size.left + plotWidth * placeOnScale(share, scale);
  const foot = height - size.bottom;
  const right = size.width - size.right;
  return (
    <svg className={styles.chart} viewBox={`0 0 ${size.width} ${height}`} aria-hidden="true">
      {scale.ticks.map((tick) => (
        <g key={tick}>
          <line className={styles.grid} x1={x(tick / 100)} x2={x(tick / 100)} y1={size.top - 8} y2={foot} />
          <text className={styles.label} x={x(tick / 100)} y={foot + 18} textAnchor="middle">
            {tick}
          </text>
        </g>
      ))}
      {all.share !== null && (
        <g>
          <line className={styles.all} x1={x(all.share)} x2={x(all.share)} y1={size.top - 8} y2={foot} />
          <text className={styles.strong} x={x(all.share)} y={12} textAnchor="middle">
            all {formatPercent(all.share)}
          </text>
        </g>
      )}
      {groups.map((group, index) => {
        const y = size.top + size.row * (index + 0.4);
        const tone = isClearlyBelow(group, all)
          ? styles.below
          : group.counted < fewDepartures
            ? styles.few
            : styles.usual;
        return (
          <g key={group.key}>
            <text className={styles.ink} x={0} y={y + 4}>
              {group.label}
            </text>
            {group.interval !== null && group.share !== null && (
              <g className={tone}>
                <line x1={x(group.interval.low)} x2={x(group.interval.high)} y1={y} y2={y} />
                <circle cx={x(group.share)} cy={y} r={4.5} />
              </g>
            )}
            <text className={styles.strong} x={right + 46} y={y + 4} textAnchor="end">
              {formatPercent(group.share)}
            </text>
            <text className={styles.label} x={size.width} y={y + 4} textAnchor="end">
              {formatCount(group.counted)}
            </text>
          </g>
        );
      })}
      <text className={styles.label} x={right + 46} y={foot + 18} textAnchor="end">
        %
      </text>
      <text className={styles.label} x={size.width} y={foot + 18} textAnchor="end">
        n
      </text>
    </svg>
  );
}
