import type { WireBoard } from '@stubpost/shared';
import { queryOptions } from '@tanstack/react-query';
import { api } from '../../../lib/api-client';
import { queryKeys } from '../../../lib/query-keys';

/** All turns of a terminal on a service date; the live stream keeps them true. */
export const boardQuery = (terminal: string, serviceDate: string) =>
  queryOptions({
    queryKey: queryKeys.turns.board({ terminal, serviceDate }),
    queryFn: ({ signal }) => api.get<WireBoard>('/api/board', { signal, query: { terminal, serviceDate } }),
  });
