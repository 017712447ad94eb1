import type { Instant } from '@stubpost/shared';
import { useQueries } from '@tanstack/react-query';
import type { SentEntry } from '../../../lib/outbox/outbox-entry';
import { sentShown } from '../model/outbox-lines';
import { seenByDeskAt } from '../model/sent-state';
import { entriesQuery, turnQuery } from './turn-queries';

/** How often a page that only looks back asks again. */
const askAgainMilliseconds = 60_000;

/** Answers for each turn of the entries shown when the desk last had it before it, as far as its own acts tell. */
export function useSeenByDesk(sent: readonly SentEntry[]): (turnId: string) => Instant | null {
  const turnIds = [...new Set(sent.slice(0, sentShown).map(({ turn }) => turn))];
  const lessOften = { refetchInterval: askAgainMilliseconds };
  const turns = useQueries({ queries: turnIds.map((id) => ({ ...turnQuery(id), ...lessOften })) });
  const entries = useQueries({ queries: turnIds.map((id) => ({ ...entriesQuery(id), ...lessOften })) });
  return (turnId) => {
    const at = turnIds.indexOf(turnId);
    const turn = turns[at]?.data;
    return turn === undefined ? null : seenByDeskAt(turn, entries[at]?.data ?? []);
  };
}
