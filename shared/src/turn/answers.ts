import type { Instant } from '../lib/instant';
import type { Account } from './account';
import type { Entry, EntryAuthor } from './entry';
import { latestObserved, ofKind, type EntryOf } from './standing-entries';

/** What one person says to an entry of another. */
export interface Answer {
  entryId: string;
  target: string;
  agrees: boolean;
  at: Instant;
  by: EntryAuthor | null;
  /** Why the person does not agree; null when they do. */
  reason: string | null;
}

type AnswerEntry = EntryOf<'agreed'> | EntryOf<'disagreed'>;

/** The answers that stand: of each person to each entry the latest observed, never to an entry of their own. */
export function answersIn(standing: readonly Entry[]): Answer[] {
  const byId = new Map(standing.map((entry) => [entry.id, entry]));
  const groups = new Map<string, AnswerEntry[]>();
  for (const each of [...ofKind(standing, 'agreed'), ...ofKind(standing, 'disagreed')]) {
    const writer = each.by?.personId ?? '';
    if (each.by !== null && byId.get(each.target)?.by?.personId === writer) continue;
    const key = JSON.stringify([each.target, writer]);
    groups.set(key, [...(groups.get(key) ?? []), each]);
  }
  return [...groups.values()]
    .flatMap((said) => latestObserved(said) ?? [])
    .map(answerOf)
    .sort((a, b) => a.at - b.at || (a.entryId < b.entryId ? -1 : 1));
}

function answerOf(entry: AnswerEntry): Answer {
  return {
    entryId: entry.id,
    target: entry.target,
    agrees: entry.kind === 'agreed',
    at: entry.observedAt,
    by: entry.by,
    reason: entry.kind === 'disagreed' ? entry.reason : null,
  };
}

/** The objections to some accounts that no ruling made since has settled. */
export function openObjections(
  answers: readonly Answer[],
  accounts: readonly Account[],
  ruling: EntryOf<'ruled'> | null,
): Answer[] {
  return answers.filter(
    (answer) =>
      !answer.agrees &&
      accounts.some((account) => account.entryId === answer.target) &&
      (ruling === null || ruling.observedAt < answer.at),
  );
}
