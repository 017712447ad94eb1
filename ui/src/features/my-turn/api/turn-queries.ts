import {
  type CrewMember,
  formatInstant,
  type WireBoard,
  type WireEntry,
  type WireStepPlan,
  type WireTerminalSettings,
  type WireTurn,
} from '@stubpost/shared';
import { queryOptions, type QueryClient } from '@tanstack/react-query';
import { api } from '../../../lib/api-client';
import { keptMilliseconds } from '../../../lib/kept-answers';
import { queryKeys } from '../../../lib/query-keys';
import { readNow } from '../../../lib/use-now';
import { myWindow } from '../model/my-turns';

/** The stream follows one terminal; turns elsewhere, and everything while it is lost, are asked for this often. */
const askAgainMilliseconds = 15_000;

/** A turn as the newest board of this browser has it, and since when; for a turn that was never opened by itself. */
export function turnOnBoards(
  client: QueryClient,
  turnId: string,
): { initialData?: WireTurn; initialDataUpdatedAt?: number } {
  const boards = client.getQueryCache().findAll({ queryKey: queryKeys.turns.boards });
  const found = boards.flatMap(({ state }) => {
    const turn = (state.data as WireBoard | undefined)?.turns.find(({ id }) => id === turnId);
    return turn === undefined ? [] : [{ turn, at: state.dataUpdatedAt }];
  });
  const newest = found.sort((a, b) => b.at - a.at)[0];
  return newest === undefined ? {} : { initialData: newest.turn, initialDataUpdatedAt: newest.at };
}

/** One turn. */
export const turnQuery = (turnId: string) =>
  queryOptions({
    queryKey: queryKeys.turns.detail(turnId),
    queryFn: ({ signal }) => api.get<WireTurn>(`/api/turns/${encodeURIComponent(turnId)}`, { signal }),
    refetchInterval: askAgainMilliseconds,
    gcTime: keptMilliseconds,
  });

/** The entries of a turn in sequence order. */
export const entriesQuery = (turnId: string) =>
  queryOptions({
    queryKey: queryKeys.turns.entries(turnId),
    queryFn: ({ signal }) =>
      api.get<WireEntry[]>(`/api/turns/${encodeURIComponent(turnId)}/entries`, { signal }),
    gcTime: keptMilliseconds,
  });

/** One version of a step plan. It never changes, so it is asked for once. */
export const planQuery = (planId: string) =>
  queryOptions({
    queryKey: queryKeys.plans.detail(planId),
    queryFn: ({ signal }) => api.get<WireStepPlan>(`/api/plans/${encodeURIComponent(planId)}`, { signal }),
    staleTime: Infinity,
    gcTime: keptMilliseconds,
  });

/** What a terminal counts as late and silent. */
export const settingsQuery = (terminal: string) =>
  queryOptions({
    queryKey: queryKeys.terminals.settings(terminal),
    queryFn: ({ signal }) =>
      api.get<WireTerminalSettings>(`/api/terminals/${encodeURIComponent(terminal)}/settings`, { signal }),
    staleTime: 5 * 60_000,
    gcTime: keptMilliseconds,
  });

/**
 * Turns of one terminal round now, as `/my` needs them. One list whose window moves with the clock, so that the list kept
 * from before a tunnel is still the list inside it.
 */
export function myBoardQuery(terminal: string) {
  return queryOptions({
    queryKey: queryKeys.turns.board({ terminal, span: 'crew' }),
    queryFn: ({ signal }) => {
      const { from, to } = myWindow(readNow());
      const query = { terminal, from: formatInstant(from), to: formatInstant(to) };
      return api.get<WireBoard>('/api/board', { signal, query });
    },
    refetchInterval: askAgainMilliseconds,
    gcTime: keptMilliseconds,
  });
}

/** Names of the crews of a terminal: who may take a job over. */
export const crewQuery = (terminal: string) =>
  queryOptions({
    queryKey: queryKeys.crew.at(terminal),
    queryFn: ({ signal }) => api.get<CrewMember[]>('/api/crew', { signal, query: { terminal } }),
    staleTime: 5 * 60_000,
    gcTime: keptMilliseconds,
  });
