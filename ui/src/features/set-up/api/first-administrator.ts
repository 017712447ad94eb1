import type { FirstAdministratorRequest, SessionAnswer, SignedInPerson } from '@stubpost/shared';
import { useMutation, useQueryClient } from '@tanstack/react-query';
import { api } from '../../../lib/api-client';
import { queryKeys } from '../../../lib/query-keys';

/** Makes the first administrator, who is then signed in. */
export function useMakeFirstAdministrator(onMade: (person: SignedInPerson) => void) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (request: FirstAdministratorRequest) => api.post<SessionAnswer>('/api/setup', request),
    onSuccess: ({ person }) => {
      client.setQueryData(queryKeys.setup.all, { needed: false });
      client.setQueryData(queryKeys.session.all, person);
      onMade(person);
    },
  });
}
