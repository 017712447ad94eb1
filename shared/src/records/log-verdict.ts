import type { CalendarDate } from '../lib/instant';
import type { LineRefusal } from './log-line';

/** A place in the log that somebody keeps apart from it: the hash that the entry with this number must have. */
export interface LogHead {
  sequence: number;
  hash: string;
  /** The day that ended with it, where it was published as a daily head. */
  date?: CalendarDate | undefined;
}

/** Which part of an entry does not fit its seal. `envelope`: its id, time of receipt or hash, which one cannot be told. */
export const CHANGED_PARTS = [
  'body',
  'bodyHash',
  'hash',
  'previousHash',
  'sequence',
  'envelope',
  'several',
] as const;
export type ChangedPart = (typeof CHANGED_PARTS)[number];

/** An entry and where it stands in what was checked; lines count from 1. */
export interface EntryPlace {
  line: number;
  sequence: number;
  id: string;
}

/** One thing that is wrong with a log. `line` is where it shows. */
export type LogFault =
  | ({ kind: 'unreadable'; line: number } & LineRefusal)
  /** Says the same, but is not written as the log writes it: touched after it was exported. */
  | ({ kind: 'rewritten' } & EntryPlace)
  | ({ kind: 'changed'; part: ChangedPart } & EntryPlace)
  /** Whole in itself, but not the entry that the next one was chained to. */
  | ({ kind: 'resealed'; next: EntryPlace } & EntryPlace)
  | { kind: 'missing'; line: number; from: number; to: number }
  /** Stands after an entry with a greater number. */
  | ({ kind: 'moved' } & EntryPlace)
  /** A number that was there already; `isSame` when it is the same entry once more. */
  | ({ kind: 'repeated'; isSame: boolean } & EntryPlace)
  /** Does not begin where a log or a published day begins: no. 1 to `to` are neither there nor vouched for. */
  | { kind: 'beginning'; line: number; to: number }
  /** Chained to something else than what the published head, or the beginning of every log, says. */
  | ({ kind: 'wrong-start'; head: LogHead } & EntryPlace)
  | ({ kind: 'not-the-head'; head: LogHead } & EntryPlace)
  | { kind: 'cut'; line: number; lastSequence: number; head: LogHead }
  /** The last line does not end: the file stops in the middle. */
  | { kind: 'unended'; line: number };

/** What could not be checked, whole or not. */
export type LogNote =
  /** No published head was given: a cut tail and a log that was made anew from the start cannot be seen. */
  | { kind: 'no-head' }
  /** Entries after the newest given head: no head vouches for them yet. */
  | { kind: 'after-head'; from: number; to: number }
  /** Entries before the file begins; the head before it was met. */
  | { kind: 'before-start'; to: number }
  /** Bodies that are not in the file; the first numbers of them. */
  | { kind: 'without-body'; count: number; sequences: number[] };

/** What came of a check. */
export interface LogVerdict {
  isWhole: boolean;
  lines: number;
  /** Entries that could be read. */
  entries: number;
  first: { sequence: number; receivedAt: string } | null;
  last: { sequence: number; hash: string; receivedAt: string } | null;
  /** The newest given head that the log agrees with. */
  metHead: LogHead | null;
  metHeads: number;
  /** In the order of lines; the first is what to look at first. No more than `mostFaultsKept`. */
  faults: LogFault[];
  /** How many there are, also those that are not kept. */
  faultCount: number;
  notes: LogNote[];
}
