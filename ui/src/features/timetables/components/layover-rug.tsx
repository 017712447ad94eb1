import { rugHeight, rugMinutes, rugStrokes, rugWidth } from '../model/layover-rug';
import styles from './timetables.module.css';

const base = rugHeight + 3;

/** A stroke a minute, as high as turns stand so long. Its words stand beside it for everybody who listens. */
export function LayoverRug({
  layovers,
  mostTurns,
  isQuiet,
}: {
  layovers: readonly { minutes: number; turns: number }[];
  mostTurns: number;
  /** Drawn lighter, for a station that is not chosen. */
  isQuiet: boolean;
}) {
  const strokes = rugStrokes(layovers, mostTurns);
  return (
    <svg className={styles.rug} viewBox={`0 0 ${rugWidth} 24`} aria-hidden="true" focusable="false">
      <path className={styles.rugBase} d={`M0 ${base + 0.5}H${rugWidth}`} />
      <path
        className={isQuiet ? styles.rugQuiet : styles.rugStroke}
        d={strokes.map(({ x, height }) => `M${x.toFixed(1)} ${base}v-${height.toFixed(1)}`).join('')}
      />
    </svg>
  );
}

/** The axis above the column of rugs. */
export function LayoverAxis() {
  const at = (minutes: number): number => (minutes / rugMinutes) * rugWidth;
  return (
    <svg className={styles.rug} viewBox={`0 0 ${rugWidth} 30`} aria-hidden="true" focusable="false">
      <text x={0} y={11}>
        Layover, a line a turn
      </text>
      <text x={0} y={28}>
        0
      </text>
      <text x={at(20)} y={28} textAnchor="middle">
        20
      </text>
      <text x={at(40)} y={28} textAnchor="middle">
        40
      </text>
      <text x={rugWidth} y={28} textAnchor="end">
        60 min
      </text>
    </svg>
  );
}
