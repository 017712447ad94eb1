import { useQueryClient, type QueryClient } from '@tanstack/react-query';
import { createContext, useContext, useEffect, useState, useSyncExternalStore, type ReactNode } from 'react';
import { patchAlert, patchTurn } from './live-patch';
import { LiveStream, type LiveMessage, type LiveState } from './live-stream';
import { queryKeys } from './query-keys';
import { readNow } from './use-now';

const listeners = new Set<(message: LiveMessage) => void>();

/** Calls `listener` for everything that comes over the stream of this tab; answers how to stop. */
export function onLiveMessage(listener: (message: LiveMessage) => void): () => void {
  listeners.add(listener);
  return () => listeners.delete(listener);
}

async function askAgain(client: QueryClient, stream: LiveStream): Promise<void> {
  const keys = [queryKeys.turns.all, queryKeys.alerts.all];
  try {
    await Promise.all(keys.map((queryKey) => client.invalidateQueries({ queryKey }, { throwOnError: true })));
    stream.noteAnswer();
  } catch {
    // The pages show their own trouble; the stream stays "not live" and is tried again.
  }
}

function take(client: QueryClient, stream: () => LiveStream, message: LiveMessage): void {
  switch (message.kind) {
    case 'turn':
      patchTurn(client, message.turn, readNow());
      break;
    case 'alert':
      patchAlert(client, message.alert);
      break;
    case 'reload':
    case 'poll':
      void askAgain(client, stream());
      break;
  }
  for (const listener of listeners) listener(message);
}

const NOT_STARTED: LiveState = { live: false, lastWordAt: null, retryInSeconds: 0 };
const Stream = createContext<LiveStream | null>(null);

/**
 * Keeps one stream open for a terminal, and the cache true to it. Stands once in a shell; without a terminal (nobody
 * chose one yet) it only draws its children.
 */
export function LiveProvider({ terminal, children }: { terminal: string | null; children: ReactNode }) {
  const client = useQueryClient();
  const [stream, setStream] = useState<LiveStream | null>(null);

  useEffect(() => {
    if (terminal === null) return undefined;
    const opened: LiveStream = new LiveStream(terminal, (message) => take(client, () => opened, message));
    opened.start();
    setStream(opened);
    return () => {
      opened.stop();
      setStream(null);
    };
  }, [client, terminal]);

  return <Stream.Provider value={stream}>{children}</Stream.Provider>;
}

const nothingToWatch = (): (() => void) => () => undefined;

/** Whether the page is live, when the server was last heard, and in how many seconds the stream is tried again. */
export function useLiveState(): LiveState {
  const stream = useContext(Stream);
  return useSyncExternalStore(stream?.watch ?? nothingToWatch, stream?.snapshot ?? (() => NOT_STARTED));
}
