import type { Instant } from '../lib/instant';

/** How a fact is known, in falling order of rank when two entries speak of one step (first-hand counts over relayed). */
export const ENTRY_SOURCES = ['by-hand', 'by-feed', 'by-radio', 'entered-later'] as const;
export type EntrySource = (typeof ENTRY_SOURCES)[number];

/** Every kind of fact that can be appended about a turn. */
export const ENTRY_KINDS = [
  'arrival',
  'departure',
  'expected-arrival',
  'step-done',
  'withdrawn',
  'corrected',
  'cannot-do',
  'crew',
  'relief',
  'briefing',
  'track',
  'set',
  'hold',
  'annulled',
  'blue-signal-up',
  'blue-signal-down',
  'note',
  'agreed',
  'disagreed',
  'ruled',
  'correction-approved',
  'correction-declined',
  'defect',
  'tied-up',
] as const;
export type EntryKind = (typeof ENTRY_KINDS)[number];

/** What an entry may be about. */
export const SUBJECT_KINDS = ['turn', 'set', 'unit', 'track'] as const;
export type SubjectKind = (typeof SUBJECT_KINDS)[number];

/** The jobs a person can have on a turn. */
export const CREW_ROLES = ['conductor', 'engineer'] as const;
export type CrewRole = (typeof CREW_ROLES)[number];

/** What can be wrong with a car, for a bad-order report. Common practice, no published source. */
export const DEFECT_CAUSES = [
  'brakes',
  'handbrake',
  'door',
  'lights',
  'heating',
  'wheel',
  'coupler',
  'window',
  'other',
] as const;
export type DefectCause = (typeof DEFECT_CAUSES)[number];

/** What a crew looks after when it ties a set up, beside its handbrakes. Common practice, no published source. */
export const TIE_UP_CHECKS = ['lights', 'doors', 'heat', 'chocks'] as const;
export type TieUpCheck = (typeof TIE_UP_CHECKS)[number];

/** Handbrakes that stand set on a set that is left: how many, and on which cars where those are named. */
export interface LeftHandbrakes {
  count: number;
  cars: string[];
}

/** What was read off or counted with a step. Pressures in psi, time in seconds. */
export interface Reading {
  /** Handbrakes set or released. */
  count?: number | undefined;
  /** Numbers of the cars they are on. */
  cars?: string[] | undefined;
  brakePipePsi?: number | undefined;
  /** Brake-pipe pressure at the start and the end of a leakage test, and its length. */
  p0?: number | undefined;
  p1?: number | undefined;
  seconds?: number | undefined;
}

/** Who wrote an entry; the name is kept as it was that day. Null for the system itself and for feeds. */
export interface EntryAuthor {
  personId: string;
  name: string;
}

interface EntryFacts {
  /** Made where the act was recorded; the same id twice is one entry. */
  id: string;
  subject: { kind: SubjectKind; id: string };
  /** When it happened, by the account of the person. */
  observedAt: Instant;
  /** When the server got it. */
  receivedAt: Instant;
  source: EntrySource;
  by: EntryAuthor | null;
  /** Who said it, as heard, for entries by radio. */
  saidBy?: string | undefined;
  /** Device clock minus server clock in milliseconds, when the device knows it. */
  clockOffsetMilliseconds?: number | undefined;
}

/**
 * The fields that go with each kind. A correction's `observedAt` is when it was made, as with every other kind; the
 * time it claims for its target is `correctedObservedAt`. On the wire the two are called `madeAt` and `observedAt`.
 */
export type EntryContent =
  | { kind: 'arrival' }
  | { kind: 'departure' }
  | { kind: 'expected-arrival'; expectedAt: Instant }
  | { kind: 'step-done'; step: string; reading?: Reading | undefined }
  | { kind: 'withdrawn'; target: string; reason: string }
  | {
      kind: 'corrected';
      target: string;
      correctedObservedAt?: Instant | undefined;
      reading?: Reading | undefined;
      reason: string;
    }
  | { kind: 'cannot-do'; step: string; reason: string }
  | { kind: 'crew'; person: EntryAuthor; as: CrewRole }
  | { kind: 'relief'; out: EntryAuthor; in: EntryAuthor | null; as: CrewRole; faceToFace: boolean }
  | { kind: 'briefing' }
  | { kind: 'track'; track: string }
  | { kind: 'set'; set: string }
  | { kind: 'hold'; until: Instant; reason: string }
  | { kind: 'annulled'; reason: string }
  | { kind: 'blue-signal-up' }
  | { kind: 'blue-signal-down' }
  | { kind: 'note'; note: string }
  | { kind: 'agreed'; target: string }
  | { kind: 'disagreed'; target: string; reason: string }
  | { kind: 'ruled'; target: string; considered: string[] }
  | { kind: 'correction-approved'; target: string }
  | { kind: 'correction-declined'; target: string; reason: string }
  | { kind: 'defect'; car: string | null; cause: DefectCause; note?: string | undefined }
  | {
      kind: 'tied-up';
      handbrakes: LeftHandbrakes;
      checks: TieUpCheck[];
      /** Whether the set was cut off from its source of compressed air. */
      offAir?: boolean | undefined;
      /** Why it is left although a step that secures it is not recorded. */
      reason?: string | undefined;
    };

/** One appended fact. Never edited; a later entry may withdraw or correct it. */
export type Entry = EntryFacts & EntryContent;
