import {
  recordableKinds,
  rolesAt,
  type EntryKind,
  type EntrySource,
  type Instant,
  type PersonAccess,
  type WireReading,
} from '@stubpost/shared';

/** What can be entered about a turn; each has a form. */
export const ENTRY_ACTS = [
  'step',
  'arrival',
  'expected-arrival',
  'departure',
  'hold',
  'track',
  'set',
  'crew',
  'relief',
  'blue-signal-up',
  'blue-signal-down',
  'annulled',
  'withdrawn',
  'corrected',
  'note',
] as const;
export type EntryAct = (typeof ENTRY_ACTS)[number];

/** What a form is opened for. */
export interface ActTarget {
  act: EntryAct;
  turnId: string;
  /** Step that is chosen at first. */
  step?: string | null;
  /** Entry to take back or to correct, what it says, when it was and what was read off. */
  entryId?: string;
  entryWords?: string;
  entryAt?: Instant;
  entryReading?: WireReading | null;
  /** Job whose holder changes. */
  as?: 'conductor' | 'engineer';
}

export const actTitles: Record<EntryAct, string> = {
  step: 'Relay a step',
  arrival: 'Arrival',
  'expected-arrival': 'Expected arrival',
  departure: 'Departure',
  hold: 'Hold',
  track: 'Move track',
  set: 'Swap set',
  crew: 'Crew',
  relief: 'Relief',
  'blue-signal-up': 'Blue signal up',
  'blue-signal-down': 'Take down blue signal',
  annulled: 'Annul the turn',
  withdrawn: 'Withdraw an entry',
  corrected: 'Ask for a correction',
  note: 'Note',
};

/** What an entry is called in the line that answers it. */
export const entryNouns: Record<EntryKind, string> = {
  arrival: 'Arrival',
  departure: 'Departure',
  'expected-arrival': 'Expected arrival',
  'step-done': 'Step',
  withdrawn: 'Withdrawal',
  corrected: 'Correction',
  'cannot-do': 'Cannot be done',
  crew: 'Crew',
  relief: 'Relief',
  briefing: 'Briefing',
  track: 'Track',
  set: 'Set',
  hold: 'Hold',
  annulled: 'Annulment',
  'blue-signal-up': 'Blue signal up',
  'blue-signal-down': 'Blue signal down',
  note: 'Note',
  agreed: 'Agreement',
  disagreed: 'Objection',
  ruled: 'Ruling',
  'correction-approved': 'Approval',
  'correction-declined': 'Refusal',
  defect: 'Bad-order report',
  'tied-up': 'Tie-up',
};

const kindsOfAct: Record<EntryAct, readonly EntryKind[]> = {
  step: ['step-done', 'cannot-do'],
  arrival: ['arrival'],
  'expected-arrival': ['expected-arrival'],
  departure: ['departure'],
  hold: ['hold'],
  track: ['track'],
  set: ['set'],
  crew: ['crew'],
  relief: ['relief'],
  'blue-signal-up': ['blue-signal-up'],
  'blue-signal-down': ['blue-signal-down'],
  annulled: ['annulled'],
  withdrawn: ['withdrawn'],
  corrected: ['corrected'],
  note: ['note'],
};

/** The forms that a person may use at a terminal, by the policy the service enforces. */
export function actsOf(person: PersonAccess, terminal: string): ReadonlySet<EntryAct> {
  const kinds = recordableKinds(person, terminal);
  return new Set(ENTRY_ACTS.filter((act) => kindsOfAct[act].some((kind) => kinds.includes(kind))));
}

/** Acts that tell of something which happened at the train, so that it matters how it is known. */
export function isWitnessed(act: EntryAct): boolean {
  return ['step', 'arrival', 'departure', 'expected-arrival', 'relief'].includes(act);
}

/** How a person usually knows: the desk by radio, everybody else by their own hand. */
export function usualSource(person: PersonAccess, terminal: string, act: EntryAct): EntrySource {
  if (!isWitnessed(act)) return 'by-hand';
  return rolesAt(person, terminal).includes('dispatcher') ? 'by-radio' : 'by-hand';
}
