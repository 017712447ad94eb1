import { useQueryClient, type QueryClient } from '@tanstack/react-query';
import { useEffect, useSyncExternalStore } from 'react';
import { patchTurn } from '../../../lib/live-patch';
import { queryKeys } from '../../../lib/query-keys';
import { usePerson } from '../../../lib/session';
import { readNow } from '../../../lib/use-now';
import { createEntryQueue, type EntryQueue, type QueueState } from '../model/entry-queue';
import { sendEntry } from './send-entry';

/** One queue a person and page, whatever screens come and go; nobody sees or loses another person's entries. */
const queues = new WeakMap<QueryClient, Map<string, EntryQueue>>();

function queueOf(client: QueryClient, personId: string): EntryQueue {
  const ofClient = queues.get(client) ?? new Map<string, EntryQueue>();
  queues.set(client, ofClient);
  const known = ofClient.get(personId);
  if (known !== undefined) return known;
  const made = createEntryQueue({
    storage: sessionStorage,
    storageKey: `stubpost.unsent.${personId}`,
    send: sendEntry,
    onReceived: (turnId, { turn }) => {
      patchTurn(client, turn, readNow());
      void client.invalidateQueries({ queryKey: queryKeys.turns.entries(turnId) });
    },
    now: readNow,
    later: (work, milliseconds) => {
      const timer = setTimeout(work, milliseconds);
      return () => clearTimeout(timer);
    },
  });
  ofClient.set(personId, made);
  return made;
}

/** Entries made on this phone by the person signed in, and how they stand. Tries at once when the network or the page comes back. */
export function useEntryQueue(): EntryQueue & { state: QueueState } {
  const client = useQueryClient();
  const queue = queueOf(client, usePerson().id);
  const state = useSyncExternalStore(queue.subscribe, queue.getState);
  const isWaiting = state.waiting.some((entry) => entry.refusal === null);

  useEffect(() => {
    const onVisible = (): void => {
      if (document.visibilityState === 'visible') queue.poke();
    };
    window.addEventListener('online', queue.poke);
    document.addEventListener('visibilitychange', onVisible);
    return () => {
      window.removeEventListener('online', queue.poke);
      document.removeEventListener('visibilitychange', onVisible);
    };
  }, [queue]);

  useEffect(() => {
    if (!isWaiting) return undefined;
    // Until entries are kept on the phone beyond this page, closing it would lose them: the browser asks first.
    const hold = (event: BeforeUnloadEvent): void => event.preventDefault();
    window.addEventListener('beforeunload', hold);
    return () => window.removeEventListener('beforeunload', hold);
  }, [isWaiting]);

  return { ...queue, state };
}
