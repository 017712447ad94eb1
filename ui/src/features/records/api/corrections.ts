import {
  formatInstant,
  type CorrectionsQuery,
  type EntryReceipt,
  type ListedCorrection,
  type RecordEntryRequest,
} from '@stubpost/shared';
import { queryOptions, useMutation, useQueryClient } from '@tanstack/react-query';
import { useEffect, useRef } from 'react';
import { v4 as uuid } from 'uuid';
import { api } from '../../../lib/api-client';
import { onLiveMessage } from '../../../lib/live';
import { patchTurn } from '../../../lib/live-patch';
import { queryKeys } from '../../../lib/query-keys';
import { readNow } from '../../../lib/use-now';

const pollMilliseconds = 15_000;

/** Changes of the record at a terminal that wait, or all that ever needed a decision. */
export const correctionsQuery = (question: CorrectionsQuery) =>
  queryOptions({
    queryKey: queryKeys.corrections.list(question),
    queryFn: ({ signal }) =>
      api.get<ListedCorrection[]>('/api/records/corrections', { signal, query: { ...question } }),
    refetchInterval: pollMilliseconds,
  });

/** Asks for the lists again when a turn that has corrections comes over the stream. */
export function useLiveCorrections(): void {
  const client = useQueryClient();
  useEffect(
    () =>
      onLiveMessage((message) => {
        const isAboutIt = message.kind === 'turn' && message.turn.corrections !== undefined;
        if (!isAboutIt && message.kind !== 'reload') return;
        void client.invalidateQueries({ queryKey: queryKeys.corrections.all });
      }),
    [client],
  );
}

/** A supervisor's word on one correction; the reason goes with a no. */
export type Decided = { isApproved: true } | { isApproved: false; reason: string };

/** Records a decision. Sent again after a failure it is the same entry: same id, same moment. */
export function useDecide(correction: ListedCorrection) {
  const client = useQueryClient();
  const prepared = useRef<{ key: string; request: RecordEntryRequest } | null>(null);
  return useMutation({
    mutationFn: (decided: Decided) => {
      const key = JSON.stringify(decided);
      if (prepared.current?.key !== key) {
        prepared.current = { key, request: requestOf(correction.entryId, decided) };
      }
      return api.post<EntryReceipt>(
        `/api/turns/${encodeURIComponent(correction.turnId)}/entries`,
        prepared.current.request,
      );
    },
    onSuccess: ({ turn }) => {
      patchTurn(client, turn, readNow());
      void client.invalidateQueries({ queryKey: queryKeys.turns.entries(turn.id) });
      return client.invalidateQueries({ queryKey: queryKeys.corrections.all });
    },
  });
}

function requestOf(target: string, decided: Decided): RecordEntryRequest {
  const base = { id: uuid(), observedAt: formatInstant(readNow()), source: 'by-hand', target } as const;
  return decided.isApproved
    ? { ...base, kind: 'correction-approved' }
    : { ...base, kind: 'correction-declined', reason: decided.reason };
}
