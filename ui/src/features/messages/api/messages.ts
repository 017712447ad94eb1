import type { WireMessageBoxes } from '@stubpost/shared';
import { queryOptions } from '@tanstack/react-query';
import { api } from '../../../lib/api-client';
import { queryKeys } from '../../../lib/query-keys';

/** Outgoing messages of late and the local boxes; looked at anew while the page is open. */
export const messagesQuery = queryOptions({
  queryKey: queryKeys.messages.all,
  queryFn: ({ signal }) => api.get<WireMessageBoxes>('/api/messages', { signal }),
  refetchInterval: 10_000,
});
