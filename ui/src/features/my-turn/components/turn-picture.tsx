import { useId } from 'react';
import type { Instant, WireTurn } from '@stubpost/shared';
import { formatClock, formatTime } from '../../../lib/time-display';
import { leavesAt } from '../model/turn-times';
import { figureSize, turnFigure, type Stretch, type TurnFigure } from '../model/turn-figure';
import { SpareWords } from './spare-words';
import styles from './turn-picture.module.css';

const top = { plan: 1, work: 14, next: 42 };
const height = { plan: 8, work: 24, next: 10 };

const end = (stretch: Stretch): number => stretch.x + stretch.width;

/** The picture of a turn, three lanes as on the board, with every value beside it in words. */
export function TurnPicture({ turn, now }: { turn: WireTurn; now: Instant }) {
  const { inbound, outbound, zone } = turn;
  const arrived = inbound?.actualArrivalAt ?? null;
  const left = outbound?.actualDepartureAt ?? null;
  const leaves = leavesAt(turn);
  return (
    <figure className={styles.figure}>
      <p className={styles.row}>
        <span>{arrived === null ? expectedWords(turn) : `in ${formatClock(arrived, zone)}`}</span>
        {left === null && <SpareWords turn={turn} />}
      </p>
      <Lanes figure={turnFigure(turn, now)} />
      <p className={styles.row}>
        <span>{left === null ? readyWords(turn) : `left ${formatClock(left, zone)}`}</span>
        {leaves !== null && left === null && <span>{formatTime(leaves, zone)}</span>}
      </p>
    </figure>
  );
}

function expectedWords({ inbound, zone }: WireTurn): string {
  if (inbound === null) return 'first train out';
  const expected = inbound.expectedArrivalAt;
  return expected === null
    ? `due in ${formatTime(inbound.scheduledArrivalAt, zone)}`
    : `expected ${formatTime(expected, zone)}, due ${formatTime(inbound.scheduledArrivalAt, zone)}`;
}

function readyWords({ forecast, zone }: WireTurn): string {
  if (forecast.readyAt === null) return 'no forecast';
  const ready = `ready ${formatTime(forecast.readyAt, zone)}`;
  return forecast.readyAtNineInTen === null
    ? ready
    : `${ready}, 9 in 10 by ${formatTime(forecast.readyAtNineInTen, zone)}`;
}

function Lanes({ figure }: { figure: TurnFigure }) {
  const hatch = useId();
  return (
    <svg
      className={styles.lanes}
      viewBox={`0 0 ${figureSize.width} ${figureSize.height}`}
      aria-hidden="true"
      focusable="false"
    >
      <pattern id={hatch} width={6} height={6} patternUnits="userSpaceOnUse" patternTransform="rotate(45)">
        <path className={styles.hatchLine} d="M1 0V6" />
      </pattern>
      <rect
        className={styles.plan}
        x={figure.plan.x}
        y={top.plan}
        width={figure.plan.width}
        height={height.plan}
      />
      {figure.work !== null && (
        <rect
          className={styles.work}
          x={figure.work.x}
          y={top.work}
          width={figure.work.width}
          height={height.work}
        />
      )}
      {figure.rest !== null && <path className={styles.rest} d={restPath(figure.rest)} />}
      {figure.post !== null && (
        <rect className={styles.post} x={figure.post - 2} y={1} width={4} height={52} />
      )}
      {figure.leaving !== null && (
        <path
          className={figure.leaving.closed ? styles.closed : styles.open}
          d={`M${figure.leaving.x} 14V38`}
        />
      )}
      {figure.next !== null && (
        <NextLane next={figure.next} whisker={figure.whisker} fill={`url(#${hatch})`} />
      )}
      {figure.now !== null && (
        <rect className={styles.now} x={figure.now - 1} y={0} width={2} height={figureSize.height} />
      )}
    </svg>
  );
}

const restPath = (rest: Stretch): string => `M${rest.x} 14.5H${end(rest)}M${rest.x} 37.5H${end(rest)}`;

function NextLane({ next, whisker, fill }: { next: Stretch; whisker: Stretch | null; fill: string }) {
  const box = { x: next.x, y: top.next, width: next.width, height: height.next };
  return (
    <>
      <rect className={styles.next} {...box} />
      <rect className={styles.hatch} {...box} fill={fill} />
      {whisker !== null && (
        <path className={styles.whisker} d={`M${whisker.x} 47H${end(whisker)}M${end(whisker)} 42v10`} />
      )}
    </>
  );
}
