import type { CrewMember, WireSet } from '@stubpost/shared';
import { queryOptions } from '@tanstack/react-query';
import { api } from '../../../lib/api-client';
import { queryKeys } from '../../../lib/query-keys';

/** Names of the crews of a terminal, for picking. */
export const crewQuery = (terminal: string) =>
  queryOptions({
    queryKey: queryKeys.crew.at(terminal),
    queryFn: ({ signal }) => api.get<CrewMember[]>('/api/crew', { signal, query: { terminal } }),
    staleTime: 5 * 60_000,
  });

/** Equipment sets, for picking. */
export const setsQuery = queryOptions({
  queryKey: queryKeys.sets.all,
  queryFn: ({ signal }) => api.get<WireSet[]>('/api/sets', { signal }),
  staleTime: 5 * 60_000,
});
