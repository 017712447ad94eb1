import { addSeconds, parseInstant, type Instant, type WireTurn } from '@stubpost/shared';

/** Width and height of the drawing in its own units; the page scales it to the column. */
export const figureSize = { width: 358, height: 54 };
const left = 4;
const span = 350;
/** A turn without an arrival is drawn from this long before it leaves, one without a departure this long after it came. */
const openSideSeconds = 30 * 60;

/** A stretch along the drawing. */
export interface Stretch {
  x: number;
  width: number;
}

/** Where each part of the three lanes stands; null where there is nothing to draw. */
export interface TurnFigure {
  plan: Stretch;
  post: number | null;
  work: Stretch | null;
  rest: Stretch | null;
  leaving: { x: number; closed: boolean } | null;
  next: Stretch | null;
  whisker: Stretch | null;
  now: number | null;
}

interface Times {
  scheduledArrivalAt: Instant | null;
  arrivedAt: Instant | null;
  scheduledDepartureAt: Instant | null;
  leavesAt: Instant | null;
  leftAt: Instant | null;
  readyAt: Instant | null;
  nineInTenAt: Instant | null;
}

const instant = (text: string | null | undefined): Instant | null =>
  text === null || text === undefined ? null : parseInstant(text);

function timesOf(turn: WireTurn): Times {
  const scheduledDepartureAt = instant(turn.outbound?.scheduledDepartureAt);
  const heldUntil = instant(turn.outbound?.heldUntil);
  return {
    scheduledArrivalAt: instant(turn.inbound?.scheduledArrivalAt),
    arrivedAt: instant(turn.inbound?.actualArrivalAt),
    scheduledDepartureAt,
    leavesAt: latest([scheduledDepartureAt, heldUntil]),
    leftAt: instant(turn.outbound?.actualDepartureAt),
    readyAt: instant(turn.forecast.readyAt),
    nineInTenAt: instant(turn.forecast.readyAtNineInTen),
  };
}

const tenth = (units: number): number => Math.round(units * 10) / 10;
const known = (instants: (Instant | null)[]): Instant[] => instants.filter((each) => each !== null);
const latest = (instants: (Instant | null)[]): Instant | null => {
  const list = known(instants);
  return list.length === 0 ? null : Math.max(...list);
};
const earliest = (instants: (Instant | null)[]): Instant | null => {
  const list = known(instants);
  return list.length === 0 ? null : Math.min(...list);
};

/** First and last moment of the drawing. */
function windowOf(times: Times, now: Instant): { from: Instant; to: Instant } {
  const standing = times.leftAt === null && times.arrivedAt !== null ? now : null;
  const ends = latest([times.leavesAt, times.leftAt, times.readyAt, times.nineInTenAt, standing]) ?? now;
  const starts = earliest([times.scheduledArrivalAt, times.arrivedAt]);
  const from = starts ?? addSeconds(times.leavesAt ?? ends, -openSideSeconds);
  const to = times.leavesAt === null ? Math.max(ends, addSeconds(from, openSideSeconds)) : ends;
  return { from, to: Math.max(to, addSeconds(from, 60)) };
}

/**
 * The three lanes of a turn: plan (scheduled arrival to scheduled departure), work (arrival to now or departure),
 * next (now to forecast ready, with a whisker to the nine-in-ten time). x = 4 + share of the window × 350.
 */
export function turnFigure(turn: WireTurn, now: Instant): TurnFigure {
  const times = timesOf(turn);
  const { from, to } = windowOf(times, now);
  const x = (at: Instant): number =>
    tenth(left + (Math.min(Math.max(at, from), to) - from) * (span / (to - from)));
  const stretch = (a: Instant, b: Instant): Stretch => ({ x: x(a), width: tenth(Math.max(0, x(b) - x(a))) });
  const begun = times.arrivedAt ?? (times.scheduledArrivalAt === null ? from : null);
  const workEnd = times.leftAt ?? now;
  const restEnd = times.leavesAt ?? to;
  return {
    plan: stretch(times.scheduledArrivalAt ?? from, times.scheduledDepartureAt ?? to),
    post: times.arrivedAt === null ? null : x(times.arrivedAt),
    work: begun === null || times.arrivedAt === null ? null : stretch(begun, workEnd),
    rest: restStretch(),
    leaving: leavingEdge(),
    ...nextLane(),
    now: times.leftAt === null && now >= from && now <= to ? x(now) : null,
  };

  function restStretch(): Stretch | null {
    if (times.leftAt !== null || times.leavesAt === null) return null;
    const start = times.arrivedAt === null ? (times.scheduledArrivalAt ?? from) : now;
    return start < restEnd ? stretch(start, restEnd) : null;
  }

  function leavingEdge(): TurnFigure['leaving'] {
    if (times.leftAt !== null) return { x: x(times.leftAt), closed: true };
    return times.leavesAt === null ? null : { x: x(times.leavesAt), closed: false };
  }

  function nextLane(): Pick<TurnFigure, 'next' | 'whisker'> {
    if (times.leftAt !== null || times.readyAt === null || times.readyAt <= now)
      return { next: null, whisker: null };
    const next = stretch(Math.max(now, times.arrivedAt ?? times.scheduledArrivalAt ?? now), times.readyAt);
    const nine = times.nineInTenAt;
    return { next, whisker: nine !== null && nine > times.readyAt ? stretch(times.readyAt, nine) : null };
  }
}
