import type { WireTurn } from '@stubpost/shared';

/** When a turn is to leave: the schedule, or the hold when it is later. Null for a tie-up. */
export function leavesAt(turn: WireTurn): string | null {
  const { outbound } = turn;
  if (outbound === null) return null;
  const { scheduledDepartureAt, heldUntil } = outbound;
  return heldUntil !== null && Date.parse(heldUntil) > Date.parse(scheduledDepartureAt)
    ? heldUntil
    : scheduledDepartureAt;
}
