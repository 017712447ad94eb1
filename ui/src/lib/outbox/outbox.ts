import { millisecondsInSecond, type EntryReceipt, type Instant } from '@stubpost/shared';
import {
  entryFor,
  inOrder,
  lanesOf,
  sentFrom,
  waitSeconds,
  withComparedClock,
  type NewEntry,
  type OutboxEntry,
  type Refusal,
  type SentEntry,
} from './outbox-entry';
import { findLost, type LossOutside } from './outbox-loss';
import type { OutboxStore } from './outbox-store';
import type { LostEntry } from './outbox-tally';

/** How a try ended, as the sender judged it. */
export type SendOutcome =
  | { kind: 'received'; receipt: EntryReceipt }
  | { kind: 'refused'; code: string; message: string }
  /** The session has ended, or is somebody else's. */
  | { kind: 'signed-out' }
  /** No answer at all: the others would have none either. */
  | { kind: 'unreachable' }
  /** This entry had a bad answer, or none in time; others may fare better. */
  | { kind: 'failed' };

/** Whose session the browser has. */
export type WhoIsThere = 'same' | 'other' | 'unreachable';

/** What the outbox needs from outside: stores, a way to send, clocks, a timer, and the other pages of this browser. */
export interface OutboxOutside extends LossOutside {
  personId: string;
  store: OutboxStore;
  send: (entry: OutboxEntry) => Promise<SendOutcome>;
  whoIsThere: () => Promise<WhoIsThere>;
  onReceived: (turnId: string, receipt: EntryReceipt) => void;
  onSignedOut: () => void;
  now: () => Instant;
  /** Milliseconds by which the device's clock is ahead of the server's; null while it was not compared since the app was opened. */
  comparedClockOffset: () => number | null;
  later: (work: () => void, milliseconds: number) => () => void;
  /** Runs the work while no other page of this browser does. */
  alone: (work: () => Promise<void>) => Promise<void>;
  /** Tells other pages that the store has changed. */
  tellOthers: () => void;
}

/** What the screens show of the outbox. A new object with every change. */
export interface OutboxState {
  /** False until the store was read for the first time. */
  isLoaded: boolean;
  waiting: readonly OutboxEntry[];
  /** What has left, newest first. */
  sent: readonly SentEntry[];
  lost: readonly LostEntry[];
  /** Since when sending has failed; null while it works. */
  failingSince: Instant | null;
  /** When the next try is due; null when none is planned. */
  nextTryAt: Instant | null;
  /** When the newest receipt came; null before the first. */
  sentAt: Instant | null;
  /** `refused` when the phone keeps nothing: entries then live only as long as the page. */
  storage: 'kept' | 'refused';
  /** Entries wait for their writer to sign in again. */
  needsSignIn: boolean;
}

/** Entries on the way from the thumb to the log: kept first, sent in order per turn, let go only with a receipt. */
export interface Outbox {
  getState: () => OutboxState;
  subscribe: (listener: () => void) => () => void;
  /** Settles when the entry is kept, in the store or, where that refuses, in memory. Never rejects. */
  add: (entry: NewEntry) => Promise<void>;
  /** Tries at once; settles when the round is over. */
  poke: () => Promise<void>;
  /** Another page changed the store. */
  reread: () => Promise<void>;
  /** The person has read why an entry was refused. It stays in the list of what has left. */
  dismiss: (entryId: string) => Promise<void>;
  /** The person has read which entries are lost. */
  forgetLost: () => void;
  /** How many entries wait by the count kept apart. */
  counted: () => number;
  /** Sends nothing more; what waits stays in the store for the next outbox of its writer. */
  stop: () => void;
}

/** How many turns are sent side by side, so that one entry without an answer does not hold the others back. Our choice. */
const lanesAtOnce = 4;

const START: OutboxState = {
  isLoaded: false,
  waiting: [],
  sent: [],
  lost: [],
  failingSince: null,
  nextTryAt: null,
  sentAt: null,
  storage: 'kept',
  needsSignIn: false,
};

