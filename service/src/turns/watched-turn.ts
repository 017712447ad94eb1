import { type Instant, type TurnFacts, lifeOf } from '@stubpost/shared';
import type { AlertRecord } from '../alerts/alert-record';
import type { WatchedTurn } from '../alerts/watched-turn';
import type { TurnFile } from './turn-file';

/** What the alerts need to know about a turn. */
export function watchedTurnOf({
  record,
  facts,
  alerts,
}: TurnFile): WatchedTurn & { alerts: readonly AlertRecord[] } {
  return {
    turnId: record.id,
    terminalCode: record.terminalCode,
    zone: record.zone,
    serviceDate: record.serviceDate,
    facts,
    alerts,
  };
}

/** Whether the passing of time changes nothing about a turn any more. */
export function isOver(facts: TurnFacts, now: Instant): boolean {
  const state = lifeOf(facts, now);
  return state === 'closed' || state === 'annulled';
}
