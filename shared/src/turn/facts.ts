import type { Instant } from '../lib/instant';
import type { PlanStep } from '../plan/step-plan';
import type { Account } from './account';
import type { Answer } from './answers';
import type { BlueSignal } from './blue-signals';
import type { RecordCorrection } from './corrections';
import type { CrewOnTurn, ReliefFact } from './crew';
import type { Entry } from './entry';
import type { EntryFinding } from './entry-finding';
import type { Handbrakes } from './handbrakes';
import type { DefectReport, TieUp } from './remarks';
import type { PlannedTurn } from './turn';

/** Accounts of one thing on which a person has to rule: they lie more than 60 s apart, or somebody objects. */
export interface InQuestion {
  /** Key of a step, or the word `arrival` or `departure`. */
  step: string;
  /** The one that counts comes first. */
  accounts: Account[];
  /** Whether two of the accounts lie more than 60 s apart. */
  timesDiffer: boolean;
  /** Who does not agree with which account, and why. */
  objections: Answer[];
}

/** A step by radio to which no crew has said anything yet. */
export interface AsksAgreement {
  step: string;
  account: Account;
}

/** Somebody said that a step cannot be done, and it has not been done since. */
export interface CannotDo {
  step: string;
  entryId: string;
  at: Instant;
  reason: string;
  by: string | null;
}

/** A note as it stands. */
export interface TurnNote {
  entryId: string;
  at: Instant;
  by: string | null;
  note: string;
}

/**
 * What is known about one turn from its entries alone, without a clock. The same entries give the same facts in
 * whatever order they came in.
 */
export interface TurnFacts {
  planned: PlannedTurn;
  /** The steps that belong to this turn, from `stepsFor`. */
  steps: readonly PlanStep[];
  carriedOver: readonly CrewOnTurn[];
  /** All entries, each id once, by observed time and then by id. */
  entries: readonly Entry[];

  arrivalAt: Instant | null;
  arrival: Account | null;
  departureAt: Instant | null;
  departure: Account | null;
  expectedArrivalAt: Instant | null;
  /** Until when the train is held by the latest order; null without one. */
  heldUntil: Instant | null;
  holdReason: string | null;
  track: string | null;
  set: string | null;
  crew: CrewOnTurn[];
  reliefs: ReliefFact[];
  /** The account that counts, by step. A release whose counts do not agree is not among them. */
  done: Readonly<Record<string, Account>>;
  /** Recorded time by step: `done` without its details. */
  doneAt: Readonly<Record<string, Instant>>;
  /** Steps that were recorded, and every record of them has been taken back. */
  withdrawn: string[];
  inQuestion: InQuestion[];
  asksAgreement: AsksAgreement[];
  /** Corrections and withdrawals asked for after the departure. */
  corrections: RecordCorrection[];
  defects: DefectReport[];
  tiedUp: TieUp | null;
  cannotDo: CannotDo[];
  annulled: { entryId: string; at: Instant; reason: string; by: string | null } | null;
  /** The signal that has stood longest; null when none stands. */
  blueSignal: { since: Instant; by: string } | null;
  blueSignals: BlueSignal[];
  handbrakes: Handbrakes;
  briefings: Account[];
  notes: TurnNote[];
  /** Newest receipt of any entry; null before the first. */
  lastHeardAt: Instant | null;
  findings: EntryFinding[];
}
