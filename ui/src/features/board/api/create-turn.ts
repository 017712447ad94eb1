import type { CreateTurnRequest, WireTurn } from '@stubpost/shared';
import { useMutation, useQueryClient } from '@tanstack/react-query';
import { api } from '../../../lib/api-client';
import { queryKeys } from '../../../lib/query-keys';

/** Enters an extra turn; boards and, for a new track, the terminal are asked anew before it counts as done. */
export function useCreateTurn() {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (turn: CreateTurnRequest) => api.post<WireTurn>('/api/turns', turn),
    onSuccess: (turn) => {
      client.setQueryData(queryKeys.turns.detail(turn.id), turn);
      return Promise.all([
        client.invalidateQueries({ queryKey: queryKeys.turns.boards }),
        client.invalidateQueries({ queryKey: queryKeys.terminals.all }),
      ]);
    },
  });
}
