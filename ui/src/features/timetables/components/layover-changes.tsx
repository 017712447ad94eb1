import { defaultStepPlanSteps, shortestTurnSeconds } from '@stubpost/shared';
import { formatDuration, formatTime } from '../../../lib/time-display';
import { axisMinutes, type LayoverChange } from '../model/difference-view';
import styles from './timetables.module.css';

const width = 654;
const left = 190;
const right = 24;
const rowHeight = 27;
const top = 24;

/** Below this many seconds a new layover is too short for the steps: the shortest turn of the plan we ship. */
const enoughSeconds = shortestTurnSeconds(defaultStepPlanSteps);

/** Layovers before and after, of the turns that lose most: hollow before, solid after. The table beside says the same. */
export function LayoverChanges({ changes, zone }: { changes: readonly LayoverChange[]; zone: string }) {
  if (changes.length === 0) return null;
  const ticks = axisMinutes(changes, enoughSeconds);
  const [from = 0] = ticks;
  const to = ticks.at(-1) ?? 1;
  const x = (seconds: number): number =>
    left + ((seconds / 60 - from) / (to - from)) * (width - left - right);
  const foot = top + changes.length * rowHeight;
  return (
    <svg
      className={styles.changes}
      viewBox={`0 0 ${width} ${foot + 24}`}
      aria-hidden="true"
      focusable="false"
    >
      {ticks.map((minute) => (
        <g key={minute}>
          <path className={styles.gridLine} d={`M${x(minute * 60)} ${top - 4}V${foot}`} />
          <text className={styles.soft} x={x(minute * 60)} y={foot + 18} textAnchor="middle">
            {minute}
            {minute === to ? ' min' : ''}
          </text>
        </g>
      ))}
      <path className={styles.mark} d={`M${x(enoughSeconds)} ${top - 4}V${foot}`} />
      <text className={styles.strong} x={x(enoughSeconds)} y={12} textAnchor="middle">
        {formatDuration(enoughSeconds)}: shortest turn of the plan
      </text>
      {changes.map((change, index) => (
        <ChangeRow key={index} change={change} y={top + index * rowHeight + 14} x={x} zone={zone} />
      ))}
    </svg>
  );
}

function ChangeRow({
  change,
  y,
  x,
  zone,
}: {
  change: LayoverChange;
  y: number;
  x: (seconds: number) => number;
  zone: string;
}) {
  const { turn, beforeSeconds, afterSeconds } = change;
  const [old, fresh] = [x(beforeSeconds), x(afterSeconds)];
  const minutes = (seconds: number): number => Math.floor(seconds / 60);
  return (
    <g>
      <text x={0} y={y + 4}>
        {turn.after?.inboundTrain} to {turn.after?.outboundTrain}
        <tspan className={styles.soft}>
          {turn.after === null ? '' : ` in ${formatTime(turn.after.arrivalAt, zone)}`}
        </tspan>
      </text>
      <path className={styles.span} d={`M${fresh} ${y}H${old}`} />
      <circle className={styles.before} cx={old} cy={y} r={4.5} />
      {afterSeconds < enoughSeconds ? (
        <path className={styles.tooShort} d={`M${fresh} ${y - 8}l8.5 14.5h-17z`} />
      ) : (
        <circle className={styles.after} cx={fresh} cy={y} r={5} />
      )}
      <text className={styles.strong} x={fresh - 12} y={y + 4} textAnchor="end">
        {minutes(afterSeconds)}
      </text>
      <text className={styles.soft} x={old + 9} y={y + 4}>
        {minutes(beforeSeconds)}
      </text>
    </g>
  );
}
