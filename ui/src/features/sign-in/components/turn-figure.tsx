import type { StepKind } from '@stubpost/shared';
import styles from './turn-figure.module.css';

/*
 * One turn as the board draws it, with the words beside it. The times follow from the shipped step plan: in at 17:18,
 * out at 17:40, seen at 17:29:06. The engineer mans the leaving cab six minutes before departure at the earliest, and
 * 20 + 50 + 60 + 45 s of work follow, so the train is ready at 17:36:55 and 7:59 may still be lost.
 */
const minute = 60;
const leaves = 22 * minute;
const now = 11 * minute + 6;
const workFrom = leaves - 6 * minute;
const ready = workFrom + 20 + 50 + 60 + 45;

const left = 14;
const pixelsPerSecond = 610 / leaves;
const x = (seconds: number): number => left + seconds * pixelsPerSecond;

interface ExampleStep {
  label: string;
  kind: StepKind;
  at: number;
  /** Recorded clock time; steps without one are still to do. */
  recorded?: string;
  /** Words to the left of their line, where the now line would cut through them. */
  wordsLeft?: boolean;
  /** Row of the label: 1 is nearest to the bar. */
  level: number;
}

const STEPS: readonly ExampleStep[] = [
  { label: 'Handbrake set', kind: 'securement', at: minute + 52, recorded: '17:19:52', level: 3 },
  { label: 'Cab brake check', kind: 'brake-test', at: 5 * minute + 8, recorded: '17:23:08', level: 2 },
  {
    label: 'Ends changed',
    kind: 'ends',
    at: 9 * minute + 31,
    recorded: '17:27:31',
    level: 1,
    wordsLeft: true,
  },
  { label: 'In leaving cab', kind: 'movement', at: workFrom + 20, level: 1 },
  { label: 'Handbrake off', kind: 'securement', at: workFrom + 70, level: 2 },
  { label: 'Air charged', kind: 'air', at: workFrom + 130, level: 3 },
  { label: 'Leaving-end test', kind: 'brake-test', at: ready, level: 4 },
];

const barTop = 136;
const barBottom = 196;
const nextTop = 214;

function Step({ step }: { step: ExampleStep }) {
  const at = x(step.at);
  const isDone = step.recorded !== undefined;
  const markTop = step.kind === 'securement' ? barBottom - 26 : barTop + 4;
  const labelY = isDone ? barBottom + 10 + step.level * 34 : barTop - 8 - step.level * 17;
  const leader = isDone ? `M${at} ${markTop + 24}V${labelY + 4}` : `M${at} ${markTop - 2}V${labelY + 4}`;
  const isLeft = !isDone || step.wordsLeft === true;
  const wordsX = isLeft ? at - 6 : at + 6;
  const side = isLeft ? styles.end : '';
  return (
    <g>
      <path className={styles.leader} d={leader} />
      <foreignObject x={at - 11} y={markTop} width={22} height={22}>
        <span className={`mark ${step.kind}${isDone ? ' done' : ''} ${styles.mark}`} />
      </foreignObject>
      <text className={side} x={wordsX} y={labelY}>
        {step.label}
      </text>
      {isDone && (
        <text className={`${styles.soft} ${side}`} x={wordsX} y={labelY + 15}>
          {step.recorded}
        </text>
      )}
    </g>
  );
}

function Lanes() {
  return (
    <>
      <text className={styles.soft} x={left} y={16}>
        scheduled 17:18
      </text>
      <text className={`${styles.soft} ${styles.end}`} x={x(leaves)} y={16}>
        scheduled 17:40
      </text>
      <rect className={styles.plan} x={left} y={24} width={x(leaves) - left} height={12} />
      <rect className={styles.work} x={x(20)} y={barTop} width={x(now) - x(20)} height={barBottom - barTop} />
      <path
        className={styles.rest}
        d={`M${x(now)} ${barTop}H${x(leaves)}M${x(now)} ${barBottom}H${x(leaves)}`}
      />
      <path className={styles.open} d={`M${x(leaves)} ${barTop - 2}V${barBottom + 2}`} />
      <rect className={styles.ink} x={x(20) - 4} y={18} width={7} height={218} />
      <path
        className={styles.room}
        d={`M${x(now)} ${nextTop + 10}H${x(workFrom)}M${x(ready)} ${nextTop + 10}H${x(leaves)}`}
      />
      <rect
        className={styles.forecast}
        x={x(workFrom)}
        y={nextTop}
        width={x(ready) - x(workFrom)}
        height={20}
      />
      <rect fill="url(#to-come)" x={x(workFrom)} y={nextTop} width={x(ready) - x(workFrom)} height={20} />
      <path className={styles.half} d={`M${x(ready)} ${nextTop - 3}V${nextTop + 23}`} />
      <text className={styles.end} x={x(ready) - 6} y={nextTop + 38}>
        ready by 17:36
      </text>
      <text className={styles.strong} x={x(ready) + 8} y={nextTop + 38}>
        7 min to spare
      </text>
      <path className={styles.now} d={`M${x(now)} 22V240`} />
      <text className={`${styles.strong} ${styles.middle}`} x={x(now)} y={16}>
        17:29:06
      </text>
      <text className={styles.soft} x={640} y={35}>
        the plan
      </text>
      <text className={styles.soft} x={640} y={170}>
        the work
      </text>
      <text className={styles.soft} x={640} y={nextTop + 14}>
        what is to come
      </text>
    </>
  );
}

/** What Stubpost is about, in one picture. */
export function TurnFigure() {
  return (
    <figure className={`sp-panel ${styles.figure}`}>
      <svg
        viewBox="0 0 744 328"
        role="img"
        aria-label="One turn: in at 17:18, scheduled to leave at 17:40. At 17:29:06 three steps are recorded and four are to come; ready by 17:36, 7 minutes to spare."
      >
        <pattern
          id="to-come"
          width="6"
          height="6"
          patternUnits="userSpaceOnUse"
          patternTransform="rotate(45)"
        >
          <path className={styles.stripe} d="M1 0V6" />
        </pattern>
        <Lanes />
        {STEPS.map((step) => (
          <Step key={step.label} step={step} />
        ))}
      </svg>
    </figure>
  );
}
