import { warningEdgesMinutes, type WireAlertQuality } from '@stubpost/shared';
import { count, percent, warningWords } from '../model/quality-words';
import { PlainTable } from './plain-table';
import charts from './charts.module.css';
import styles from './quality.module.css';

const size = { width: 440, height: 190, left: 8, right: 8, top: 22, bottom: 40 };

/** Names of the classes: after the departure, then from each edge to the next, in minutes. */
const labels = [
  'after',
  ...warningEdgesMinutes.map((edge, index) => {
    const next = warningEdgesMinutes[index + 1];
    return next === undefined ? `${edge} +` : `${edge}–${next}`;
  }),
];

function WarningColumns({ histogram }: { histogram: readonly number[] }) {
  const most = Math.max(1, ...histogram);
  const step = (size.width - size.left - size.right) / labels.length;
  const foot = size.height - size.bottom;
  return (
    <svg
      className={`${charts.chart} ${charts.narrow}`}
      viewBox={`0 0 ${size.width} ${size.height}`}
      aria-hidden="true"
    >
      <line className={charts.grid} x1={size.left} x2={size.width - size.right} y1={foot} y2={foot} />
      {labels.map((label, index) => {
        const value = histogram[index] ?? 0;
        const height = ((foot - size.top) * value) / most;
        const middle = size.left + step * (index + 0.5);
        return (
          <g key={label}>
            <rect
              className={index === 0 ? charts.peak : charts.all}
              x={middle - step * 0.32}
              y={foot - height}
              width={step * 0.64}
              height={height}
            />
            <text className={charts.strong} x={middle} y={foot - height - 6} textAnchor="middle">
              {count(value)}
            </text>
            <text className={charts.ink} x={middle} y={foot + 18} textAnchor="middle">
              {label}
            </text>
          </g>
        );
      })}
      <text className={charts.label} x={size.width - size.right} y={size.height - 6} textAnchor="end">
        minutes before the scheduled departure
      </text>
    </svg>
  );
}

/** How long before the departure its alert was raised. */
export function WarningPanel({ quality }: { quality: WireAlertQuality }) {
  const { warning } = quality;
  return (
    <section className="sp-panel" aria-labelledby="warning">
      <h2 id="warning">Warning before the departure</h2>
      {warning.counted === 0 ? (
        <p>Nothing to count: no alert of a late departure in these days.</p>
      ) : (
        <>
          <p className={styles.headline}>
            <b>{warningWords(warning.median)}</b> or more in half
          </p>
          <dl className={styles.facts}>
            <dt>9 in 10 gave at least</dt>
            <dd>{warningWords(warning.nineInTen)}</dd>
            <dt>Only after the departure</dt>
            <dd>
              {count(warning.afterDeparture)} of {count(warning.counted)}
            </dd>
          </dl>
          <WarningColumns histogram={warning.histogram} />
          <details className={styles.twin}>
            <summary>Table: alerts by minutes of warning</summary>
            <PlainTable
              caption="Alerts by minutes of warning"
              heads={[
                ['Minutes before the departure', 'words'],
                ['Alerts', 'number'],
                ['Share', 'number'],
              ]}
              rows={labels.map((label, index) => ({
                key: label,
                cells: [
                  label,
                  count(warning.histogram[index] ?? 0),
                  percent((warning.histogram[index] ?? 0) / warning.counted),
                ],
              }))}
            />
          </details>
        </>
      )}
      <footer>
        From the raising of each alert of a late departure to the scheduled departure; a hold gives more time
        than is counted here. n = {count(warning.counted)}. Quantiles of type 7.
      </footer>
    </section>
  );
}
