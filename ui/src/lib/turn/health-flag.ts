import { millisecondsInMinute, type Instant } from '@stubpost/shared';
import { HEALTH_WORDS } from '../../components/words';
import type { TurnNow } from './turn-now';
import { isOver } from './turn-times';

/** Words of the health flag with their minutes; null where there is nothing to flag. */
export function healthFlag(turn: TurnNow, now: Instant): string | null {
  if (isOver(turn)) return null;
  const minutes = (since: Instant | null): number =>
    since === null ? 0 : Math.max(0, Math.floor((now - since) / millisecondsInMinute));
  switch (turn.health) {
    case 'on-plan':
      return null;
    case 'late':
      return `Late ${minutes(turn.scheduledDepartureAt)} min`;
    case 'no-word':
      return `No word ${minutes(turn.lastHeardAt ?? turn.scheduledArrivalAt)} min`;
    default:
      return HEALTH_WORDS[turn.health];
  }
}
