import type { WireTurn } from '@stubpost/shared';
import type { QueryClient } from '@tanstack/react-query';
import { queryKeys } from '../../../lib/query-keys';
import { turnOnBoards } from './turn-queries';

/** What an entry is about, in the words of the list of entries: "Train 1742". Empty for a turn nothing is known of. */
export function aboutTurn(client: QueryClient, turnId: string): string {
  const turn =
    client.getQueryData<WireTurn>(queryKeys.turns.detail(turnId)) ?? turnOnBoards(client, turnId).initialData;
  const train = turn?.outbound?.train ?? turn?.inbound?.train;
  return train === undefined ? '' : `Train ${train}`;
}
