import type { Instant } from '../lib/instant';
import type { Health } from '../turn/turn';
import type { AssessedTurn } from './assessed-turn';
import type { LatenessSettings } from './settings';
import { findSilence } from './silence';

/**
 * How a turn stands against its plan at `now`. *Late*: its departure (scheduled, or the hold's) has passed and it has
 * not left. *No word*: the next act is 3 min past due and nothing was heard since. *Short*: slack below 0. *Tight*:
 * slack below 60 s. Else *On plan*; so is a turn that has left, is closed or is annulled. At the very second of the
 * departure a train is not late yet.
 */
export function healthOf(turn: AssessedTurn, settings: LatenessSettings, now: Instant): Health {
  if (turn.departureAt !== null || turn.state === 'closed' || turn.state === 'annulled') return 'on-plan';
  const { departureAnchorAt, slackSeconds } = turn.forecast;
  if (departureAnchorAt !== null && now > departureAnchorAt) return 'late';
  if (findSilence(turn, settings, now) !== null) return 'no-word';
  if (slackSeconds === null) return 'on-plan';
  if (slackSeconds < 0) return 'short';
  return slackSeconds < settings.tightSeconds ? 'tight' : 'on-plan';
}
