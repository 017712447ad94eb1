import type { DemoSessionRequest, SessionAnswer, SignedInPerson, SignInRequest } from '@stubpost/shared';
import { useMutation, useQueryClient } from '@tanstack/react-query';
import { api } from '../../../lib/api-client';
import { queryKeys } from '../../../lib/query-keys';

type SignIn = { with: 'password'; request: SignInRequest } | { with: 'demo'; request: DemoSessionRequest };

async function signIn({ with: way, request }: SignIn): Promise<SignedInPerson> {
  const path = way === 'demo' ? '/api/demo/session' : '/api/session';
  return (await api.post<SessionAnswer>(path, request)).person;
}

/** Signs in; the page then knows who is there and has forgotten what an earlier person was shown. */
export function useSignIn(onSignedIn: (person: SignedInPerson) => void) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: signIn,
    onSuccess: (person) => {
      client.removeQueries({ predicate: ({ queryKey }) => queryKey[0] !== queryKeys.session.all[0] });
      client.setQueryData(queryKeys.session.all, person);
      onSignedIn(person);
    },
  });
}
