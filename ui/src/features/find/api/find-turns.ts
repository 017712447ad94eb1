import type { FoundTurn } from '@stubpost/shared';
import { queryOptions } from '@tanstack/react-query';
import { api } from '../../../lib/api-client';
import { queryKeys } from '../../../lib/query-keys';

/** Turns of a terminal that fit a text: train, set, car, person or track. Best first. */
export function findTurnsQuery(terminal: string, text: string) {
  const q = text.trim();
  return queryOptions({
    queryKey: queryKeys.find.at(terminal, q),
    queryFn: ({ signal }) => api.get<FoundTurn[]>('/api/find', { query: { terminal, q }, signal }),
    enabled: q !== '',
    staleTime: 10_000,
  });
}
