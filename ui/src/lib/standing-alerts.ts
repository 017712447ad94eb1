import type { WireAlert } from '@stubpost/shared';
import { queryOptions } from '@tanstack/react-query';
import { api } from './api-client';
import { queryKeys } from './query-keys';

/** Alerts that stand at a terminal: raised, taken or set aside. The live stream keeps the list true. */
export function standingAlertsQuery(terminal: string) {
  return queryOptions({
    queryKey: queryKeys.alerts.list({ terminal }),
    queryFn: ({ signal }) => api.get<WireAlert[]>('/api/alerts', { query: { terminal }, signal }),
  });
}
