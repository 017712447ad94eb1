import type { Instant } from '../lib/instant';
import type { Account } from './account';
import type { Answer } from './answers';
import type { RecordCorrection } from './corrections';
import type { ReliefFact } from './crew';
import type { TieUp } from './remarks';

/**
 * What is wrong with an entry, or missing beside it. Nothing is refused for it; it is told at once, in words
 * (`formatEntryFinding`). `step` is a key of the plan or the word `arrival` or `departure`.
 */
export type EntryFinding =
  /** Two accounts of one thing more than 60 s apart; the one that counts comes first. */
  | { code: 'entry.two_times'; step: string; accounts: Account[] }
  /** A person does not agree with an account, and nobody has ruled on it. */
  | { code: 'entry.objection'; step: string; account: Account; objection: Answer }
  /** Recorded without the step it must follow, or earlier than that step (`beforeAt`). */
  | { code: 'entry.out_of_order'; step: string; at: Instant; before: string; beforeAt: Instant | null }
  /** Earlier than its not-before time. */
  | { code: 'entry.too_early'; step: string; at: Instant; notBefore: Instant }
  /** Earlier than the train came in. */
  | { code: 'entry.before_arrival'; step: string; at: Instant; arrivalAt: Instant }
  /** A step the train should have waited for, done only after it left. */
  | { code: 'entry.after_departure'; step: string; at: Instant; departureAt: Instant }
  /** The train left without a record of a step it should have waited for. */
  | { code: 'entry.step_missing'; step: string; departureAt: Instant }
  /** Fewer handbrakes released than set: the step stays open. `cars` still have theirs set, where cars were named. */
  | { code: 'entry.smaller_count'; step: string; released: number; set: number; cars: string[] }
  /** More handbrakes released than set. */
  | { code: 'entry.larger_count'; step: string; released: number; set: number }
  /** Released without a count although a count was set. */
  | { code: 'entry.no_count'; step: string; set: number }
  /** A handbrake record that says that none was set. */
  | { code: 'entry.no_handbrake'; step: string }
  /** Manned, tested or left while a blue signal was up. */
  | { code: 'entry.blue_signal_up'; step: string; at: Instant; by: string }
  /** An operator took charge, and not face to face by the word of both: a brake test is called for. */
  | { code: 'entry.not_face_to_face'; relief: ReliefFact }
  /** A change of the record after the departure that nobody has decided on. */
  | { code: 'entry.correction_waiting'; correction: RecordCorrection }
  /** The set was tied up, and a step that secures it is not recorded. */
  | { code: 'entry.tied_up_open'; tieUp: TieUp; steps: string[] }
  /** Names a step that this turn does not have. */
  | { code: 'entry.unknown_step'; step: string }
  /** Takes back, corrects, answers or decides on an entry that is not on this turn. */
  | { code: 'entry.unknown_target'; entryId: string }
  /** Claims a time more than a minute after it was received: a clock is wrong. */
  | { code: 'entry.in_future'; entryId: string; at: Instant; receivedAt: Instant };
export type EntryFindingCode = EntryFinding['code'];
