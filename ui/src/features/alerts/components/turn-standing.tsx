import { formatRelative, formatTime } from '../../../lib/time-display';
import { healthFlag } from '../../../lib/turn/health-flag';
import type { TurnNow } from '../../../lib/turn/turn-now';
import { departureOf, isOver } from '../../../lib/turn/turn-times';
import { formatClock } from '../../../lib/time-display';
import { BlueSignalFlag } from '../../../components/flags';

/** The flag of the alert's turn; nothing while it is on plan. */
export function TurnFlag({ turn, now }: { turn: TurnNow; now: number }) {
  const words = healthFlag(turn, now);
  if (words !== null) return <span className={`flag ${turn.health}`}>{words}</span>;
  return turn.blueSignal === null || isOver(turn) ? null : <BlueSignalFlag />;
}

/** When the turn leaves, is to leave or left: "leaves 17:34, in 7 min". */
export function leavesWords(turn: TurnNow, now: number): string {
  if (turn.departedAt !== null) return `left ${formatClock(turn.departedAt, turn.zone)}`;
  if (turn.annulled !== null) return 'annulled';
  const leaves = departureOf(turn);
  if (leaves === null) return 'ties up here';
  if (leaves < now) return `was to leave ${formatTime(leaves, turn.zone)}`;
  return `leaves ${formatTime(leaves, turn.zone)}, ${formatRelative(leaves, now)}`;
}

/** The same with the forecast where it lies later: "leaves 17:34, ready about 17:37". */
export function leavesAndReady(turn: TurnNow, now: number): string {
  const leaves = departureOf(turn);
  const isShort =
    leaves !== null && turn.readyAt !== null && turn.readyAt > leaves && turn.health !== 'no-word';
  if (isOver(turn) || !isShort || turn.readyAt === null) return leavesWords(turn, now);
  return `leaves ${formatTime(leaves, turn.zone)}, ready about ${formatTime(turn.readyAt, turn.zone)}`;
}
