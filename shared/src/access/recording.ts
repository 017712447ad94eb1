import type { Instant } from '../lib/instant';
import type { EntryKind, EntrySource } from '../turn/entry';
import { rolesAt, type PersonAccess, type Role } from './roles';

/** What happens at the train, which a crew records and the desk writes down as it hears it. */
const trainKinds = [
  'arrival',
  'departure',
  'step-done',
  'withdrawn',
  'corrected',
  'cannot-do',
  'crew',
  'relief',
  'briefing',
  'note',
  'defect',
  'tied-up',
] as const satisfies readonly EntryKind[];

const crewKinds = [...trainKinds, 'agreed', 'disagreed'] as const;
const deskKinds = [...trainKinds, 'expected-arrival', 'track', 'set', 'hold', 'annulled', 'ruled'] as const;

/**
 * Which kinds of entry each role may record (our choice, after the product's list of roles). The desk may write
 * all that happens at the train, plus its own orders and rulings; only the crew agrees to what the desk wrote, and
 * only a supervisor decides on corrections. Only mechanical inspectors put blue signals up or take them down.
 * The administrator of the system records nothing about operations.
 */
const kindsOfRole: Record<Role, readonly EntryKind[]> = {
  conductor: crewKinds,
  engineer: crewKinds,
  dispatcher: deskKinds,
  supervisor: ['note', 'corrected', 'withdrawn', 'ruled', 'correction-approved', 'correction-declined'],
  inspector: ['blue-signal-up', 'blue-signal-down', 'note', 'defect'],
  planner: [],
  analyst: [],
  auditor: [],
  administrator: [],
};

/** The kinds of entry a person may record at a terminal, from all the roles they hold there. */
export function recordableKinds(person: PersonAccess, terminal: string): EntryKind[] {
  return [...new Set(rolesAt(person, terminal).flatMap((role) => kindsOfRole[role]))];
}

/** Whether a person may record one kind of entry at a terminal. */
export function mayRecord(person: PersonAccess, kind: EntryKind, terminal: string): boolean {
  return rolesAt(person, terminal).some((role) => kindsOfRole[role].includes(kind));
}

/** Whose entries a person may take back at a terminal. */
export type WithdrawalReach = 'nobody' | 'own' | 'anyone';

/** A crew takes back its own entries; desk and supervisor anybody's. */
export function withdrawalReach(person: PersonAccess, terminal: string): WithdrawalReach {
  const roles = rolesAt(person, terminal);
  if (roles.includes('dispatcher') || roles.includes('supervisor')) return 'anyone';
  return roles.some((role) => kindsOfRole[role].includes('withdrawn')) ? 'own' : 'nobody';
}

/** What the rule of the controls looks at: one entry that a person is about to record about their own train. */
export interface ControlsQuestion {
  /** The writer is on this turn as its engineer. */
  isEngineerOfTurn: boolean;
  /** Step of a `step-done` or `cannot-do` entry. */
  step?: string | undefined;
  source: EntrySource;
  observedAt: Instant;
  receivedAt: Instant;
  /**
   * When the engineer was at the controls: from the recorded `engineer-in-cab` until the next recorded arrival
   * (null: not yet arrived). Null when `engineer-in-cab` is not recorded.
   */
  atControls: { from: Instant; until: Instant | null } | null;
}

/**
 * Whether an entry must not be taken because its writer would be using a device at the controls. For the engineer
 * of a turn `engineer-in-cab` and `running-test` are never taken from their own device at the time, and from
 * `engineer-in-cab` until the next arrival nothing is. The conductor records it, the desk does from radio, or it is
 * entered later, away from the controls. An entry by hand was made when it was observed, so one that waited on the
 * phone is judged by that time; any other by when it came in.
 * Source: 49 CFR 220.305 and 220.307 (electronic devices of those who operate the controls); text of the current
 * edition not confirmed by the railroad.
 */
export function barredAtTheControls(question: ControlsQuestion): boolean {
  if (!question.isEngineerOfTurn) return false;
  const later = question.source === 'entered-later';
  if (!later && (question.step === 'running-test' || question.step === 'engineer-in-cab')) return true;
  if (question.atControls === null) return false;
  const { from, until } = question.atControls;
  const madeAt = question.source === 'by-hand' ? question.observedAt : question.receivedAt;
  return madeAt >= from && (until === null || madeAt < until);
}
