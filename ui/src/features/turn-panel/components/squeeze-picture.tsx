import { stepMarkClass } from '../../../components/step-mark';
import { timeText } from '../../../lib/turn/time-text';
import { formatSlack } from '../../../lib/time-display';
import type { Stretch } from '../../../lib/turn/turn-times';
import { squeezeWords, type Squeeze, type SqueezeStep } from '../model/squeeze';
import { labelPlaces, labelPlacesBackward } from '../model/squeeze-labels';
import styles from './squeeze-picture.module.css';

const size = { width: 430, height: 120 };
const left = 93;
const right = 400;
const rows = { scheduled: 2.5, after: 37.5, before: 77.5 };

export interface SqueezePictureProps {
  squeeze: Squeeze;
  now: number;
  zone: string;
}

/** Work after the arrival against work before the departure: as the timetable has it, and as it stands. */
export function SqueezePicture({ squeeze, now, zone }: SqueezePictureProps) {
  const { scheduled, overlap } = squeeze;
  const from = Math.min(scheduled.after.from, squeeze.arrivesAt);
  const to = Math.max(squeeze.leavesAt, overlap?.to ?? 0, squeeze.after.at(-1)?.stretch.to ?? 0);
  const x = (instant: number): number => left + ((instant - from) / Math.max(1, to - from)) * (right - left);
  const box = (stretch: Stretch, y: number, className: string, key: string) => (
    <rect
      key={key}
      x={x(stretch.from)}
      y={y}
      width={Math.max(0, x(stretch.to) - x(stretch.from))}
      height={20}
      className={className}
    />
  );
  const late = Math.floor((squeeze.arrivesAt - scheduled.after.from) / 60_000);
  const isNowShown = now >= from && now <= to;
  const scheduledSpare = Math.floor((scheduled.before.from - scheduled.after.to) / 1000);
  return (
    <svg
      viewBox={`0 0 ${size.width} ${size.height}`}
      className={styles.squeeze}
      role="img"
      aria-label={spoken(squeeze, scheduledSpare)}
    >
      <Hatch />
      {overlap !== null && (
        <rect
          x={x(overlap.from)}
          y={32}
          width={x(overlap.to) - x(overlap.from)}
          height={70}
          className={styles.overlap}
        />
      )}
      <text x={0} y={16}>
        Scheduled
      </text>
      {box(scheduled.after, rows.scheduled, styles.outline ?? '', 'a')}
      <rect x={x(scheduled.after.from)} y={0} width={4} height={25} className={styles.planPost} />
      {box(scheduled.before, rows.scheduled, styles.outline ?? '', 'b')}
      <path d={`M${x(scheduled.after.to)} 12.5H${x(scheduled.before.from)}`} className={styles.line} />
      <text
        x={(x(scheduled.after.to) + x(scheduled.before.from)) / 2}
        y={9}
        textAnchor="middle"
        className={styles.bold}
      >
        {formatSlack(scheduledSpare)}
      </text>

      <text x={0} y={45} className={styles.ink}>
        After arrival,
      </text>
      <text x={0} y={59}>
        {late >= 1 ? `${late} min late` : late <= -1 ? `${-late} min early` : 'on time'}
      </text>
      {squeeze.done !== null && box(squeeze.done, rows.after, styles.work ?? '', 'done')}
      {squeeze.unrecorded !== null && box(squeeze.unrecorded, rows.after, styles.dashed ?? '', 'open')}
      {squeeze.unrecorded !== null && x(squeeze.unrecorded.to) - x(squeeze.unrecorded.from) > 62 && (
        <text
          x={(x(squeeze.unrecorded.from) + x(squeeze.unrecorded.to)) / 2}
          y={52}
          textAnchor="middle"
          className={styles.ink}
        >
          no record
        </text>
      )}
      <rect
        x={x(squeeze.arrivesAt)}
        y={33}
        width={4}
        height={29}
        className={squeeze.done === null ? styles.planPost : styles.post}
      />
      {squeeze.after.map((one) => box(one.stretch, rows.after, styles.hatch ?? '', one.step.key))}
      {squeeze.before.map((one) => box(one.stretch, rows.before, styles.hatch ?? '', one.step.key))}

      <text x={0} y={86} className={styles.ink}>
        Before
      </text>
      <text x={0} y={100} className={styles.ink}>
        departure
      </text>
      {overlap !== null && (
        <OverlapEdges from={x(overlap.from)} to={x(overlap.to)} spare={squeeze.spareSeconds} />
      )}
      <path d={`M${x(squeeze.leavesAt)} 0V106`} className={styles.departure} />
      {isNowShown && <path d={`M${x(now)} 28V106`} className={styles.now} />}
      <Marks steps={squeeze.after} x={x} y={41} />
      <Marks steps={squeeze.before} x={x} y={81} isBackward />
      {timeLabels(squeeze, isNowShown ? now : null, x, zone).map(({ place, words, strong }) => (
        <text key={words} x={place} y={118} textAnchor="middle" className={strong ? styles.bold : styles.ink}>
          {words}
        </text>
      ))}
    </svg>
  );
}

