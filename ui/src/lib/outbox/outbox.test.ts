import type { EntryReceipt, WireTurn } from '@stubpost/shared';
import { describe, expect, it, vi } from 'vitest';
import { anOutboxEntry, aTouch } from '../../testing/an-outbox';
import { clockAt } from '../../testing/wire-turn';
import { createOutbox, type OutboxOutside, type SendOutcome, type WhoIsThere } from './outbox';
import type { OutboxEntry } from './outbox-entry';
import { createOutboxStore, type OutboxStore } from './outbox-store';
import { createTallyBook } from './outbox-tally';

const receipt = (sequence: number): EntryReceipt => ({
  sequence,
  hash: 'h',
  turn: { id: 't' } as WireTurn,
});
const received = (sequence = 1): SendOutcome => ({ kind: 'received', receipt: receipt(sequence) });

/** A phone in which the test decides how each try ends and when the timer rings. */
function aPhone(change: Partial<OutboxOutside> = {}) {
  const tried: OutboxEntry[] = [];
  const timers: { work: () => void; milliseconds: number }[] = [];
  const took: string[] = [];
  const world = {
    answer: (_entry: OutboxEntry): SendOutcome | Promise<SendOutcome> => received(),
    who: 'same' as WhoIsThere,
    signedOut: 0,
    offset: 0 as number | null,
    atService: new Set<string>() as ReadonlySet<string> | null,
  };
  const outside: OutboxOutside = {
    personId: 'p-ortiz',
    store: createOutboxStore(),
    tally: createTallyBook(localStorage),
    send: async (entry) => {
      tried.push(entry);
      return world.answer(entry);
    },
    whoIsThere: () => Promise.resolve(world.who),
    entryIdsOf: () => Promise.resolve(world.atService),
    onReceived: (turnId) => took.push(turnId),
    onSignedOut: () => {
      world.signedOut += 1;
    },
    now: () => clockAt('17:22:43'),
    deviceNow: () => clockAt('17:22:43'),
    comparedClockOffset: () => world.offset,
    later: (work, milliseconds) => {
      timers.push({ work, milliseconds });
      return () => undefined;
    },
    alone: (work) => work(),
    tellOthers: () => undefined,
    ...change,
  };
  const ids = (): string[] => tried.map(({ id }) => id);
  return { world, outside, tried, timers, took, ids };
}

const waitingIds = (outbox: ReturnType<typeof createOutbox>): string[] =>
  outbox.getState().waiting.map(({ id }) => id);

