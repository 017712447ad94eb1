import {
  formatInstant,
  type WireBoard,
  type WireEntry,
  type WireStepPlan,
  type WireTerminalSettings,
  type WireTurn,
} from '@stubpost/shared';
import { keepPreviousData, queryOptions } from '@tanstack/react-query';
import { api } from '../../../lib/api-client';
import { queryKeys } from '../../../lib/query-keys';
import { myWindow } from '../model/my-turns';

/** The stream follows one terminal; turns elsewhere, and everything while it is lost, are asked for this often. */
const askAgainMilliseconds = 15_000;

/** One turn. */
export const turnQuery = (turnId: string) =>
  queryOptions({
    queryKey: queryKeys.turns.detail(turnId),
    queryFn: ({ signal }) => api.get<WireTurn>(`/api/turns/${encodeURIComponent(turnId)}`, { signal }),
    refetchInterval: askAgainMilliseconds,
  });

/** The entries of a turn in sequence order. */
export const entriesQuery = (turnId: string) =>
  queryOptions({
    queryKey: queryKeys.turns.entries(turnId),
    queryFn: ({ signal }) =>
      api.get<WireEntry[]>(`/api/turns/${encodeURIComponent(turnId)}/entries`, { signal }),
  });

/** One version of a step plan. It never changes, so it is asked for once. */
export const planQuery = (planId: string) =>
  queryOptions({
    queryKey: queryKeys.plans.detail(planId),
    queryFn: ({ signal }) => api.get<WireStepPlan>(`/api/plans/${encodeURIComponent(planId)}`, { signal }),
    staleTime: Infinity,
  });

/** What a terminal counts as late and silent. */
export const settingsQuery = (terminal: string) =>
  queryOptions({
    queryKey: queryKeys.terminals.settings(terminal),
    queryFn: ({ signal }) =>
      api.get<WireTerminalSettings>(`/api/terminals/${encodeURIComponent(terminal)}/settings`, { signal }),
    staleTime: 5 * 60_000,
  });

/** Turns of one terminal round now, as `/my` needs them. The window moves in round ten minutes. */
export function myBoardQuery(terminal: string, now: number) {
  const window = myWindow(now);
  const question = { terminal, from: formatInstant(window.from), to: formatInstant(window.to) };
  return queryOptions({
    queryKey: queryKeys.turns.board(question),
    queryFn: ({ signal }) => api.get<WireBoard>('/api/board', { signal, query: question }),
    refetchInterval: askAgainMilliseconds,
    placeholderData: keepPreviousData,
  });
}
