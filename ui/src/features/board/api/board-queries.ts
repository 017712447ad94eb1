import type { WireBoard, WireStepPlan, WireTerminalSettings } from '@stubpost/shared';
import { queryOptions } from '@tanstack/react-query';
import { api } from '../../../lib/api-client';
import { queryKeys } from '../../../lib/query-keys';

/** All turns of a terminal on a service date; the live stream keeps them true. */
export const boardQuery = (terminal: string, serviceDate: string) =>
  queryOptions({
    queryKey: queryKeys.turns.board({ terminal, serviceDate }),
    queryFn: ({ signal }) => api.get<WireBoard>('/api/board', { signal, query: { terminal, serviceDate } }),
  });

/** One version of a step plan. It never changes. */
export const planQuery = (planId: string) =>
  queryOptions({
    queryKey: queryKeys.plans.detail(planId),
    queryFn: ({ signal }) => api.get<WireStepPlan>(`/api/plans/${encodeURIComponent(planId)}`, { signal }),
    staleTime: Infinity,
  });

/** What the terminal counts as late and silent. */
export const settingsQuery = (terminal: string) =>
  queryOptions({
    queryKey: queryKeys.terminals.settings(terminal),
    queryFn: ({ signal }) =>
      api.get<WireTerminalSettings>(`/api/terminals/${encodeURIComponent(terminal)}/settings`, { signal }),
    staleTime: 5 * 60_000,
  });
