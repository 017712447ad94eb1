import { useMutation, useQueryClient } from '@tanstack/react-query';
import { useNavigate } from 'react-router-dom';
import { api, isRefusal } from '../lib/api-client';
import { queryKeys } from '../lib/query-keys';

async function endSession(): Promise<void> {
  try {
    await api.delete('/api/session');
  } catch (problem) {
    // Already over: that is what was wanted.
    if (!isRefusal(problem, 'session.missing')) throw problem;
  }
}

/** Ends the session, forgets everything the service told, and shows the sign-in page. */
export function useSignOut() {
  const client = useQueryClient();
  const navigate = useNavigate();
  return useMutation({
    mutationFn: endSession,
    onSuccess: async () => {
      await navigate('/sign-in');
      client.clear();
      client.setQueryData(queryKeys.session.all, null);
    },
  });
}
