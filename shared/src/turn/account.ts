import type { Instant } from '../lib/instant';
import { ENTRY_SOURCES, type Entry, type EntryAuthor, type EntrySource, type Reading } from './entry';

/** One person's or feed's account that something happened, with corrections already put in. */
export interface Account {
  entryId: string;
  /** When it happened by this account. */
  at: Instant;
  source: EntrySource;
  by: EntryAuthor | null;
  saidBy: string | null;
  reading: Reading | null;
  /** Whether a later entry corrected its time or its reading. */
  corrected: boolean;
}

/** Two accounts further apart than this many seconds are in question until a person rules. Not at exactly 60. */
export const inQuestionSeconds = 60;

/**
 * Which of two accounts counts: the better source (by hand, by feed, by radio, entered later), within a source the
 * earlier time, then the smaller id. Negative when `a` counts. The time of receipt plays no part.
 */
export function compareAccounts(a: Account, b: Account): number {
  const rank = ENTRY_SOURCES.indexOf(a.source) - ENTRY_SOURCES.indexOf(b.source);
  return rank || compareTimes(a, b);
}

/** Earlier first, then the smaller id. */
export function compareTimes(a: Account, b: Account): number {
  return a.at - b.at || compareIds(a.entryId, b.entryId);
}

/** Order of ids by their characters' codes, the same on every machine. */
export function compareIds(a: string, b: string): number {
  return a < b ? -1 : Number(a > b);
}

/** Whether any two accounts lie further apart than 60 s. */
export function isInQuestion(accounts: readonly Account[]): boolean {
  if (accounts.length < 2) return false;
  const times = accounts.map((account) => account.at);
  return Math.max(...times) - Math.min(...times) > inQuestionSeconds * 1000;
}

/** The account an entry gives. */
export function accountOf(entry: Entry, corrected: boolean): Account {
  return {
    entryId: entry.id,
    at: entry.observedAt,
    source: entry.source,
    by: entry.by,
    saidBy: entry.saidBy ?? null,
    reading: entry.kind === 'step-done' ? (entry.reading ?? null) : null,
    corrected,
  };
}
