import type { EntryReceipt, RecordEntryRequest } from '@stubpost/shared';
import { at, aWireTurn, ms } from '../testing/a-wire-turn';
import {
  createEntryQueue,
  waitSeconds,
  type QueueOutside,
  type SendOutcome,
  type WaitingEntry,
} from './entry-queue';

const note = (id: string): RecordEntryRequest => ({
  id,
  kind: 'note',
  observedAt: at('17:22:41'),
  source: 'by-hand',
  note: id,
});
const receipt = (sequence: number): EntryReceipt => ({ sequence, hash: 'h', turn: aWireTurn() });

/** A world in which the test decides how each try ends and when the timer rings. */
function aWorld(kept: Record<string, string> = {}) {
  const tried: WaitingEntry[] = [];
  const answers: ((outcome: SendOutcome) => void)[] = [];
  const timers: { work: () => void; milliseconds: number }[] = [];
  const received: string[] = [];
  const store = new Map(Object.entries(kept));
  const outside: QueueOutside = {
    storage: {
      getItem: (key) => store.get(key) ?? null,
      setItem: (key, value) => void store.set(key, value),
      removeItem: (key) => void store.delete(key),
    },
    storageKey: 'unsent:p-ortiz',
    send: (entry) => {
      tried.push(entry);
      return new Promise((resolve) => answers.push(resolve));
    },
    onReceived: (turnId) => received.push(turnId),
    now: () => ms('17:22:43'),
    later: (work, milliseconds) => {
      timers.push({ work, milliseconds });
      return () => undefined;
    },
  };
  const answer = async (outcome: SendOutcome): Promise<void> => {
    answers.shift()?.(outcome);
    await Promise.resolve();
    await Promise.resolve();
    await Promise.resolve();
  };
  return { outside, tried, timers, received, store, answer };
}

const ids = (entries: readonly WaitingEntry[]): string[] => entries.map((entry) => entry.request.id);

describe('the queue of entries', () => {
  it('keeps an entry before it is sent and drops it with the receipt only', async () => {
    const world = aWorld();
    const queue = createEntryQueue(world.outside);
    queue.add({ turnId: 't', request: note('a'), label: 'Note' });
    expect(world.store.get('unsent:p-ortiz')).toContain('"a"');
    expect(queue.getState()).toMatchObject({ waiting: [{ label: 'Note' }], sentAt: null });
    await world.answer({ kind: 'received', receipt: receipt(7) });
    expect(queue.getState()).toMatchObject({ waiting: [], sentAt: ms('17:22:43'), failingSince: null });
    expect(world.store.size).toBe(0);
    expect(world.received).toEqual(['t']);
  });

  it('tries again with the same id after 1, 2, 4, 8 and then every 15 seconds', async () => {
    const world = aWorld();
    const queue = createEntryQueue(world.outside);
    queue.add({ turnId: 't', request: note('a'), label: 'Note' });
    for (let round = 0; round < 6; round += 1) {
      await world.answer({ kind: 'failed' });
      world.timers[round]?.work();
    }
    expect(ids(world.tried)).toEqual(['a', 'a', 'a', 'a', 'a', 'a', 'a']);
    expect(world.timers.map((timer) => timer.milliseconds)).toEqual([1000, 2000, 4000, 8000, 15_000, 15_000]);
    expect(queue.getState().failingSince).toBe(ms('17:22:43'));
    expect(waitSeconds(0)).toBe(1);
  });

  it('sends in the order of the touches and never two at once', async () => {
    const world = aWorld();
    const queue = createEntryQueue(world.outside);
    queue.add({ turnId: 't', request: note('a'), label: 'Note' });
    queue.add({ turnId: 't', request: note('b'), label: 'Note' });
    expect(ids(world.tried)).toEqual(['a']);
    await world.answer({ kind: 'received', receipt: receipt(1) });
    expect(ids(world.tried)).toEqual(['a', 'b']);
  });

  it('does not send a later entry before an earlier one that failed', async () => {
    const world = aWorld();
    const queue = createEntryQueue(world.outside);
    queue.add({ turnId: 't', request: note('a'), label: 'Note' });
    await world.answer({ kind: 'failed' });
    queue.add({ turnId: 't', request: note('b'), label: 'Note' });
    expect(ids(world.tried)).toEqual(['a', 'a']);
    await world.answer({ kind: 'received', receipt: receipt(1) });
    expect(ids(world.tried)).toEqual(['a', 'a', 'b']);
    expect(queue.getState().failingSince).toBeNull();
  });

  it('keeps a refused entry in sight, goes on with the next, and lets it go when it was read', async () => {
    const world = aWorld();
    const queue = createEntryQueue(world.outside);
    queue.add({ turnId: 't', request: note('a'), label: 'Note' });
    queue.add({ turnId: 't', request: note('b'), label: 'Note' });
    await world.answer({ kind: 'refused', code: 'entry.at_the_controls', message: 'no' });
    expect(ids(world.tried)).toEqual(['a', 'b']);
    expect(queue.getState().waiting[0]?.refusal?.code).toBe('entry.at_the_controls');
    queue.dismiss('a');
    expect(ids(queue.getState().waiting)).toEqual(['b']);
  });

  it('takes up what an earlier page left behind, and lives with a damaged store', () => {
    const left: WaitingEntry[] = [
      { turnId: 't', request: note('old'), label: 'Note', tries: 3, refusal: null },
    ];
    const world = aWorld({ 'unsent:p-ortiz': JSON.stringify(left) });
    createEntryQueue(world.outside);
    expect(ids(world.tried)).toEqual(['old']);
    const damaged = aWorld({ 'unsent:p-ortiz': '[{"turn' });
    expect(createEntryQueue(damaged.outside).getState().waiting).toEqual([]);
  });

  it('tells its listeners until they leave', () => {
    const queue = createEntryQueue(aWorld().outside);
    let told = 0;
    const leave = queue.subscribe(() => (told += 1));
    queue.add({ turnId: 't', request: note('a'), label: 'Note' });
    leave();
    queue.add({ turnId: 't', request: note('b'), label: 'Note' });
    expect(told).toBe(1);
  });
});
