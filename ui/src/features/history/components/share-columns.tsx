import type { OnTimeFigures, OnTimeGroup } from '@stubpost/shared';
import { fewDepartures, formatCount, formatPercent, isClearlyBelow } from '../model/figures-text';
import { placeOnScale, shareScale } from '../model/share-scale';
import styles from './charts.module.css';

const size = { width: 900, height: 260, left: 52, right: 76, top: 14, bottom: 50 };

/**
 * One point a group with its 95 % interval, the share of all as a dashed line, n under each. The table twin beside it
 * says the same, so the picture is hidden from screen readers.
 */
export function ShareColumns({
  all,
  groups,
  unit,
}: {
  all: OnTimeFigures;
  groups: OnTimeGroup[];
  unit: string;
}) {
  const counted = groups.filter((group) => group.interval !== null);
  const scale = shareScale(counted.flatMap((group) => (group.interval === null ? [] : [group.interval])));
  const step = (size.width - size.left - size.right) / Math.max(1, groups.length);
  const plotHeight = size.height - size.top - size.bottom;
  const y = (share: number): number => size.top + plotHeight * (1 - placeOnScale(share, scale));
  const right = size.width - size.right;
  return (
    <svg className={styles.chart} viewBox={`0 0 ${size.width} ${size.height}`} aria-hidden="true">
      {scale.ticks.map((tick) => (
        <g key={tick}>
          <line className={styles.grid} x1={size.left} x2={right} y1={y(tick / 100)} y2={y(tick / 100)} />
          <text className={styles.label} x={size.left - 8} y={y(tick / 100) + 4} textAnchor="end">
            {tick === scale.ticks.at(-1) ? `${tick} %` : tick}
          </text>
        </g>
      ))}
      {all.share !== null && (
        <g>
          <line className={styles.all} x1={size.left} x2={right} y1={y(all.share)} y2={y(all.share)} />
          <text className={styles.strong} x={right + 8} y={y(all.share) + 4}>
            all {formatPercent(all.share)}
          </text>
        </g>
      )}
      {groups.map((group, index) => {
        const x = size.left + step * (index + 0.5);
        const below = isClearlyBelow(group, all);
        const few = group.counted < fewDepartures;
        const tone = below ? styles.below : few ? styles.few : styles.usual;
        return (
          <g key={group.key}>
            {group.interval !== null && group.share !== null && (
              <g className={tone}>
                <line x1={x} x2={x} y1={y(group.interval.low)} y2={y(group.interval.high)} />
                <circle cx={x} cy={y(group.share)} r={4.5} />
                {below && (
                  <text className={styles.strong} x={x} y={y(group.interval.low) + 16} textAnchor="middle">
                    {formatPercent(group.share)}
                  </text>
                )}
              </g>
            )}
            <text className={styles.ink} x={x} y={size.height - 28} textAnchor="middle">
              {group.label.replace(/:00( next day)?$/, '')}
            </text>
            <text className={styles.label} x={x} y={size.height - 10} textAnchor="middle">
              {formatCount(group.counted)}
            </text>
          </g>
        );
      })}
      <text className={styles.label} x={right + 8} y={size.height - 28}>
        {unit}
      </text>
      <text className={styles.label} x={right + 8} y={size.height - 10}>
        n
      </text>
    </svg>
  );
}
