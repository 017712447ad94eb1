import type { Instant } from '@stubpost/shared';
import type { StepNow, TurnNow } from '../../../lib/turn/turn-now';
import type { TimeWindow } from './time-window';
import { arrivalOf, departureOf, isFarOffPlan, isOver, plannedStretch } from '../../../lib/turn/turn-times';

/** Where the parts of the work lane begin and end; null where there is nothing of it. */
export interface WorkLane {
  /** Solid: from the post to now, to where it was last heard, or to the departure. */
  work: TimeWindow | null;
  /** The minutes past the scheduled departure of a turn that still stands. */
  over: TimeWindow | null;
  /** From the last word to now. */
  unheard: TimeWindow | null;
  /** Expected to stand: dashed. */
  open: TimeWindow | null;
}

/** Where the parts of the next lane begin and end. */
export interface NextLane {
  /** Work still to do. */
  hatches: TimeWindow[];
  /** Time to spare. */
  rooms: TimeWindow[];
  /** Minutes short. */
  bracket: TimeWindow | null;
  readyAt: Instant | null;
  /** Where the figure stands: right of the later of departure and ready. */
  figureAt: Instant;
}

const nonEmpty = (from: Instant | null, to: Instant | null): TimeWindow | null =>
  from !== null && to !== null && from < to ? { from, to } : null;

/** When work on the train began: at the post, or for a first train out with the first thing recorded. */
export function workBegan(turn: TurnNow): Instant | null {
  if (turn.arrivedAt !== null) return turn.arrivedAt;
  if (turn.kind !== 'first-out') return null;
  const done = turn.steps.map((step) => step.doneAt).filter((at) => at !== null);
  return done.length === 0 ? null : Math.min(...done);
}

/** The work lane of a turn at `now`. */
export function workLane(turn: TurnNow, now: Instant): WorkLane {
  const none: WorkLane = { work: null, over: null, unheard: null, open: null };
  if (isFarOffPlan(turn)) return none;
  const began = workBegan(turn);
  if (turn.departedAt !== null) return { ...none, work: nonEmpty(began, turn.departedAt) };
  if (turn.state === 'closed') return { ...none, work: nonEmpty(began, lastDone(turn) ?? began) };
  const ends = expectedEnd(turn);
  if (began === null) {
    const from = arrivalOf(turn) ?? plannedStretch(turn).from;
    return { ...none, open: nonEmpty(from, ends) };
  }
  return { ...standingBar(turn, began, now), open: nonEmpty(now, ends) };
}

function standingBar(turn: TurnNow, began: Instant, now: Instant): Omit<WorkLane, 'open'> {
  if (turn.health === 'no-word') {
    const heard = Math.max(began, turn.lastHeardAt ?? began);
    return { work: nonEmpty(began, heard), over: null, unheard: nonEmpty(heard, now) };
  }
  if (turn.health !== 'late' || turn.scheduledDepartureAt === null) {
    return { work: nonEmpty(began, now), over: null, unheard: null };
  }
  const from = Math.max(began, turn.scheduledDepartureAt);
  return { work: nonEmpty(began, from), over: nonEmpty(from, now), unheard: null };
}

/** When the open end closes: at the departure, or when the work will be done if that is later. */
export function expectedEnd(turn: TurnNow): Instant | null {
  const leaves = departureOf(turn);
  if (leaves === null) return turn.readyAt;
  return Math.max(leaves, turn.health === 'no-word' ? leaves : (turn.readyAt ?? leaves));
}

function lastDone(turn: TurnNow): Instant | null {
  const done = turn.steps.map((step) => step.doneAt).filter((at) => at !== null);
  return done.length === 0 ? null : Math.max(...done);
}

/**
 * The next lane: hatch for the work that holds the departure and is not done, a line for the time between, a bracket
 * for the minutes beyond the departure. Null when there is no forecast to draw: far off, gone, or nothing heard.
 */
export function nextLane(turn: TurnNow, now: Instant): NextLane | null {
  const leaves = departureOf(turn);
  if (isFarOffPlan(turn) || isOver(turn) || turn.health === 'no-word' || leaves === null) return null;
  const began = workBegan(turn) === null ? (arrivalOf(turn) ?? now) : now;
  const from = Math.max(began, now);
  const hatches = merged(turn.steps.filter(isAhead).map((step) => pieceOf(step, from)));
  const ready = hatches.at(-1)?.to ?? null;
  const end = Math.max(leaves, ready ?? leaves);
  return {
    hatches,
    rooms: gaps(hatches, { from, to: Math.max(leaves, from) }),
    bracket: ready === null ? null : nonEmpty(Math.min(leaves, ready), ready > leaves ? ready : null),
    readyAt: ready,
    figureAt: Math.max(end, ready === null ? from : end),
  };
}

const isAhead = (step: StepNow): boolean =>
  step.holdsDeparture && step.doneAt === null && step.finishAt !== null && step.state !== 'not-needed';

function pieceOf(step: StepNow, from: Instant): TimeWindow {
  const finish = step.finishAt ?? from;
  return { from: Math.max(from, step.startAt ?? finish), to: Math.max(from, finish) };
}

function merged(pieces: TimeWindow[]): TimeWindow[] {
  const result: TimeWindow[] = [];
  for (const piece of [...pieces].sort((a, b) => a.from - b.from)) {
    const last = result.at(-1);
    if (piece.to <= piece.from) continue;
    if (last !== undefined && piece.from <= last.to) last.to = Math.max(last.to, piece.to);
    else result.push({ ...piece });
  }
  return result;
}

function gaps(pieces: readonly TimeWindow[], within: TimeWindow): TimeWindow[] {
  const result: TimeWindow[] = [];
  let at = within.from;
  for (const piece of pieces) {
    const gap = nonEmpty(at, Math.min(piece.from, within.to));
    if (gap !== null) result.push(gap);
    at = Math.max(at, piece.to);
  }
  const rest = nonEmpty(at, within.to);
  return rest === null ? result : [...result, rest];
}
