import type { Instant } from '../lib/instant';
import type { AssessedTurn } from './assessed-turn';
import type { Finding } from './finding';
import { isAssessed } from './horizon';
import { findLateDeparture } from './late-departure';
import { findNoRequiredRecord, findRunningTest } from './missing-records';
import { findBlueSignal, findUnsecured } from './securement';
import type { LatenessSettings } from './settings';
import { findEngineerAbsent, findNoWord } from './silence';

/**
 * Everything about a turn at `now` that a named person can act on in time; at most one finding for each cause, the
 * most urgent first. Nothing outside the horizon, nothing for annulled and practice turns, no late departure once the
 * train has left. A step past its plan time while there is time to spare is no finding. Hold times are not this
 * function's matter: see `nextAlertStep`. One function for the server's sweep and for the browser.
 */
export function assess(turn: AssessedTurn, settings: LatenessSettings, now: Instant): Finding[] {
  if (!isAssessed(turn, now)) return [];
  const found = [
    findUnsecured(turn, settings, now),
    findBlueSignal(turn, settings, now),
    findNoRequiredRecord(turn, settings),
    findLateDeparture(turn, settings),
    findRunningTest(turn, settings, now),
    findEngineerAbsent(turn, settings, now),
    findNoWord(turn, settings, now),
  ];
  return found.filter((finding) => finding !== null);
}
