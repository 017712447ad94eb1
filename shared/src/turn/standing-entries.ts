import { compareIds } from './account';
import type { Entry, EntryKind } from './entry';
import { rootOf, withdrawnIds } from './withdrawals';

/** An entry of one kind. */
export type EntryOf<Kind extends EntryKind> = Extract<Entry, { kind: Kind }>;

/** What is left of a turn's entries when withdrawals and corrections have been carried out. */
export interface StandingEntries {
  /** Entries that stand, with corrected times and readings, by observed time and then by id. */
  entries: readonly Entry[];
  /** Ids of entries that were taken back. */
  withdrawn: ReadonlySet<string>;
  /** Ids of standing entries whose time or reading was corrected. */
  corrected: ReadonlySet<string>;
}

/** The order in which a turn's entries are kept: by observed time, then by id. Never by arrival. */
export function compareEntries(a: Entry, b: Entry): number {
  return a.observedAt - b.observedAt || compareIds(a.id, b.id);
}

/**
 * The entries of a list, each id once, in their kept order. Where one id came with two bodies (the service refuses
 * that) the one received first is kept, then the one whose text sorts first, so that the order of arrival still does
 * not matter.
 */
export function keepEntries(entries: readonly Entry[]): Entry[] {
  const byId = new Map<string, Entry>();
  for (const entry of entries) {
    const known = byId.get(entry.id);
    byId.set(entry.id, known === undefined ? entry : firstOf(known, entry));
  }
  return [...byId.values()].sort(compareEntries);
}

function firstOf(a: Entry, b: Entry): Entry {
  if (a === b) return a;
  const order = a.receivedAt - b.receivedAt || compareIds(JSON.stringify(a), JSON.stringify(b));
  return order <= 0 ? a : b;
}

/** Entries of one kind. */
export function ofKind<Kind extends EntryKind>(entries: readonly Entry[], kind: Kind): EntryOf<Kind>[] {
  return entries.filter((entry): entry is EntryOf<Kind> => entry.kind === kind);
}

/**
 * The latest observed of some entries; of several at the same time the one with the smallest id. Null when there is
 * none. The rule for what can be said anew: expected arrival, track, set, hold, crew.
 */
export function latestObserved<Some extends Entry>(entries: readonly Some[]): Some | null {
  return entries.reduce<Some | null>((latest, entry) => {
    if (latest === null || entry.observedAt > latest.observedAt) return entry;
    return entry.observedAt === latest.observedAt && entry.id < latest.id ? entry : latest;
  }, null);
}

/**
 * Carries out withdrawals and corrections, all but those that are `idle` (from `approvalsIn`). A withdrawal may
 * itself be withdrawn; then its target stands again. A correction of a correction is one more correction of the
 * entry at the root. Of several corrections the latest observed counts, for time and reading each. Entries that
 * name an unknown target change nothing.
 */
export function standingEntries(kept: readonly Entry[], idle: ReadonlySet<string>): StandingEntries {
  const withdrawals = ofKind(kept, 'withdrawn').filter((entry) => !idle.has(entry.id));
  const withdrawn = withdrawnIds(kept, withdrawals);
  const left = kept.filter((entry) => !withdrawn.has(entry.id));
  const byTarget = correctionsByTarget(left.filter((entry) => !idle.has(entry.id)));
  const corrected = new Set<string>();
  const entries = left.map((entry) => {
    const changed = correct(entry, byTarget.get(entry.id) ?? []);
    if (changed !== entry) corrected.add(entry.id);
    return changed;
  });
  return { entries: entries.sort(compareEntries), withdrawn, corrected };
}

/** The corrections among some entries, by the entry that each corrects in the end. */
export function correctionsByTarget(entries: readonly Entry[]): Map<string, EntryOf<'corrected'>[]> {
  const corrections = ofKind(entries, 'corrected');
  const targets = new Map(corrections.map((each) => [each.id, each.target]));
  const byTarget = new Map<string, EntryOf<'corrected'>[]>();
  for (const correction of corrections) {
    const root = rootOf(correction.target, targets);
    byTarget.set(root, [...(byTarget.get(root) ?? []), correction]);
  }
  return byTarget;
}

/** An entry with some corrections of it carried out; the very same when they change nothing. */
export function correct(entry: Entry, corrections: readonly EntryOf<'corrected'>[]): Entry {
  if (entry.kind === 'corrected') return entry;
  const time = latestObserved(corrections.filter((each) => each.correctedObservedAt !== undefined));
  const observedAt = time?.correctedObservedAt ?? entry.observedAt;
  if (entry.kind !== 'step-done') return time === null ? entry : { ...entry, observedAt };
  const read = latestObserved(corrections.filter((each) => each.reading !== undefined));
  if (time === null && read === null) return entry;
  return { ...entry, observedAt, reading: read?.reading ?? entry.reading };
}
