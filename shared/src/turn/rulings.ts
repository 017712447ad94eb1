import { compareAccounts, inQuestionSeconds, isInQuestion, type Account } from './account';
import { latestObserved, type EntryOf } from './standing-entries';

/** The accounts of one thing, weighed. */
export interface Weighed {
  /** The one that counts first, the others by rank. */
  accounts: Account[];
  /** The ruling by which the first counts; null without one. */
  ruling: EntryOf<'ruled'> | null;
  /** Whether two accounts lie more than 60 s apart and nobody has ruled on them. */
  timesDiffer: boolean;
}

/**
 * Weighs the accounts of one thing. Without a ruling rank decides. With one (of several the latest observed whose
 * target is among the accounts) its target counts, and only an account that the ruling did not consider can raise
 * the question again, when it lies more than 60 s from the one that counts.
 */
export function weighAccounts(accounts: readonly Account[], rulings: readonly EntryOf<'ruled'>[]): Weighed {
  const ranked = [...accounts].sort(compareAccounts);
  const ids = new Set(ranked.map((account) => account.entryId));
  const ruling = latestObserved(rulings.filter((each) => ids.has(each.target)));
  const chosen = ranked.find((account) => account.entryId === ruling?.target);
  if (ruling === null || chosen === undefined) {
    return { accounts: ranked, ruling: null, timesDiffer: isInQuestion(ranked) };
  }
  const others = ranked.filter((account) => account !== chosen);
  const timesDiffer = others.some(
    (account) =>
      !ruling.considered.includes(account.entryId) &&
      Math.abs(account.at - chosen.at) > inQuestionSeconds * 1000,
  );
  return { accounts: [chosen, ...others], ruling, timesDiffer };
}
