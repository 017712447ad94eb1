import type {
  CalendarDate,
  WireTimetable,
  WireTimetableDifference,
  WireTimetableHead,
} from '@stubpost/shared';
import { queryOptions } from '@tanstack/react-query';
import { api } from '../../../lib/api-client';
import { queryKeys } from '../../../lib/query-keys';

const whileReadingMilliseconds = 700;

/** Every imported timetable, the newest first; asked again while one is being read. */
export const timetablesQuery = queryOptions({
  queryKey: [...queryKeys.timetables.all, 'list'] as const,
  queryFn: ({ signal }) => api.get<WireTimetableHead[]>('/api/timetables', { signal }),
  refetchInterval: (query) =>
    query.state.data?.some((head) => head.state === 'reading') === true ? whileReadingMilliseconds : false,
});

/** One timetable with its problems and its summary; asked again while it is being read. */
export const timetableQuery = (id: string) =>
  queryOptions({
    queryKey: [...queryKeys.timetables.all, 'detail', id] as const,
    queryFn: ({ signal }) => api.get<WireTimetable>(`/api/timetables/${id}`, { signal }),
    refetchInterval: (query) => (query.state.data?.state === 'reading' ? whileReadingMilliseconds : false),
  });

/** What a timetable would change in the week that begins on a date. */
export const differenceQuery = (id: string, from: CalendarDate) =>
  queryOptions({
    queryKey: [...queryKeys.timetables.all, 'difference', id, from] as const,
    queryFn: ({ signal }) =>
      api.get<WireTimetableDifference>(`/api/timetables/${id}/difference`, { signal, query: { from } }),
  });
