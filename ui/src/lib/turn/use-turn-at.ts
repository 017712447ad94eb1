import {
  latenessSettingsOf,
  shippedThresholds,
  type LatenessSettings,
  type WireBoard,
  type WireTurn,
} from '@stubpost/shared';
import { useQuery, useQueryClient, type QueryClient } from '@tanstack/react-query';
import { useMemo } from 'react';
import { queryKeys } from '../query-keys';
import { useNow } from '../use-now';
import { turnAt } from './turn-at';
import type { TurnNow } from './turn-now';
import { planQuery, settingsQuery, turnQuery } from './turn-queries';

/** What a terminal counts as late and silent; the shipped values until it has answered. */
export function useLatenessSettings(
  terminal: string | undefined,
  zone: string | undefined,
): LatenessSettings {
  const { data } = useQuery({ ...settingsQuery(terminal ?? ''), enabled: terminal !== undefined });
  const thresholds = data?.thresholds ?? shippedThresholds;
  return useMemo(() => latenessSettingsOf(thresholds, zone ?? 'UTC'), [thresholds, zone]);
}

export interface TurnAnswer {
  turn: TurnNow | undefined;
  isPending: boolean;
  error: Error | null;
  refetch: () => void;
}

/** A turn that some board has already brought, so that its panel and its forms stand at once. */
function turnOnBoards(client: QueryClient, turnId: string): WireTurn | undefined {
  const boards = client.getQueriesData<WireBoard>({ queryKey: queryKeys.turns.boards });
  return boards.flatMap(([, board]) => board?.turns ?? []).find((turn) => turn.id === turnId);
}

/** One turn as it stands this second; null asks for none. */
export function useTurnAt(turnId: string | null): TurnAnswer {
  const now = useNow();
  const client = useQueryClient();
  const found = useQuery({
    ...turnQuery(turnId ?? ''),
    enabled: turnId !== null,
    placeholderData: () => (turnId === null ? undefined : turnOnBoards(client, turnId)),
  });
  const wire = found.data;
  const { data } = useQuery({ ...planQuery(wire?.planId ?? ''), enabled: wire !== undefined });
  const settings = useLatenessSettings(wire?.terminal, wire?.zone);
  const turn = useMemo(
    () => (wire === undefined ? undefined : turnAt(wire, { plan: data, settings }, now)),
    [wire, data, settings, now],
  );
  const refetch = (): void => {
    if (turnId !== null) void found.refetch();
  };
  return { turn, isPending: found.isPending, error: found.error, refetch };
}
