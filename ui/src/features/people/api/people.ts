import type {
  CreatedPerson,
  CreatePersonRequest,
  OneTimeLink,
  UpdatePersonRequest,
  WirePerson,
} from '@stubpost/shared';
import { queryOptions, useMutation, useQueryClient } from '@tanstack/react-query';
import { api, isRefusal } from '../../../lib/api-client';
import { queryKeys } from '../../../lib/query-keys';

/** Everybody with a sign-in. */
export const peopleQuery = queryOptions({
  queryKey: queryKeys.people.all,
  queryFn: ({ signal }) => api.get<WirePerson[]>('/api/people', { signal }),
});

const at = (personId: string, what = ''): string => `/api/people/${encodeURIComponent(personId)}${what}`;

function useListAgain(): () => Promise<void> {
  const client = useQueryClient();
  return () => client.invalidateQueries({ queryKey: queryKeys.people.all });
}

/** Adds a person; without a password the answer carries the one-time link. */
export function useAddPerson() {
  const listAgain = useListAgain();
  return useMutation({
    mutationFn: (request: CreatePersonRequest) => api.post<CreatedPerson>('/api/people', request),
    onSuccess: listAgain,
  });
}

/** Changes name, roles, or whether the person may sign in. Somebody else's faster change is shown, not overwritten. */
export function useChangePerson(personId: string) {
  const listAgain = useListAgain();
  return useMutation({
    mutationFn: (request: UpdatePersonRequest) => api.put<WirePerson>(at(personId), request),
    onSuccess: listAgain,
    onError: (problem) => (isRefusal(problem, 'people.changed') ? listAgain() : undefined),
  });
}

/** Makes a new one-time link; earlier ones end. */
export function useMakeLink(personId: string) {
  return useMutation({ mutationFn: () => api.post<OneTimeLink>(at(personId, '/link')) });
}

/** Gives a new password; all sessions of the person end. */
export function useGivePassword(personId: string) {
  const listAgain = useListAgain();
  return useMutation({
    mutationFn: (password: string) => api.put(at(personId, '/password'), { password }),
    onSuccess: listAgain,
  });
}

/** Ends all sessions of a person: a lost phone, somebody who left. */
export function useEndSessions(personId: string) {
  const listAgain = useListAgain();
  return useMutation({
    mutationFn: () => api.delete(at(personId, '/sessions')),
    onSuccess: listAgain,
  });
}
