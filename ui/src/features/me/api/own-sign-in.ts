import type { ChangePasswordRequest, OwnSession } from '@stubpost/shared';
import { queryOptions, useMutation, useQueryClient } from '@tanstack/react-query';
import { api } from '../../../lib/api-client';
import { queryKeys } from '../../../lib/query-keys';

/** Where the person is signed in. */
export const ownSessionsQuery = queryOptions({
  queryKey: queryKeys.session.list,
  queryFn: ({ signal }) => api.get<OwnSession[]>('/api/session/list', { signal }),
});

/** Ends one of one's own sessions; that device is signed out within a minute. */
export function useEndOwnSession() {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (sessionId: string) => api.delete(`/api/session/list/${encodeURIComponent(sessionId)}`),
    onSettled: () => client.invalidateQueries({ queryKey: queryKeys.session.list }),
  });
}

/** Changes one's own password; all other sessions end with it. */
export function useChangePassword() {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (request: ChangePasswordRequest) => api.put('/api/session/password', request),
    onSuccess: () => client.invalidateQueries({ queryKey: queryKeys.session.list }),
  });
}
