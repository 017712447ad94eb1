import { publishedBurstRule, type LoadFigures, type WireAlertQuality } from '@stubpost/shared';
import { amount } from '../model/quality-words';
import { columnsOf, type LoadColumn } from '../model/load-columns';
import styles from './charts.module.css';

const size = { width: 860, height: 250, left: 46, right: 12, top: 34, bottom: 44 };
const ticks = [0, 0.25, 0.5, 0.75, 1];
const plot = { width: size.width - size.left - size.right, height: size.height - size.top - size.bottom };
const y = (share: number): number => size.top + plot.height * (1 - share);

/** A mark over the columns where a quantile of the peak lies. */
function QuantileMark({
  value,
  words,
  step,
  row,
}: {
  value: number;
  words: string;
  step: number;
  row: number;
}) {
  const x = size.left + step * (Math.min(value, publishedBurstRule.startsAbove + 1) + 0.5);
  return (
    <g>
      <line className={styles.mark} x1={x} x2={x} y1={8 + row * 14} y2={size.top + plot.height} />
      <text className={styles.strong} x={x + 5} y={14 + row * 14}>
        {words}
      </text>
    </g>
  );
}

function Column({ column, index, step }: { column: LoadColumn; index: number; step: number }) {
  const x = size.left + step * index;
  const width = step * 0.36;
  const foot = size.top + plot.height;
  return (
    <g>
      <rect
        className={styles.all}
        x={x + step * 0.12}
        y={y(column.all)}
        width={width}
        height={foot - y(column.all)}
      />
      <rect
        className={styles.peak}
        x={x + step * 0.52}
        y={y(column.peak)}
        width={width}
        height={foot - y(column.peak)}
      />
      <text className={styles.ink} x={x + step * 0.5} y={foot + 18} textAnchor="middle">
        {column.label}
      </text>
    </g>
  );
}

const isCounted = (figures: LoadFigures): figures is LoadFigures & { median: number; ninetyFifth: number } =>
  figures.median !== null && figures.ninetyFifth !== null;

/**
 * Share of the 10-minute periods by how many alerts they brought: all watched ones and those at peak. The table beside
 * it says the same, so the picture is hidden from screen readers.
 */
export function LoadHistogram({ load }: { load: WireAlertQuality['load'] }) {
  const columns = columnsOf(load);
  const step = plot.width / columns.length;
  const burstX = size.left + step * (publishedBurstRule.startsAbove + 1);
  return (
    <svg
      className={`${styles.chart} ${styles.wide}`}
      viewBox={`0 0 ${size.width} ${size.height}`}
      aria-hidden="true"
    >
      {ticks.map((tick) => (
        <g key={tick}>
          <line
            className={styles.grid}
            x1={size.left}
            x2={size.width - size.right}
            y1={y(tick)}
            y2={y(tick)}
          />
          <text className={styles.label} x={size.left - 8} y={y(tick) + 4} textAnchor="end">
            {tick === 1 ? '100 %' : tick * 100}
          </text>
        </g>
      ))}
      {columns.map((column, index) => (
        <Column key={column.label} column={column} index={index} step={step} />
      ))}
      <line className={styles.limit} x1={burstX} x2={burstX} y1={size.top} y2={size.top + plot.height} />
      <text className={styles.label} x={burstX - 6} y={size.top + 12} textAnchor="end">
        a burst begins here
      </text>
      {isCounted(load.peak) && (
        <>
          <QuantileMark
            step={step}
            row={0}
            value={load.peak.ninetyFifth}
            words={`95 in 100 at peak: ${amount(load.peak.ninetyFifth)} or fewer`}
          />
          <QuantileMark
            step={step}
            row={1}
            value={load.peak.median}
            words={`half at peak: ${amount(load.peak.median)}`}
          />
        </>
      )}
      <text className={styles.label} x={size.width - size.right} y={size.height - 6} textAnchor="end">
        alerts raised within 10 minutes
      </text>
    </svg>
  );
}
