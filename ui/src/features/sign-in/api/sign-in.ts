import type { DemoSessionRequest, SessionAnswer, SignedInPerson, SignInRequest } from '@stubpost/shared';
import { useMutation, useQueryClient } from '@tanstack/react-query';
import { api } from '../../../lib/api-client';
import { homeOf } from '../../../lib/home';
import { unlockPhone } from '../../../lib/lock/phone-lock';
import { forgetOtherUnlockChecks, keepUnlockCheck } from '../../../lib/lock/unlock-check';
import { queryKeys } from '../../../lib/query-keys';

type SignIn = { with: 'password'; request: SignInRequest } | { with: 'demo'; request: DemoSessionRequest };

async function signIn({ with: way, request }: SignIn): Promise<SignedInPerson> {
  const path = way === 'demo' ? '/api/demo/session' : '/api/session';
  return (await api.post<SessionAnswer>(path, request)).person;
}

/** On a crew's phone the secret just typed also opens the phone again after a pause, with or without a signal. */
async function keepLock(person: SignedInPerson, how: SignIn): Promise<void> {
  forgetOtherUnlockChecks(person.id);
  unlockPhone();
  if (how.with === 'demo' || homeOf(person) !== '/my') return;
  const { request } = how;
  if ('pin' in request) await keepUnlockCheck(person.id, 'pin', request.pin);
  else await keepUnlockCheck(person.id, 'password', request.password);
}

/** Signs in; the page then knows who is there and has forgotten what an earlier person was shown. */
export function useSignIn(onSignedIn: (person: SignedInPerson) => void) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: signIn,
    onSuccess: (person, how) => {
      void keepLock(person, how).catch(() => undefined);
      client.removeQueries({ predicate: ({ queryKey }) => queryKey[0] !== queryKeys.session.all[0] });
      client.setQueryData(queryKeys.session.all, person);
      onSignedIn(person);
    },
  });
}
