import { ALL_TERMINALS, type WireTerminal } from '@stubpost/shared';
import { queryOptions, useQuery } from '@tanstack/react-query';
import { useSyncExternalStore } from 'react';
import { useMatch, useSearchParams } from 'react-router-dom';
import { api } from './api-client';
import { queryKeys } from './query-keys';
import { useTerminalsWhere } from './session';

/** Every terminal with its tracks. They change seldom; pages that change them invalidate the key. */
export const terminalsQuery = queryOptions({
  queryKey: queryKeys.terminals.all,
  queryFn: ({ signal }) => api.get<WireTerminal[]>('/api/terminals', { signal }),
  staleTime: 5 * 60_000,
});

const place = 'stubpost.terminal';
const listeners = new Set<() => void>();

function subscribe(listener: () => void): () => void {
  listeners.add(listener);
  return () => listeners.delete(listener);
}

/** Remembers a terminal as the one this browser works at. */
export function rememberTerminal(code: string): void {
  if (localStorage.getItem(place) === code) return;
  localStorage.setItem(place, code);
  for (const listener of listeners) listener();
}

export interface TerminalChoice {
  /** The terminal the page is about; null while loading and when there is none. */
  terminal: WireTerminal | null;
  /** Terminals that the person may look at, in the order of the service. */
  terminals: WireTerminal[];
  isPending: boolean;
  error: Error | null;
}

/**
 * The terminal the page is about: the one in the address (`/board/:terminal`, `?terminal=`), else the last one used
 * in this browser, else the first that the person may look at.
 */
export function useTerminalChoice(): TerminalChoice {
  const { data, isPending, error } = useQuery(terminalsQuery);
  const reach = useTerminalsWhere('board.read');
  const remembered = useSyncExternalStore(subscribe, () => localStorage.getItem(place));
  const inPath = useMatch('/board/:terminal')?.params.terminal;
  const inQuery = useSearchParams()[0].get('terminal');
  const terminals = (data ?? []).filter(({ code }) => reach.includes(ALL_TERMINALS) || reach.includes(code));
  const named = inPath ?? inQuery;
  const terminal =
    named === null || named === undefined
      ? (terminals.find(({ code }) => code === remembered) ?? terminals[0] ?? null)
      : (terminals.find(({ code }) => code === named) ?? null);
  return { terminal, terminals, isPending, error };
}
