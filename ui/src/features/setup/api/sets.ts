import type { PutSetRequest, WireSet } from '@stubpost/shared';
import { queryOptions, useMutation, useQueryClient } from '@tanstack/react-query';
import { api } from '../../../lib/api-client';
import { queryKeys } from '../../../lib/query-keys';

/** Every equipment set with its units. */
export const setsQuery = queryOptions({
  queryKey: queryKeys.sets.all,
  queryFn: ({ signal }) => api.get<WireSet[]>('/api/sets', { signal }),
});

/** Says what a set is made of. The cars of its turns change with it. */
export function usePutSet() {
  const client = useQueryClient();
  return useMutation({
    mutationFn: ({ label, request }: { label: string; request: PutSetRequest }) =>
      api.put<WireSet>(`/api/sets/${encodeURIComponent(label)}`, request),
    onSettled: () =>
      Promise.all([
        client.invalidateQueries({ queryKey: queryKeys.sets.all }),
        client.invalidateQueries({ queryKey: queryKeys.turns.all }),
      ]),
  });
}
