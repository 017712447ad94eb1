import type { TurnRecord } from '../model/turn-records';
import type { ActOnPage } from './use-act';

/** What is on the page of a turn now. Every place but `act` and `second` has a heading and a way back. */
export type Place =
  | { kind: 'act' }
  | { kind: 'second'; page: ActOnPage }
  | { kind: 'steps' }
  /** One record: how it is known, its accounts, the way back from it. */
  | { kind: 'record'; key: string }
  | { kind: 'cannot-do'; step: string; label: string }
  | { kind: 'note' }
  | { kind: 'annul' }
  | { kind: 'withdraw'; record: TurnRecord }
  | { kind: 'correct'; record: TurnRecord }
  | { kind: 'not-so'; entryId: string }
  | { kind: 'card'; step: string }
  | { kind: 'defect' }
  | { kind: 'relief' };
