import type { SetupAnswer, WireDemo, WireHealth } from '@stubpost/shared';
import { healthSchema } from '@stubpost/shared';
import { queryOptions } from '@tanstack/react-query';
import { api } from './api-client';
import { queryKeys } from './query-keys';

/** Whether this is a demo, and while it is still being filled, how far. */
export const demoQuery = queryOptions({
  queryKey: queryKeys.demo.all,
  queryFn: ({ signal }) => api.get<WireDemo>('/api/demo', { signal }),
  staleTime: 5 * 60_000,
  refetchInterval: (query) => (query.state.data?.state === 'filling' ? 5000 : false),
});

/** Version of the service and whether it is well. */
export const healthQuery = queryOptions({
  queryKey: queryKeys.health.all,
  queryFn: ({ signal }) => api.get<WireHealth>('/api/health', { signal }),
  staleTime: 5 * 60_000,
  retry: false,
});

/** Whether the alert sweep is silent, and since when. */
export interface SweepState {
  isSilent: boolean;
  lastSweepAt: string | null;
}

/**
 * The state of the alert sweep, asked for again and again. An unwell service says so with 503 and the same body, which
 * is why this one does not go through the client that takes every such answer for a failure.
 */
export const sweepQuery = queryOptions({
  queryKey: queryKeys.health.sweep,
  queryFn: async ({ signal }): Promise<SweepState> => {
    const answer = await fetch('/api/health', { signal, headers: { accept: 'application/json' } });
    const { lastSweepAt, problems = [] } = healthSchema.parse(await answer.json());
    return { lastSweepAt, isSilent: problems.some((problem) => problem.includes('sweep')) };
  },
  refetchInterval: 15_000,
  retry: false,
});

/** Whether this installation still waits for its first administrator. */
export const setupQuery = queryOptions({
  queryKey: queryKeys.setup.all,
  queryFn: ({ signal }) => api.get<SetupAnswer>('/api/setup', { signal }),
  staleTime: 60_000,
});
