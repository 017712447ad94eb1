import { MutationCache, QueryCache, QueryClient } from '@tanstack/react-query';
import { ApiError, isRefusal } from './api-client';
import { queryKeys } from './query-keys';

/** A refusal stays one; only a server that did not answer, or is busy, is asked again. */
function worthAskingAgain(failures: number, problem: unknown): boolean {
  if (failures >= 2) return false;
  return !(problem instanceof ApiError) || problem.status === 0 || problem.status >= 500;
}

/** The cache of everything the service told. Defaults are set here and nowhere else. */
export function createQueryClient(): QueryClient {
  const onError = (problem: unknown): void => {
    // A session that ended elsewhere: whoever looks at the page is asked to sign in, and comes back to it.
    if (isRefusal(problem, 'session.missing')) client.setQueryData(queryKeys.session.all, null);
  };
  const client: QueryClient = new QueryClient({
    queryCache: new QueryCache({ onError }),
    mutationCache: new MutationCache({ onError }),
    defaultOptions: {
      queries: {
        staleTime: 30_000,
        retry: worthAskingAgain,
        retryDelay: (attempt) => 1000 * 2 ** attempt,
        networkMode: 'offlineFirst',
      },
      mutations: { retry: false, networkMode: 'always' },
    },
  });
  return client;
}
