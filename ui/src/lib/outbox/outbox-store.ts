import { openDB, type DBSchema, type IDBPDatabase } from 'idb';
import type { Instant } from '@stubpost/shared';
import { inOrder, type OutboxEntry, type SentEntry } from './outbox-entry';

interface OutboxDatabase extends DBSchema {
  entries: { key: string; value: OutboxEntry; indexes: { person: string } };
  sent: { key: string; value: SentEntry; indexes: { person: string; leftAt: number } };
  /** One running number for all entries of this phone. */
  counters: { key: string; value: number };
}

/** Name and version of the database; the version rises when a store is added. */
const databaseName = 'stubpost-outbox';
const databaseVersion = 1;

/** How long what was sent can be looked at on the phone: two days. Our choice. */
export const sentKeptMilliseconds = 48 * 3600 * 1000;

/** A store that does not answer within this time counts as refused. Our choice. */
const patienceMilliseconds = 5000;

/** What the phone keeps of a person. */
export interface KeptOutbox {
  waiting: OutboxEntry[];
  /** Newest first. */
  sent: SentEntry[];
}

/** Where entries are kept until they have a receipt. Every method rejects when the store does not do it. */
export interface OutboxStore {
  load: (personId: string) => Promise<KeptOutbox>;
  /** Keeps a new entry and gives it its place; one that is there already stays as it is. */
  add: (entry: OutboxEntry) => Promise<OutboxEntry>;
  /** Replaces an entry that still waits; one that has gone meanwhile does not come back. */
  replace: (entry: OutboxEntry) => Promise<void>;
  /** Takes an entry out and keeps what is left of it, in one go. */
  settle: (sent: SentEntry) => Promise<void>;
  /** How many entries of other people wait on this phone. */
  countOthers: (personId: string | null) => Promise<number>;
}

/** Strict: what is acknowledged to the thumb must survive a flat battery. */
const durable = { durability: 'strict' } as const;

function open(): Promise<IDBPDatabase<OutboxDatabase>> {
  return openDB<OutboxDatabase>(databaseName, databaseVersion, {
    upgrade: (database) => {
      database.createObjectStore('entries', { keyPath: 'id' }).createIndex('person', 'personId');
      const sent = database.createObjectStore('sent', { keyPath: 'id' });
      sent.createIndex('person', 'personId');
      sent.createIndex('leftAt', 'leftAt');
      database.createObjectStore('counters');
    },
    // A newer version of the app wants to change the stores: let go, and open anew with the next question.
    blocking: (_current, _wanted, event) => (event.target as IDBDatabase).close(),
  });
}

async function inTime<Answer>(work: Promise<Answer>): Promise<Answer> {
  let timer: ReturnType<typeof setTimeout> | undefined;
  const late = new Promise<never>((_resolve, reject) => {
    timer = setTimeout(
      () => reject(new Error('The store of this phone does not answer')),
      patienceMilliseconds,
    );
  });
  try {
    return await Promise.race([work, late]);
  } finally {
    clearTimeout(timer);
  }
}

/** The outbox of this browser in IndexedDB. Opened with the first question; opened anew when it was closed under us. */
export function createOutboxStore(): OutboxStore {
  let opened: Promise<IDBPDatabase<OutboxDatabase>> | null = null;

  async function ask<Answer>(
    work: (database: IDBPDatabase<OutboxDatabase>) => Promise<Answer>,
  ): Promise<Answer> {
    opened ??= open();
    try {
      return await inTime(opened.then(work));
    } catch (problem) {
      opened = null;
      throw problem;
    }
  }

  return {
    load: (personId) =>
      ask(async (database) => {
        const waiting = await database.getAllFromIndex('entries', 'person', personId);
        const sent = await database.getAllFromIndex('sent', 'person', personId);
        return { waiting: inOrder(waiting), sent: sent.sort((a, b) => b.leftAt - a.leftAt) };
      }),
    add: (entry) =>
      ask(async (database) => {
        const work = database.transaction(['entries', 'sent', 'counters'], 'readwrite', durable);
        const known = await work.objectStore('entries').get(entry.id);
        const isGone = (await work.objectStore('sent').getKey(entry.id)) !== undefined;
        const seq = ((await work.objectStore('counters').get('seq')) ?? 0) + 1;
        const kept = known ?? { ...entry, seq };
        if (known === undefined && !isGone) {
          await work.objectStore('counters').put(seq, 'seq');
          await work.objectStore('entries').add(kept);
        }
        await work.done;
        return kept;
      }),
    replace: (entry) =>
      ask(async (database) => {
        const work = database.transaction('entries', 'readwrite', durable);
        if ((await work.store.getKey(entry.id)) !== undefined) await work.store.put(entry);
        await work.done;
      }),
    settle: (sent) =>
      ask(async (database) => {
        const work = database.transaction(['entries', 'sent'], 'readwrite', durable);
        await work.objectStore('entries').delete(sent.id);
        await work.objectStore('sent').put(sent);
        await forgetBefore(work.objectStore('sent'), sent.leftAt - sentKeptMilliseconds);
        await work.done;
      }),
    countOthers: (personId) =>
      ask(async (database) => {
        const all = await database.count('entries');
        return personId === null ? all : all - (await database.countFromIndex('entries', 'person', personId));
      }),
  };
}

interface SentStore {
  index: (name: 'leftAt') => { getAllKeys: (range: IDBKeyRange) => Promise<string[]> };
  delete: (key: string) => Promise<void>;
}

async function forgetBefore(store: SentStore, instant: Instant): Promise<void> {
  const old = await store.index('leftAt').getAllKeys(IDBKeyRange.upperBound(instant, true));
  await Promise.all(old.map((id) => store.delete(id)));
}
