import type { WireDailyHead, WireLogState } from '@stubpost/shared';
import { queryOptions, useMutation, useQueryClient } from '@tanstack/react-query';
import { api } from '../../../lib/api-client';
import { queryKeys } from '../../../lib/query-keys';
import type { LogDays } from '../model/log-days';

const calmMilliseconds = 30_000;
const busyMilliseconds = 1000;

/** How the chain stands in the server's own log; asked every second while a check runs there. */
export const logStateQuery = queryOptions({
  queryKey: queryKeys.log.state,
  queryFn: ({ signal }) => api.get<WireLogState>('/api/records/state', { signal }),
  refetchInterval: (query) => {
    const chain = query.state.data?.chain;
    return chain !== undefined && chain.runningTo !== null ? busyMilliseconds : calmMilliseconds;
  },
});

/** The daily heads, oldest first; the last may be of the day that is running. */
export const dailyHeadsQuery = queryOptions({
  queryKey: queryKeys.log.heads,
  queryFn: ({ signal }) => api.get<WireDailyHead[]>('/api/records/heads', { signal }),
  refetchInterval: calmMilliseconds,
});

/** Has the server check its log from no. 1 again. */
export function useCheckAgain() {
  const client = useQueryClient();
  return useMutation({
    mutationFn: () => api.get<WireLogState>('/api/records/state', { query: { again: true } }),
    onSuccess: (state) => client.setQueryData(logStateQuery.queryKey, state),
  });
}

/** Address of the log of some days of receipt, as a file. */
export const logFile = ({ from, to }: LogDays): string =>
  `/api/records/log?${new URLSearchParams({ from, to }).toString()}`;

/** Address of all heads up to a day: the one before the first day is needed as well. */
export const headsFile = ({ to }: LogDays): string =>
  `/api/records/heads?${new URLSearchParams({ to }).toString()}`;

/** Address of the checker. */
export const checkerFile = '/api/records/checker';