describe('the outbox', () => {
  it('has an entry in its store before anything else happens, and lets go of it only with a receipt', async () => {
    const phone = aPhone();
    let answer: (outcome: SendOutcome) => void = () => undefined;
    phone.world.answer = () => new Promise((resolve) => (answer = resolve));
    const outbox = createOutbox(phone.outside);
    await outbox.add(aTouch());
    expect((await phone.outside.store.load('p-ortiz')).waiting).toMatchObject([{ id: 'a', seq: 1 }]);
    await vi.waitFor(() => expect(phone.ids()).toEqual(['a']));
    expect(waitingIds(outbox)).toEqual(['a']);
    answer(received(48_361));
    await vi.waitFor(() => expect(waitingIds(outbox)).toEqual([]));
    const kept = await phone.outside.store.load('p-ortiz');
    expect(kept.waiting).toEqual([]);
    expect(kept.sent).toMatchObject([{ id: 'a', sequence: 48_361, refusal: null }]);
    expect(phone.took).toEqual(['t']);
  });

  it('takes up after a start what an earlier page left, with the same id and the same body', async () => {
    const first = aPhone({ send: () => new Promise(() => undefined) });
    await createOutbox(first.outside).add(aTouch());
    await vi.waitFor(async () =>
      expect((await first.outside.store.load('p-ortiz')).waiting).toMatchObject([{ tries: 1 }]),
    );
    const second = aPhone();
    createOutbox(second.outside);
    await vi.waitFor(() => expect(second.ids()).toEqual(['a']));
    expect(second.tried[0]?.payload).toEqual(aTouch().payload);
  });

  it('keeps the order inside a turn, and lets no turn wait for another', async () => {
    const phone = aPhone();
    phone.world.answer = ({ turn }) => (turn === 'stuck' ? { kind: 'failed' } : received());
    phone.world.who = 'unreachable';
    const outbox = createOutbox(phone.outside);
    for (const [turn, id] of [
      ['stuck', 'a'],
      ['t', 'b'],
      ['stuck', 'c'],
      ['t', 'd'],
      ['u', 'e'],
    ] as const)
      await outbox.add(aTouch({ turn }, id));
    await outbox.poke();
    expect(phone.ids()).toEqual([]);
    phone.world.who = 'same';
    await outbox.poke();
    const ofTurn = (turn: string) => phone.tried.filter((entry) => entry.turn === turn).map(({ id }) => id);
    expect(ofTurn('t')).toEqual(['b', 'd']);
    expect(ofTurn('u')).toEqual(['e']);
    // The second of the stuck turn is not tried before the first has gone.
    expect(new Set(ofTurn('stuck'))).toEqual(new Set(['a']));
    expect(waitingIds(outbox)).toEqual(['a', 'c']);
    expect(outbox.getState().failingSince).toBe(clockAt('17:22:43'));
  });

  it('goes on past a refused entry, keeps it until it was read, and keeps the reason afterwards', async () => {
    const phone = aPhone();
    phone.world.answer = ({ id }) =>
      id === 'a'
        ? { kind: 'refused', code: 'entry.not_yours', message: 'Somebody else made it.' }
        : received();
    const outbox = createOutbox(phone.outside);
    await outbox.add(aTouch({}, 'a'));
    await outbox.add(aTouch({}, 'b'));
    await vi.waitFor(() => expect(waitingIds(outbox)).toEqual(['a']));
    expect(outbox.getState().waiting[0]?.refusal?.message).toBe('Somebody else made it.');
    await outbox.poke();
    expect(phone.ids()).toEqual(['a', 'b']);
    await outbox.dismiss('a');
    expect(waitingIds(outbox)).toEqual([]);
    expect(outbox.getState().sent.find(({ id }) => id === 'a')).toMatchObject({
      sequence: null,
      refusal: { code: 'entry.not_yours' },
    });
  });

  it('waits 1, 2, 4, 8, then 15 s between rounds that bring nothing, and says since when', async () => {
    const phone = aPhone();
    phone.world.answer = () => ({ kind: 'unreachable' });
    const outbox = createOutbox(phone.outside);
    await outbox.add(aTouch());
    await outbox.poke();
    for (let round = 0; round < 5; round += 1) await outbox.poke();
    expect(phone.timers.map(({ milliseconds }) => milliseconds / 1000).slice(0, 6)).toEqual([
      1, 2, 4, 8, 15, 15,
    ]);
    expect(outbox.getState()).toMatchObject({ failingSince: clockAt('17:22:43') });
    phone.world.answer = () => received();
    await outbox.poke();
    expect(outbox.getState()).toMatchObject({ failingSince: null, nextTryAt: null, waiting: [] });
  });

  it('sends nothing under somebody else’s sign-in, keeps everything and asks for the own one', async () => {
    const phone = aPhone();
    phone.world.who = 'other';
    const outbox = createOutbox(phone.outside);
    await outbox.add(aTouch());
    await outbox.poke();
    expect(phone.ids()).toEqual([]);
    expect(phone.world.signedOut).toBeGreaterThan(0);
    expect(outbox.getState()).toMatchObject({ needsSignIn: true });
    expect(waitingIds(outbox)).toEqual(['a']);
    // The session ended between the question and the entry.
    phone.world.who = 'same';
    phone.world.answer = () => ({ kind: 'signed-out' });
    await outbox.poke();
    expect(waitingIds(outbox)).toEqual(['a']);
    phone.world.answer = () => received();
    await outbox.poke();
    expect(outbox.getState()).toMatchObject({ needsSignIn: false, waiting: [] });
  });

  it('never shows or sends the entries of another person', async () => {
    await createOutboxStore().add(anOutboxEntry({ personId: 'p-else' }, 'theirs'));
    const phone = aPhone();
    const outbox = createOutbox(phone.outside);
    await outbox.add(aTouch());
    await vi.waitFor(() => expect(waitingIds(outbox)).toEqual([]));
    expect(phone.ids()).toEqual(['a']);
    expect(await phone.outside.store.countOthers('p-ortiz')).toBe(1);
    expect(await phone.outside.store.countOthers(null)).toBe(1);
  });

  it('keeps entries in memory when the phone refuses to, says so, and still sends them in order', async () => {
    const broken: OutboxStore = {
      load: () => Promise.reject(new Error('shut')),
      add: () => Promise.reject(new Error('full')),
      replace: () => Promise.reject(new Error('full')),
      settle: () => Promise.reject(new Error('full')),
      countOthers: () => Promise.reject(new Error('shut')),
    };
    const phone = aPhone({ store: broken });
    phone.world.who = 'unreachable';
    const outbox = createOutbox(phone.outside);
    await outbox.add(aTouch({}, 'a'));
    await outbox.add(aTouch({ deviceTime: clockAt('17:22:42') }, 'b'));
    expect(outbox.getState().storage).toBe('refused');
    expect(waitingIds(outbox)).toEqual(['a', 'b']);
    phone.world.who = 'same';
    await outbox.poke();
    expect(phone.ids()).toEqual(['a', 'b']);
    expect(waitingIds(outbox)).toEqual([]);
    await outbox.poke();
    expect(phone.ids()).toEqual(['a', 'b']);
  });

  it('puts what memory held into the store as soon as the store takes it', async () => {
    const real = createOutboxStore();
    let isFull = true;
    const store: OutboxStore = {
      ...real,
      add: (entry) => (isFull ? Promise.reject(new Error('full')) : real.add(entry)),
    };
    const phone = aPhone({ store });
    phone.world.who = 'unreachable';
    const outbox = createOutbox(phone.outside);
    await outbox.add(aTouch());
    expect(outbox.getState().storage).toBe('refused');
    isFull = false;
    await outbox.poke();
    expect(outbox.getState().storage).toBe('kept');
    expect((await real.load('p-ortiz')).waiting).toMatchObject([{ id: 'a' }]);
  });

  it('sets the time of a touch right when the clock was only remembered and turns out wrong, before the first try only', async () => {
    const phone = aPhone();
    phone.world.who = 'unreachable';
    phone.world.offset = null;
    const outbox = createOutbox(phone.outside);
    await outbox.add(aTouch({ clockBasis: 'remembered' }, 'a'));
    await outbox.poke();
    phone.world.who = 'same';
    phone.world.offset = 90_000;
    await outbox.poke();
    expect(phone.tried[0]?.payload).toMatchObject({
      observedAt: new Date(clockAt('17:22:41') - 90_000).toISOString(),
      clockOffsetMilliseconds: 90_000,
    });
  });

  it('shares its store with a second page of the phone without losing or doubling', async () => {
    let queue = Promise.resolve();
    const alone = (work: () => Promise<void>): Promise<void> => (queue = queue.then(work));
    const log: string[] = [];
    const one = aPhone({ alone });
    const other = aPhone({ alone });
    for (const { world } of [one, other])
      world.answer = ({ id }) => {
        log.push(id);
        return received();
      };
    const [first, second] = [createOutbox(one.outside), createOutbox(other.outside)];
    await Promise.all(
      Array.from({ length: 10 }, (_, at) => (at % 2 === 0 ? first : second).add(aTouch({}, `e${at}`))),
    );
    await Promise.all([first.poke(), second.poke()]);
    await Promise.all([first.poke(), second.poke()]);
    expect([...log].sort()).toEqual(Array.from({ length: 10 }, (_, at) => `e${at}`));
    const { waiting, sent } = await createOutboxStore().load('p-ortiz');
    expect(waiting).toEqual([]);
    expect(sent).toHaveLength(10);
  });
});

