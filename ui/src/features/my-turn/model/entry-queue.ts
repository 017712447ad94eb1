import {
  millisecondsInSecond,
  type EntryReceipt,
  type Instant,
  type RecordEntryRequest,
} from '@stubpost/shared';

/** One entry made on this phone that has no receipt yet. Its id never changes, so that a retry is not a second record. */
export interface WaitingEntry {
  turnId: string;
  request: RecordEntryRequest;
  /** What was recorded, in the words of the bar. */
  label: string;
  tries: number;
  /** Set when the service said no for good; the entry stays here until the person has read why. */
  refusal: { code: string; message: string } | null;
}

/** What the screens show of the queue. A new object with every change. */
export interface QueueState {
  waiting: readonly WaitingEntry[];
  /** Since when sending has failed; null while it works. */
  failingSince: Instant | null;
  /** When the newest receipt came; null before the first. */
  sentAt: Instant | null;
}

/** How a try ended, as the sender judged it. */
export type SendOutcome =
  | { kind: 'received'; receipt: EntryReceipt }
  | { kind: 'refused'; code: string; message: string }
  | { kind: 'failed' };

/** What the queue needs from outside: somewhere to keep entries, a way to send, a clock, a timer. */
export interface QueueOutside {
  storage: Pick<Storage, 'getItem' | 'setItem' | 'removeItem'>;
  storageKey: string;
  send: (entry: WaitingEntry) => Promise<SendOutcome>;
  onReceived: (turnId: string, receipt: EntryReceipt) => void;
  now: () => Instant;
  /** Runs `work` after so many milliseconds; gives back how to call it off. */
  later: (work: () => void, milliseconds: number) => () => void;
}

/** Longest wait between two tries, in seconds: a phone that comes out of a tunnel sends within a quarter of a minute. Our choice. */
export const longestWaitSeconds = 15;

/** Seconds until the next try after so many failed ones: 1, 2, 4, 8, then 15. */
export function waitSeconds(tries: number): number {
  return Math.min(2 ** Math.max(0, tries - 1), longestWaitSeconds);
}

/** Entries on the way from the thumb to the log: kept first, sent in order, dropped only with a receipt. */
export interface EntryQueue {
  getState: () => QueueState;
  subscribe: (listener: () => void) => () => void;
  add: (entry: Pick<WaitingEntry, 'turnId' | 'request' | 'label'>) => void;
  /** Tries at once, for example when the network is back. */
  poke: () => void;
  /** The person has read why an entry was refused. */
  dismiss: (entryId: string) => void;
}

/** Makes a queue and takes up what an earlier page of the same sign-in left behind. */
export function createEntryQueue(outside: QueueOutside): EntryQueue {
  let state: QueueState = { waiting: readKept(outside), failingSince: null, sentAt: null };
  let sending = false;
  let callOff: (() => void) | null = null;
  const listeners = new Set<() => void>();

  function change(next: Partial<QueueState>): void {
    state = { ...state, ...next };
    if (next.waiting !== undefined) keep(outside, state.waiting);
    listeners.forEach((listener) => {
      listener();
    });
  }

  const without = (id: string): WaitingEntry[] => state.waiting.filter((entry) => entry.request.id !== id);
  const replace = (id: string, part: Partial<WaitingEntry>): WaitingEntry[] =>
    state.waiting.map((entry) => (entry.request.id === id ? { ...entry, ...part } : entry));

  function settle(entry: WaitingEntry, outcome: SendOutcome): void {
    const id = entry.request.id;
    if (outcome.kind === 'received') {
      // The turn first: were the entry gone before it, the step would look open for a moment.
      outside.onReceived(entry.turnId, outcome.receipt);
      change({ waiting: without(id), failingSince: null, sentAt: outside.now() });
    } else if (outcome.kind === 'refused') {
      change({
        waiting: replace(id, { refusal: { code: outcome.code, message: outcome.message } }),
        failingSince: null,
      });
    } else {
      const tries = entry.tries + 1;
      change({ waiting: replace(id, { tries }), failingSince: state.failingSince ?? outside.now() });
      callOff = outside.later(poke, waitSeconds(tries) * millisecondsInSecond);
    }
  }

  async function sendNext(): Promise<void> {
    const entry = state.waiting.find((each) => each.refusal === null);
    if (entry === undefined || sending) return;
    sending = true;
    const outcome = await outside.send(entry).catch((): SendOutcome => ({ kind: 'failed' }));
    sending = false;
    settle(entry, outcome);
    if (outcome.kind !== 'failed') await sendNext();
  }

  function poke(): void {
    callOff?.();
    callOff = null;
    void sendNext();
  }

  poke();
  return {
    getState: () => state,
    subscribe: (listener) => {
      listeners.add(listener);
      return () => listeners.delete(listener);
    },
    add: (entry) => {
      change({ waiting: [...state.waiting, { ...entry, tries: 0, refusal: null }] });
      poke();
    },
    poke,
    dismiss: (id) => {
      change({ waiting: without(id) });
    },
  };
}

function keep({ storage, storageKey }: QueueOutside, waiting: readonly WaitingEntry[]): void {
  try {
    if (waiting.length === 0) storage.removeItem(storageKey);
    else storage.setItem(storageKey, JSON.stringify(waiting));
  } catch {
    // A full or forbidden store leaves the entries in memory; the strip says that the page must stay open.
  }
}

function readKept({ storage, storageKey }: QueueOutside): WaitingEntry[] {
  try {
    const kept: unknown = JSON.parse(storage.getItem(storageKey) ?? '[]');
    return Array.isArray(kept) ? kept.filter(isWaitingEntry) : [];
  } catch {
    return [];
  }
}

/** Written by this module and nothing else; only a cut-off or foreign value is left out. */
function isWaitingEntry(value: unknown): value is WaitingEntry {
  return (
    typeof value === 'object' && value !== null && 'turnId' in value && 'request' in value && 'tries' in value
  );
}
