import type { EntryReceipt, RecordEntryRequest } from '@stubpost/shared';
import { useMutation, useQueryClient } from '@tanstack/react-query';
import { ApiError, api } from '../../../lib/api-client';
import { patchTurn } from '../../../lib/live-patch';
import { queryKeys } from '../../../lib/query-keys';
import { readNow } from '../../../lib/use-now';

/** An entry on its way: the turn it is about, and the request with the id that was made with it. */
export interface EntryToRecord {
  turnId: string;
  request: RecordEntryRequest;
}

const mostTries = 2;

/** A server that did not answer, or could not, is asked again: the same id twice is one entry. */
function worthSendingAgain(failures: number, problem: Error): boolean {
  if (failures >= mostTries) return false;
  return problem instanceof ApiError && (problem.status === 0 || problem.status >= 500);
}

/**
 * Records one entry. Every try carries the same id, so that an answer lost on the way does not make a second record.
 * The receipt's turn is put wherever the cache shows it.
 */
export function useRecordEntry() {
  const client = useQueryClient();
  return useMutation({
    mutationFn: ({ turnId, request }: EntryToRecord) =>
      api.post<EntryReceipt>(`/api/turns/${encodeURIComponent(turnId)}/entries`, request),
    retry: worthSendingAgain,
    retryDelay: (attempt) => 500 * 2 ** attempt,
    onSuccess: ({ turn }) => {
      client.setQueryData(queryKeys.turns.detail(turn.id), turn);
      patchTurn(client, turn, readNow());
      return client.invalidateQueries({ queryKey: queryKeys.turns.entries(turn.id) });
    },
  });
}
