import type { AlertState, WireAlert } from '@stubpost/shared';
import { queryOptions } from '@tanstack/react-query';
import { api } from '../../../lib/api-client';
import { queryKeys } from '../../../lib/query-keys';

/** Alerts of a terminal in one state; those that stand have a question of their own in `lib/standing-alerts`. */
export const alertsQuery = (terminal: string, state: AlertState) =>
  queryOptions({
    queryKey: queryKeys.alerts.list({ terminal, state }),
    queryFn: ({ signal }) => api.get<WireAlert[]>('/api/alerts', { signal, query: { terminal, state } }),
  });
