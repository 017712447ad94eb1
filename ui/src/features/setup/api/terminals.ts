import type {
  CreateTerminalRequest,
  UpdateTerminalSettingsRequest,
  WireTerminal,
  WireTerminalSettings,
  WireTrack,
} from '@stubpost/shared';
import { queryOptions, useMutation, useQueryClient } from '@tanstack/react-query';
import { api, isRefusal } from '../../../lib/api-client';
import { queryKeys } from '../../../lib/query-keys';

const at = (code: string, what: string): string => `/api/terminals/${encodeURIComponent(code)}/${what}`;

/** Adds a terminal. */
export function useAddTerminal() {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (request: CreateTerminalRequest) => api.post<WireTerminal>('/api/terminals', request),
    onSuccess: () => client.invalidateQueries({ queryKey: queryKeys.terminals.all }),
  });
}

/** Replaces the tracks of a terminal, all at once. */
export function useReplaceTracks(code: string) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (tracks: WireTrack[]) => api.put<WireTerminal>(at(code, 'tracks'), tracks),
    onSuccess: () => client.invalidateQueries({ queryKey: queryKeys.terminals.all }),
  });
}

/** Thresholds of a terminal with their version. */
export const settingsQuery = (code: string) =>
  queryOptions({
    queryKey: queryKeys.terminals.settings(code),
    queryFn: ({ signal }) => api.get<WireTerminalSettings>(at(code, 'settings'), { signal }),
  });

/** Changes the thresholds. Somebody else's faster change is shown, not overwritten. */
export function useChangeSettings(code: string) {
  const client = useQueryClient();
  const again = (): Promise<void> =>
    client.invalidateQueries({ queryKey: queryKeys.terminals.settings(code) });
  return useMutation({
    mutationFn: (request: UpdateTerminalSettingsRequest) =>
      api.put<WireTerminalSettings>(at(code, 'settings'), request),
    onSuccess: again,
    onError: (problem) => (isRefusal(problem, 'settings.changed') ? again() : undefined),
  });
}
