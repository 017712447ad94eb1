import type { UpdateDutyRosterRequest, WireDutyRoster } from '@stubpost/shared';
import { queryOptions, useMutation, useQueryClient } from '@tanstack/react-query';
import { api, isRefusal } from '../../../lib/api-client';
import { queryKeys } from '../../../lib/query-keys';

const at = (terminal: string): string => `/api/terminals/${encodeURIComponent(terminal)}/duty-roster`;

/** The duty roster of a terminal. */
export const rosterQuery = (terminal: string) =>
  queryOptions({
    queryKey: queryKeys.duty.roster(terminal),
    queryFn: ({ signal }) => api.get<WireDutyRoster>(at(terminal), { signal }),
  });

/** Replaces the roster; somebody else's faster change is shown, not overwritten. */
export function useChangeRoster(terminal: string) {
  const client = useQueryClient();
  const readAgain = () => client.invalidateQueries({ queryKey: queryKeys.duty.roster(terminal) });
  return useMutation({
    mutationFn: (request: UpdateDutyRosterRequest) => api.put<WireDutyRoster>(at(terminal), request),
    onSuccess: readAgain,
    onError: (problem) => (isRefusal(problem, 'roster.changed') ? readAgain() : undefined),
  });
}
