import type { CloseAlertRequest, SetAsideRequest, WireAlert } from '@stubpost/shared';
import { useMutation, useQueryClient, type QueryClient } from '@tanstack/react-query';
import { api } from '../../../lib/api-client';
import { queryKeys } from '../../../lib/query-keys';

const address = (alertId: string, act: string): string => `/api/alerts/${encodeURIComponent(alertId)}/${act}`;

/** Lists and the turn of the alert are asked anew, also after a refusal: somebody else may have been faster. */
function refresh(client: QueryClient, turnId: string | null): Promise<unknown> {
  return Promise.all([
    client.invalidateQueries({ queryKey: queryKeys.alerts.lists }),
    client.invalidateQueries({ queryKey: queryKeys.turns.boards }),
    ...(turnId === null ? [] : [client.invalidateQueries({ queryKey: queryKeys.turns.detail(turnId) })]),
  ]);
}

/** Takes an alert: the others see who has it. */
export function useTakeAlert() {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (alert: WireAlert) => api.post<WireAlert>(address(alert.id, 'taking')),
    onSettled: (_answer, _problem, alert) => refresh(client, alert.turnId),
  });
}

/** Sets an alert aside until a time, with a reason. It comes back by itself. */
export function useSetAlertAside() {
  const client = useQueryClient();
  return useMutation({
    mutationFn: ({ alert, ...request }: SetAsideRequest & { alert: WireAlert }) =>
      api.post<WireAlert>(address(alert.id, 'setting-aside'), request),
    onSettled: (_answer, _problem, { alert }) => refresh(client, alert.turnId),
  });
}

/** Closes a cleared alert by naming its cause. */
export function useCloseAlert() {
  const client = useQueryClient();
  return useMutation({
    mutationFn: ({ alert, ...request }: CloseAlertRequest & { alert: WireAlert }) =>
      api.post<WireAlert>(address(alert.id, 'closing'), request),
    onSettled: (_answer, _problem, { alert }) => refresh(client, alert.turnId),
  });
}
