import type { SignedInPerson } from '@stubpost/shared';
import { useMutation, useQueryClient, type QueryClient } from '@tanstack/react-query';
import { useNavigate } from 'react-router-dom';
import { api, isRefusal } from '../lib/api-client';
import { forgetAnswers } from '../lib/kept-answers';
import { unlockPhone } from '../lib/lock/phone-lock';
import { forgetUnlockCheck } from '../lib/lock/unlock-check';
import { outboxOf, stopOutboxes } from '../lib/outbox/use-outbox';
import { queryKeys } from '../lib/query-keys';

async function endSession(): Promise<void> {
  try {
    await api.delete('/api/session');
  } catch (problem) {
    // Already over: that is what was wanted.
    if (!isRefusal(problem, 'session.missing')) throw problem;
  }
}

/** How long signing out waits for entries that are under way. They are kept in any case. Our choice. */
const patienceMilliseconds = 3000;

async function sendWhatWaits(client: QueryClient, person: SignedInPerson): Promise<void> {
  const outbox = outboxOf(client, person.id);
  if (outbox.getState().waiting.length === 0) return;
  await Promise.race([outbox.poke(), new Promise((resolve) => setTimeout(resolve, patienceMilliseconds))]);
}

/**
 * Sends what waits as far as that is quick, ends the session, forgets everything the service told, and shows the sign-in
 * page. Entries without a receipt stay on the phone for the next time their writer signs in.
 */
export function useSignOut() {
  const client = useQueryClient();
  const navigate = useNavigate();
  return useMutation({
    mutationFn: async () => {
      const person = client.getQueryData<SignedInPerson | null>(queryKeys.session.all) ?? null;
      if (person !== null) await sendWhatWaits(client, person);
      await endSession();
      if (person !== null) forgetUnlockCheck(person.id);
      await forgetAnswers();
      unlockPhone();
    },
    onSuccess: async () => {
      await navigate('/sign-in');
      client.clear();
      client.setQueryData(queryKeys.session.all, null);
      stopOutboxes(client);
    },
  });
}
