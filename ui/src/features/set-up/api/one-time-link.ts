import type { SessionAnswer, SignedInPerson, WireLink } from '@stubpost/shared';
import { queryOptions, useMutation, useQueryClient } from '@tanstack/react-query';
import { api } from '../../../lib/api-client';
import { queryKeys } from '../../../lib/query-keys';

const path = (token: string): string => `/api/links/${encodeURIComponent(token)}`;

/** Whom a one-time link is for. Looking at it does not use it up. */
export function linkQuery(token: string) {
  return queryOptions({
    queryKey: queryKeys.links.one(token),
    queryFn: ({ signal }) => api.get<WireLink>(path(token), { signal }),
    staleTime: Number.POSITIVE_INFINITY,
  });
}

/** Uses the link up: sets the password and signs in. */
export function useOneTimeLink(token: string, onSet: (person: SignedInPerson) => void) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (password: string) => api.post<SessionAnswer>(path(token), { password }),
    onSuccess: ({ person }) => {
      client.clear();
      client.setQueryData(queryKeys.session.all, person);
      onSet(person);
    },
  });
}