function spoken(squeeze: Squeeze, scheduledSpare: number): string {
  const planned = `Scheduled, the two kinds of work leave ${squeezeWords(scheduledSpare)}.`;
  return `${planned} Now: ${squeezeWords(squeeze.spareSeconds)}.`;
}

function Hatch() {
  return (
    <defs>
      <pattern
        id="squeeze-hatch"
        width="5"
        height="5"
        patternUnits="userSpaceOnUse"
        patternTransform="rotate(45)"
      >
        <rect width="5" height="5" className={styles.hatchGround} />
        <path d="M0 0v5" className={styles.hatchLine} />
      </pattern>
    </defs>
  );
}

function OverlapEdges({ from, to, spare }: { from: number; to: number; spare: number }) {
  return (
    <>
      <path d={`M${from} 31V103M${to} 31V103`} className={styles.riskLine} />
      <text x={(from + to) / 2} y={73} textAnchor="middle" className={styles.figure}>
        {formatSlack(spare)}
      </text>
    </>
  );
}

interface MarksProps {
  steps: readonly SqueezeStep[];
  x: (instant: number) => number;
  y: number;
  /** They queue to the left, away from the departure. */
  isBackward?: boolean;
}

/** Marks of the steps still to do, over their part of the bar; where they would touch they queue. */
function Marks({ steps, x, y, isBackward = false }: MarksProps) {
  const middles = steps.map((one) => (x(one.stretch.from) + x(one.stretch.to)) / 2 - 7);
  const places = isBackward ? labelPlacesBackward(middles, 15) : labelPlaces(middles, 15);
  return (
    <>
      {steps.map((one, index) => (
        <foreignObject key={one.step.key} x={places[index] ?? 0} y={y} width={16} height={14}>
          <i className={stepMarkClass(one.step.kind, one.step.state === 'overdue' ? 'overdue' : 'not-due')} />
        </foreignObject>
      ))}
    </>
  );
}

function timeLabels(squeeze: Squeeze, now: number | null, x: (instant: number) => number, zone: string) {
  const wanted = [
    { at: squeeze.scheduled.after.from, words: timeText(squeeze.scheduled.after.from, zone), strong: false },
    { at: squeeze.arrivesAt, words: timeText(squeeze.arrivesAt, zone), strong: false },
    ...(now === null ? [] : [{ at: now, words: 'now', strong: true }]),
    { at: squeeze.leavesAt, words: timeText(squeeze.leavesAt, zone), strong: false },
  ];
  const kept: { place: number; words: string; strong: boolean }[] = [];
  // The departure and now matter most: what would touch them is left out.
  for (const { at, words, strong } of [...wanted].reverse()) {
    const place = Math.min(x(at), size.width - 18);
    if (kept.every((other) => Math.abs(other.place - place) > 36)) kept.push({ place, words, strong });
  }
  return kept;
}
