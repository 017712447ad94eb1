import type { SessionAnswer, WireEntry } from '@stubpost/shared';
import { useQueryClient, type QueryClient } from '@tanstack/react-query';
import { useEffect, useSyncExternalStore } from 'react';
import { api, isRefusal } from '../api-client';
import { patchTurn } from '../live-patch';
import { queryKeys } from '../query-keys';
import { usePerson } from '../session';
import { clockOffsetMilliseconds, isClockCompared, readDeviceClock, readNow } from '../use-now';
import { createOutbox, type Outbox, type OutboxState, type WhoIsThere } from './outbox';
import { createOutboxStore } from './outbox-store';
import { createTallyBook } from './outbox-tally';
import { senderLock } from './sender-lock';
import { sendEntry } from './send-entry';

/** Longest wait for the questions round sending. Our choice. */
const patienceMilliseconds = 10_000;
/** Who is signed in is asked anew this long after the last answer; the service checks each entry besides. */
const knownMilliseconds = 60_000;
/** How often the outbox is looked at while the page is in sight. */
const lookMilliseconds = 15_000;

function whoIsThereFor(personId: string): () => Promise<WhoIsThere> {
  let seenAt: number | null = null;
  return async () => {
    const isFresh = seenAt !== null && Math.abs(readDeviceClock() - seenAt) < knownMilliseconds;
    if (isFresh && isClockCompared()) return 'same';
    seenAt = null;
    try {
      const signal = AbortSignal.timeout(patienceMilliseconds);
      const { person } = await api.get<SessionAnswer>('/api/session', { signal });
      if (person.id !== personId) return 'other';
      seenAt = readDeviceClock();
      return 'same';
    } catch (problem) {
      return isRefusal(problem, 'session.missing') ? 'other' : 'unreachable';
    }
  };
}

async function entryIdsOf(turnId: string): Promise<ReadonlySet<string> | null> {
  try {
    const path = `/api/turns/${encodeURIComponent(turnId)}/entries`;
    const signal = AbortSignal.timeout(patienceMilliseconds);
    return new Set((await api.get<WireEntry[]>(path, { signal })).map(({ id }) => id));
  } catch {
    return null;
  }
}

interface HeldOutbox {
  outbox: Outbox;
  channel: BroadcastChannel | null;
}

/** One outbox a person and page, whatever screens come and go; nobody sees or loses another person's entries. */
const outboxes = new WeakMap<QueryClient, Map<string, HeldOutbox>>();

/** The outbox of a person, made with the first question. */
export function outboxOf(client: QueryClient, personId: string): Outbox {
  const ofClient = outboxes.get(client) ?? new Map<string, HeldOutbox>();
  outboxes.set(client, ofClient);
  const known = ofClient.get(personId);
  if (known !== undefined) return known.outbox;
  const channel = 'BroadcastChannel' in globalThis ? new BroadcastChannel('stubpost.outbox') : null;
  const made = createOutbox({
    personId,
    store: createOutboxStore(),
    tally: createTallyBook(localStorage),
    send: sendEntry,
    whoIsThere: whoIsThereFor(personId),
    entryIdsOf,
    onReceived: (turnId, { turn }) => {
      patchTurn(client, turn, readNow());
      void client.invalidateQueries({ queryKey: queryKeys.turns.entries(turnId) });
    },
    // Asks who is signed in; the guard before the pages does the rest.
    onSignedOut: () => void client.invalidateQueries({ queryKey: queryKeys.session.all }),
    now: readNow,
    deviceNow: readDeviceClock,
    comparedClockOffset: () => (isClockCompared() ? -Math.round(clockOffsetMilliseconds()) : null),
    later: (work, milliseconds) => {
      const timer = setTimeout(work, milliseconds);
      return () => clearTimeout(timer);
    },
    alone: senderLock(`stubpost.outbox.${personId}`),
    tellOthers: () => channel?.postMessage(personId),
  });
  channel?.addEventListener('message', ({ data }) => {
    if (data === personId) void made.reread();
  });
  ofClient.set(personId, { outbox: made, channel });
  return made;
}

/** Stops the outboxes of this page: the person has signed out. What waits stays in the store. */
export function stopOutboxes(client: QueryClient): void {
  for (const { outbox, channel } of outboxes.get(client)?.values() ?? []) {
    outbox.stop();
    channel?.close();
  }
  outboxes.delete(client);
}

/** Entries made on this phone by the person signed in, and how they stand. */
export function useOutbox(): Outbox & { state: OutboxState } {
  const outbox = outboxOf(useQueryClient(), usePerson().id);
  const state = useSyncExternalStore(outbox.subscribe, outbox.getState);
  return { ...outbox, state };
}

/**
 * Keeps the entries of the person signed in on their way, whatever page is open: at the start, when the page comes back
 * into sight or focus, when the network is back, and every 15 s while in sight. Nothing is sent from the background:
 * phones do not promise that.
 */
export function useOutboxDelivery(): void {
  const outbox = outboxOf(useQueryClient(), usePerson().id);
  const isUnkept = useSyncExternalStore(outbox.subscribe, () => outbox.getState().storage === 'refused');

  useEffect(() => {
    const look = (): void => {
      if (document.visibilityState === 'visible') void outbox.poke();
    };
    look();
    const timer = setInterval(() => {
      if (outbox.getState().waiting.length > 0) look();
    }, lookMilliseconds);
    window.addEventListener('online', look);
    window.addEventListener('focus', look);
    document.addEventListener('visibilitychange', look);
    return () => {
      clearInterval(timer);
      window.removeEventListener('online', look);
      window.removeEventListener('focus', look);
      document.removeEventListener('visibilitychange', look);
    };
  }, [outbox]);

  useEffect(() => {
    if (!isUnkept) return undefined;
    // Entries live in this page only: the browser asks before it is closed.
    const hold = (event: BeforeUnloadEvent): void => event.preventDefault();
    window.addEventListener('beforeunload', hold);
    return () => window.removeEventListener('beforeunload', hold);
  }, [isUnkept]);
}
