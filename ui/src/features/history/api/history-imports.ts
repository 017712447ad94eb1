import type { WireHistoryImport } from '@stubpost/shared';
import { queryOptions, useMutation, useQueryClient } from '@tanstack/react-query';
import { api } from '../../../lib/api-client';
import { queryKeys } from '../../../lib/query-keys';

const isReading = (imports: readonly WireHistoryImport[] | undefined): boolean =>
  imports?.some((each) => each.state === 'reading') ?? false;

/** The last loaded and refused tables; asked again each second while one is being read. */
export const historyImportsQuery = queryOptions({
  queryKey: [...queryKeys.history.all, 'imports'] as const,
  queryFn: ({ signal }) => api.get<WireHistoryImport[]>('/api/history/imports', { signal }),
  refetchInterval: (query) => (isReading(query.state.data) ? 1000 : false),
});

/** Sends a table of past departures and waits until it is loaded or refused. */
export function useLoadDepartures() {
  const client = useQueryClient();
  return useMutation({
    mutationFn: async (file: File) => {
      const form = new FormData();
      form.set('file', file);
      return api.upload<{ id: string }>('/api/history/departures', form);
    },
    onSuccess: () => client.invalidateQueries({ queryKey: queryKeys.history.all }),
  });
}
