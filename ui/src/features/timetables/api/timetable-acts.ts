import type { ActivationRequest, UploadReceipt, WireTimetable } from '@stubpost/shared';
import { useMutation, useQueryClient } from '@tanstack/react-query';
import { api } from '../../../lib/api-client';
import { queryKeys } from '../../../lib/query-keys';

/** A zip to bring in, and for which route types. */
export interface BringIn {
  file: File;
  routeTypes: string;
}

/** Sends a zip; the service reads it in the background. */
export function useBringIn() {
  const client = useQueryClient();
  return useMutation({
    mutationFn: ({ file, routeTypes }: BringIn) => {
      const form = new FormData();
      if (routeTypes.trim() !== '') form.set('routeTypes', routeTypes.trim());
      form.set('file', file);
      return api.upload<UploadReceipt>('/api/timetables', form);
    },
    onSuccess: () => client.invalidateQueries({ queryKey: queryKeys.timetables.all }),
  });
}

/** A running timetable changes terminals, tracks and every board. */
function useEverythingAnew() {
  const client = useQueryClient();
  return () =>
    Promise.all([
      client.invalidateQueries({ queryKey: queryKeys.timetables.all }),
      client.invalidateQueries({ queryKey: queryKeys.terminals.all }),
      client.invalidateQueries({ queryKey: queryKeys.turns.all }),
    ]);
}

/** Makes a timetable the running one from a date on. */
export function useActivate(id: string) {
  const anew = useEverythingAnew();
  return useMutation({
    mutationFn: (request: ActivationRequest) =>
      api.post<WireTimetable>(`/api/timetables/${id}/activation`, request),
    onSuccess: anew,
  });
}

/** Takes the newest activation back; gives the timetable that runs again. */
export function useRollBack(id: string) {
  const anew = useEverythingAnew();
  return useMutation({
    mutationFn: () => api.post<WireTimetable>(`/api/timetables/${id}/roll-back`),
    onSuccess: anew,
  });
}