describe('the count kept apart', () => {
  const lostPhone = async () => {
    const phone = aPhone();
    phone.world.who = 'unreachable';
    const before = createOutbox(phone.outside);
    await before.add(aTouch({}, 'a'));
    await before.add(aTouch({ turn: 'u' }, 'b'));
    await before.poke();
    indexedDB.deleteDatabase('stubpost-outbox');
    const { IDBFactory } = await import('fake-indexeddb');
    globalThis.indexedDB = new IDBFactory();
    return aPhone();
  };

  it('finds entries that are gone, tells the person, and the desk by a note on the turn of the last', async () => {
    const phone = await lostPhone();
    const outbox = createOutbox(phone.outside);
    await vi.waitFor(() => expect(phone.tried).toHaveLength(1));
    expect(phone.tried[0]).toMatchObject({ turn: 'u', kind: 'note' });
    expect(phone.tried[0]?.payload).toMatchObject({
      note: expect.stringMatching(
        /^2 entries were lost on a phone before being sent: Note a, .*Note b, /,
      ) as string,
    });
    await vi.waitFor(() => expect(outbox.getState().lost.map(({ id }) => id)).toEqual(['a', 'b']));
    outbox.forgetLost();
    expect(outbox.getState().lost).toEqual([]);
  });

  it('claims nothing when the service has the entries after all', async () => {
    const phone = await lostPhone();
    phone.world.atService = new Set(['a', 'b']);
    const outbox = createOutbox(phone.outside);
    await vi.waitFor(() => expect(phone.outside.tally.read('p-ortiz').open).toEqual([]));
    expect(outbox.getState().lost).toEqual([]);
    expect(phone.tried).toEqual([]);
  });

  it('waits with its claim until the service can be asked', async () => {
    const phone = await lostPhone();
    phone.world.atService = null;
    const outbox = createOutbox(phone.outside);
    await outbox.poke();
    expect(outbox.getState().lost).toEqual([]);
    expect(phone.outside.tally.read('p-ortiz').open).toHaveLength(2);
  });
});
