import type { DepartureRow, Grouping, OnTimeAnswer } from '@stubpost/shared';
import { queryOptions } from '@tanstack/react-query';
import { api, type QueryValues } from '../../../lib/api-client';
import { queryKeys } from '../../../lib/query-keys';
import type { HistorySearch } from '../model/history-search';

const question = (terminal: string, { from, to, rule }: HistorySearch): QueryValues => ({
  terminal,
  from,
  to,
  ...rule,
});

/** On-time figures of a terminal, with groups where asked. */
export const onTimeQuery = (terminal: string, search: HistorySearch, groupBy: Grouping) =>
  queryOptions({
    queryKey: [...queryKeys.history.all, 'on-time', terminal, search, groupBy] as const,
    queryFn: ({ signal }) =>
      api.get<OnTimeAnswer>('/api/history/on-time', {
        signal,
        query: { ...question(terminal, search), groupBy },
      }),
  });

/** The departures behind the figures. */
export const departuresQuery = (terminal: string, search: HistorySearch) =>
  queryOptions({
    queryKey: [...queryKeys.history.all, 'departures', terminal, search] as const,
    queryFn: ({ signal }) =>
      api.get<DepartureRow[]>('/api/history/departures', { signal, query: question(terminal, search) }),
  });

/** Address of the same departures as a file. */
export function departuresFile(terminal: string, search: HistorySearch): string {
  const values = Object.entries(question(terminal, search)).map(([name, value]) => [name, String(value)]);
  return `/api/history/departures.csv?${new URLSearchParams(values).toString()}`;
}
