import type { WireTaking } from '@stubpost/shared';
import { queryOptions, useMutation } from '@tanstack/react-query';
import { api } from '../../../lib/api-client';
import { queryKeys } from '../../../lib/query-keys';

const at = (token: string): string => `/api/takings/${encodeURIComponent(token)}`;

/** What the link in a message is about. Asked once: after the button is pressed the link has had its use. */
export const takingQuery = (token: string) =>
  queryOptions({
    queryKey: queryKeys.takings.one(token),
    queryFn: ({ signal }) => api.get<WireTaking>(at(token), { signal }),
    staleTime: Infinity,
    refetchOnWindowFocus: false,
  });

/** Takes the alert as the person the link was sent to. */
export function useTake(token: string) {
  return useMutation({ mutationFn: () => api.post<WireTaking>(at(token)) });
}