/** Makes the outbox of one person and takes up what earlier pages left behind. */
export function createOutbox(outside: OutboxOutside): Outbox {
  const { store, tally, personId } = outside;
  let state = START;
  let round: Promise<void> | null = null;
  let nextRound: Promise<void> | null = null;
  let failures = 0;
  let isStopped = false;
  let callOff: (() => void) | null = null;
  /** Entries that the store would not take; they are tried again with every round. */
  const unkept = new Map<string, OutboxEntry>();
  /** Entries that have left; a reading of the store that began before that does not bring them back. */
  const gone = new Set<string>();
  /** Counts what this page did to its entries, so that a reading that was overtaken is made again. */
  let edition = 0;
  const listeners = new Set<() => void>();

  function change(next: Partial<OutboxState>): void {
    state = { ...state, ...next };
    for (const listener of listeners) listener();
  }

  async function reread(): Promise<void> {
    try {
      const before = edition;
      const kept = await store.load(personId);
      if (before !== edition) return await reread();
      // The store has it now: a slow answer had made us think that it had not.
      for (const { id } of kept.waiting) unkept.delete(id);
      const waiting = inOrder([...kept.waiting, ...unkept.values()]).filter(({ id }) => !gone.has(id));
      const newest = kept.sent.find(({ sequence }) => sequence !== null)?.leftAt ?? null;
      const sentAt = Math.max(newest ?? 0, state.sentAt ?? 0) || null;
      const storage = unkept.size === 0 ? 'kept' : 'refused';
      change({ isLoaded: true, waiting, sent: kept.sent, sentAt, storage, lost: tally.read(personId).lost });
    } catch {
      change({ isLoaded: true, storage: 'refused' });
    }
  }

  async function keepUnkept(): Promise<void> {
    for (const entry of unkept.values()) {
      try {
        const kept = await store.add(entry);
        unkept.delete(entry.id);
        tally.opened(personId, [kept]);
      } catch {
        return;
      }
    }
  }

  async function replace(entry: OutboxEntry): Promise<void> {
    edition += 1;
    if (unkept.has(entry.id)) unkept.set(entry.id, entry);
    else await store.replace(entry).catch(() => change({ storage: 'refused' }));
    change({ waiting: state.waiting.map((each) => (each.id === entry.id ? entry : each)) });
  }

  async function letGo(entry: OutboxEntry, left: { sequence: number | null; refusal: Refusal | null }) {
    const sent = sentFrom(entry, { ...left, at: outside.now() });
    edition += 1;
    unkept.delete(entry.id);
    gone.add(entry.id);
    // Where the store cannot note it, the next start sends it again, and the service answers with the same receipt.
    await store.settle(sent).catch(() => change({ storage: 'refused' }));
    tally.closed(personId, [entry.id]);
    change({
      waiting: state.waiting.filter(({ id }) => id !== entry.id),
      sent: [sent, ...state.sent.filter(({ id }) => id !== entry.id)],
      ...(left.sequence === null ? {} : { sentAt: sent.leftAt }),
    });
    outside.tellOthers();
  }

  /** Sends the first entry of a turn; says how it went on. */
  async function sendOne(entry: OutboxEntry): Promise<SendOutcome['kind']> {
    const offset = outside.comparedClockOffset();
    const tried = { ...(offset === null ? entry : withComparedClock(entry, offset)), tries: entry.tries + 1 };
    // Noted before it goes: from here on the body must stay what it is, also when the page dies now.
    await replace(tried);
    const outcome = await outside.send(tried).catch((): SendOutcome => ({ kind: 'failed' }));
    if (outcome.kind === 'received') {
      // The turn first: were the entry gone before it, the step would look open for a moment.
      outside.onReceived(entry.turn, outcome.receipt);
      await letGo(tried, { sequence: outcome.receipt.sequence, refusal: null });
    } else if (outcome.kind === 'refused') {
      await replace({ ...tried, refusal: { code: outcome.code, message: outcome.message } });
      outside.tellOthers();
    }
    return outcome.kind;
  }

  /** Sends the turns side by side, each in its order, until all is sent or each has stopped. */
  async function sendLanes(): Promise<SendOutcome['kind']> {
    const stopped = new Set<string>();
    let verdict: SendOutcome['kind'] = 'received';
    const isOver = (): boolean => isStopped || verdict === 'unreachable' || verdict === 'signed-out';
    const nextTurn = (busy: ReadonlySet<string>): string | undefined =>
      [...lanesOf(state.waiting).keys()].find((turn) => !stopped.has(turn) && !busy.has(turn));
    const busy = new Set<string>();

    async function work(): Promise<void> {
      for (let turn = nextTurn(busy); turn !== undefined && !isOver(); turn = nextTurn(busy)) {
        busy.add(turn);
        for (let entry = headOf(turn); entry !== undefined && !isOver(); entry = headOf(turn)) {
          const kind = await sendOne(entry);
          if (kind === 'received' || kind === 'refused') continue;
          stopped.add(turn);
          if (!isOver()) verdict = kind;
          break;
        }
        busy.delete(turn);
      }
    }
    await Promise.all(Array.from({ length: lanesAtOnce }, work));
    return verdict;
  }

  const headOf = (turn: string): OutboxEntry | undefined => lanesOf(state.waiting).get(turn)?.[0];

  function settleRound(verdict: SendOutcome['kind']): void {
    if (isStopped) return;
    if (verdict === 'received' || verdict === 'refused') {
      failures = 0;
      change({ failingSince: null, nextTryAt: null, needsSignIn: false });
      return;
    }
    if (verdict === 'signed-out') {
      change({ needsSignIn: true, nextTryAt: null, failingSince: null });
      outside.onSignedOut();
      return;
    }
    failures += 1;
    const milliseconds = waitSeconds(failures) * millisecondsInSecond;
    const nextTryAt = outside.now() + milliseconds;
    change({ failingSince: state.failingSince ?? outside.now(), nextTryAt });
    callOff = outside.later(() => void poke(), milliseconds);
  }

  async function sendAll(): Promise<void> {
    await keepUnkept();
    await reread();
    if (lanesOf(state.waiting).size === 0) {
      settleRound('received');
      return;
    }
    const who = await outside.whoIsThere();
    if (who === 'same') settleRound(await sendLanes());
    else settleRound(who === 'other' ? 'signed-out' : 'unreachable');
  }

  /** One round at a time. Asked while one runs, one more follows it: it may have gone past what the question is about. */
  function poke(): Promise<void> {
    if (isStopped) return Promise.resolve();
    if (round !== null) {
      nextRound ??= round.then(() => {
        nextRound = null;
        return poke();
      });
      return nextRound;
    }
    callOff?.();
    callOff = null;
    round = outside
      .alone(sendAll)
      .catch(() => settleRound('failed'))
      .finally(() => {
        round = null;
      });
    return round;
  }

  async function start(): Promise<void> {
    await reread();
    await outside.alone(async () => {
      if (await findLost(outside, personId)) await reread();
    });
    await poke();
  }
  void start();

  return {
    getState: () => state,
    subscribe: (listener) => {
      listeners.add(listener);
      return () => listeners.delete(listener);
    },
    add: async (touch) => {
      const made = entryFor(touch);
      const entry = await store.add(made).catch(() => null);
      edition += 1;
      if (entry === null) {
        // Behind everything kept: order counts among the entries of this page.
        unkept.set(made.id, { ...made, seq: Number.MAX_SAFE_INTEGER });
        change({ storage: 'refused' });
      } else {
        tally.opened(personId, [entry]);
      }
      const kept = entry ?? unkept.get(made.id) ?? made;
      if (!state.waiting.some(({ id }) => id === kept.id)) change({ waiting: [...state.waiting, kept] });
      outside.tellOthers();
      void poke();
    },
    poke,
    reread,
    dismiss: async (id) => {
      const entry = state.waiting.find((each) => each.id === id);
      if (entry === undefined || entry.refusal === null) return;
      await letGo(entry, { sequence: null, refusal: entry.refusal });
    },
    stop: () => {
      isStopped = true;
      callOff?.();
    },
    counted: () => tally.read(personId).open.length,
    forgetLost: () => {
      tally.forgetLost(personId);
      change({ lost: [] });
    },
  };
}
