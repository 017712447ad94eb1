import type { WireEntry, WireStepPlan, WireTerminalSettings, WireTurn } from '@stubpost/shared';
import { queryOptions } from '@tanstack/react-query';
import { api } from '../api-client';
import { queryKeys } from '../query-keys';

/** One turn; the live stream keeps it true. */
export const turnQuery = (turnId: string) =>
  queryOptions({
    queryKey: queryKeys.turns.detail(turnId),
    queryFn: ({ signal }) => api.get<WireTurn>(`/api/turns/${encodeURIComponent(turnId)}`, { signal }),
  });

/** The entries of a turn in sequence order. */
export const entriesQuery = (turnId: string) =>
  queryOptions({
    queryKey: queryKeys.turns.entries(turnId),
    queryFn: ({ signal }) =>
      api.get<WireEntry[]>(`/api/turns/${encodeURIComponent(turnId)}/entries`, { signal }),
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
