import {
  CREW_ROLES,
  addSeconds,
  rolesAt,
  type CrewRole,
  type Instant,
  type PersonAccess,
  type WireTurn,
} from '@stubpost/shared';
import { toInstant } from '../../../lib/time-display';
import { hasLeft, isSettled } from './next-act';

/** How far ahead `/my` looks, and how far back for turns of one's own that are still open. Our choice. */
export const aheadSeconds = 2 * 3600;
export const backSeconds = 2 * 3600;
/** The window moves in steps of this, so that the same list is asked for again and again. */
const windowStepSeconds = 600;

/** The span of instants that `/my` asks the board for: two hours either way, on round ten minutes. */
export function myWindow(now: Instant): { from: Instant; to: Instant } {
  const step = windowStepSeconds * 1000;
  return {
    from: Math.floor(addSeconds(now, -backSeconds) / step) * step,
    to: Math.ceil(addSeconds(now, aheadSeconds) / step) * step,
  };
}

/** When a turn begins to concern a crew: the arrival, as far as it is known, else the departure. */
export function turnStartsAt(turn: WireTurn): Instant {
  const { inbound, outbound } = turn;
  const text =
    inbound?.actualArrivalAt ??
    inbound?.expectedArrivalAt ??
    inbound?.scheduledArrivalAt ??
    outbound?.scheduledDepartureAt;
  return text === undefined ? 0 : toInstant(text);
}

/** The jobs a person may have on a turn of a terminal. */
export function crewRolesAt(person: PersonAccess, terminal: string): CrewRole[] {
  const roles = rolesAt(person, terminal);
  return CREW_ROLES.filter((role) => roles.includes(role));
}

/** The job a person has on a turn; null when none. */
export function roleOnTurn(turn: WireTurn, personId: string): CrewRole | null {
  return turn.crew.find((member) => member.personId === personId)?.as ?? null;
}

/** How many steps of a turn are recorded, out of those it asks for. */
export function progressOf(turn: WireTurn): { recorded: number; asked: number } {
  const asked = turn.steps.filter((step) => step.state !== 'not-needed');
  return { recorded: asked.filter(isSettled).length, asked: asked.length };
}

/** Steps that were left open when the train left. */
export function openAfterDeparture(turn: WireTurn): number {
  const { recorded, asked } = progressOf(turn);
  return hasLeft(turn) ? asked - recorded : 0;
}

const isOver = (turn: WireTurn): boolean =>
  turn.annulled !== null || turn.state === 'closed' || (hasLeft(turn) && openAfterDeparture(turn) === 0);

/** The turns of `/my`: one's own that ask for something, how many of one's own are over, and those nobody of us has. */
export interface MyTurns {
  mine: WireTurn[];
  mineOver: WireTurn[];
  others: WireTurn[];
}

/** Sorts the turns of one's terminals, each list by time. Others' turns that have left or are over are left out. */
export function sortMyTurns(turns: readonly WireTurn[], personId: string, now: Instant): MyTurns {
  const byTime = [...turns].sort((a, b) => turnStartsAt(a) - turnStartsAt(b) || a.id.localeCompare(b.id));
  const own = byTime.filter((turn) => roleOnTurn(turn, personId) !== null);
  const foreign = byTime.filter((turn) => roleOnTurn(turn, personId) === null);
  return {
    mine: own.filter((turn) => !isOver(turn)),
    mineOver: own.filter(isOver),
    others: foreign.filter(
      (turn) => !isOver(turn) && !hasLeft(turn) && turnStartsAt(turn) <= addSeconds(now, aheadSeconds),
    ),
  };
}

/** The turn the foot of `/my` opens: the one whose train stands here, else the next to come, else one still open. */
export function turnAtHand(mine: readonly WireTurn[]): WireTurn | null {
  const standing = mine.find((turn) => !hasLeft(turn) && (turn.inbound?.actualArrivalAt ?? null) !== null);
  return standing ?? mine.find((turn) => !hasLeft(turn)) ?? mine[0] ?? null;
}
