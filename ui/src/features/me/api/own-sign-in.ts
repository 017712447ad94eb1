import type { ChangePasswordRequest, ChangePinRequest, OwnBadge, OwnSession } from '@stubpost/shared';
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

/** One's own badge, and whether there is a PIN. */
export const ownBadgeQuery = queryOptions({
  queryKey: queryKeys.session.badge,
  queryFn: ({ signal }) => api.get<OwnBadge>('/api/session/pin', { signal }),
});

/** Sets or takes away one's own PIN. */
export function useChangePin() {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (request: ChangePinRequest) => api.put('/api/session/pin', request),
    onSuccess: () => client.invalidateQueries({ queryKey: queryKeys.session.badge }),
  });
}
