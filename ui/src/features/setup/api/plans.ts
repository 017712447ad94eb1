import type { CreatePlanRequest, WireStepPlan } from '@stubpost/shared';
import { queryOptions, useMutation, useQueryClient } from '@tanstack/react-query';
import { api } from '../../../lib/api-client';
import { queryKeys } from '../../../lib/query-keys';

const at = (code: string): string => `/api/terminals/${encodeURIComponent(code)}/plans`;

/** All versions of the step plans of a terminal, newest first. */
export const plansQuery = (code: string) =>
  queryOptions({
    queryKey: [...queryKeys.plans.all, 'at', code] as const,
    queryFn: ({ signal }) => api.get<WireStepPlan[]>(at(code), { signal }),
  });

/** Makes a new version, in force from a service date on. Turns of those days may be measured anew. */
export function useAddVersion(code: string) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (request: CreatePlanRequest) => api.post<WireStepPlan>(at(code), request),
    onSuccess: () =>
      Promise.all([
        client.invalidateQueries({ queryKey: queryKeys.plans.all }),
        client.invalidateQueries({ queryKey: queryKeys.turns.all }),
      ]),
  });
}
