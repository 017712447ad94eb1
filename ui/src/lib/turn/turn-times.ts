import { millisecondsInMinute, type Instant, type WireAlert } from '@stubpost/shared';
import type { TurnNow } from './turn-now';

/** Half-open stretch of time, `from` included. */
export interface Stretch {
  from: Instant;
  to: Instant;
}

/** A turn without an arrival is drawn from this long before it leaves, one without a departure this long after it came. */
const openSide = 20 * millisecondsInMinute;

const latest = (...instants: (Instant | null)[]): Instant | null =>
  instants.reduce((late, one) => (one === null || (late !== null && late >= one) ? late : one), null);

/** When the train stands at the post: recorded, else as planned or as last expected; null for a first train out. */
export function arrivalOf(turn: TurnNow): Instant | null {
  return turn.arrivedAt ?? latest(turn.scheduledArrivalAt, turn.expectedArrivalAt);
}

/** When the train is to leave: as planned, or until when it is held; null for a tie-up. */
export function departureOf(turn: TurnNow): Instant | null {
  return latest(turn.scheduledDepartureAt, turn.heldUntil);
}

/** Scheduled stretch: the outline of the plan lane. */
export function plannedStretch(turn: TurnNow): Stretch {
  return stretch(turn.scheduledArrivalAt, turn.scheduledDepartureAt);
}

/** Stretch during which the train takes up its track, as far as is known at `now`. */
export function trackStretch(turn: TurnNow, now: Instant): Stretch {
  const leaves = turn.departedAt ?? latest(turn.expectedDepartureAt, departureOf(turn));
  const { from, to } = stretch(arrivalOf(turn), leaves);
  const standing = turn.arrivedAt !== null && !isOver(turn);
  return { from, to: standing ? Math.max(to, now) : to };
}

/** From the first thing to draw to the last: decides whether a turn is in a window. */
export function shownStretch(turn: TurnNow, now: Instant): Stretch {
  const planned = plannedStretch(turn);
  const real = trackStretch(turn, now);
  return { from: Math.min(planned.from, real.from), to: Math.max(planned.to, real.to) };
}

/** Order of the board: by scheduled departure, which does not change as the turn goes on. */
export function bySchedule(a: TurnNow, b: TurnNow): number {
  const key = (turn: TurnNow): Instant => turn.scheduledDepartureAt ?? turn.scheduledArrivalAt ?? 0;
  return key(a) - key(b) || (a.train < b.train ? -1 : 1);
}

/** The alert of a turn that is shown first: one that nobody has, then the most urgent, then the oldest. */
export function foremostAlert(alerts: readonly WireAlert[]): WireAlert | null {
  const rank = { 'act-now': 0, 'act-soon': 1, watch: 2 };
  const standing = alerts.filter((alert) => isStanding(alert));
  const sorted = [...standing].sort(
    (a, b) =>
      Number(a.state !== 'raised') - Number(b.state !== 'raised') ||
      rank[a.priority] - rank[b.priority] ||
      a.raisedAt.localeCompare(b.raisedAt),
  );
  return sorted[0] ?? null;
}

/** Raised, taken or set aside: still wants somebody. */
export function isStanding(alert: WireAlert): boolean {
  return alert.state === 'raised' || alert.state === 'taken' || alert.state === 'set-aside';
}

/** Nobody has it. */
export function isUntaken(turn: TurnNow): boolean {
  return turn.alerts.some((alert) => alert.state === 'raised');
}

/** A turn so far off that only its plan is drawn, or one struck from the plan. */
export function isFarOffPlan(turn: TurnNow): boolean {
  return turn.state === 'scheduled' || turn.annulled !== null;
}

/**
 * Slack as a screen may show it: none for a turn that is over or of which nothing is heard, and none once a train that
 * is ready stands past its departure, because then no work is left that could wait.
 */
export function shownSlack(turn: TurnNow): number | null {
  if (isOver(turn) || turn.health === 'no-word') return null;
  return turn.health === 'late' && (turn.slackSeconds ?? 0) >= 0 ? null : turn.slackSeconds;
}

/** Gone or struck from the plan: nothing on the board waits for it. */
export function isOver(turn: TurnNow): boolean {
  return turn.departedAt !== null || turn.annulled !== null || turn.state === 'closed';
}

function stretch(from: Instant | null, to: Instant | null): Stretch {
  if (from === null && to === null) return { from: 0, to: 0 };
  if (from === null) return { from: (to ?? 0) - openSide, to: to ?? 0 };
  return { from, to: Math.max(to ?? from + openSide, from) };
}
