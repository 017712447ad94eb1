import type { AddressInfo } from 'node:net';
import type { EntryReceipt, WireEntry, WireTurn } from '@stubpost/shared';
import { ENTRY_KINDS } from '@stubpost/shared';
import { seededRandom } from '@stubpost/shared/testing';
import { SignInService } from '../src/auth/sign-in.service';
import { SessionCookie } from '../src/auth/session-cookie';
import { ChainCheck } from '../src/records/chain-check.service';
import { type Told, type Writer, WRITERS, tellStory } from './support/interleaved-story';
import {
  type Railroad,
  aRailroad,
  addHarbor,
  anEntryRequest,
  at,
  openTurn,
  record,
  startOfTest,
} from './support/railroad';
import { exportOf, linesOf, verdictOf } from './support/sealed-log';
import { signInAs } from './support/sign-in';
import { noteSoak } from './support/soak-report';

/** Stories, and orders of arrival of each; a long run asks for more. */
const stories = Number(process.env.INTERLEAVED_STORIES ?? 3);
const orders = Number(process.env.INTERLEAVED_ORDERS ?? 5);
const turnsInStory = 2;

jest.setTimeout(60_000 + stories * orders * 20_000);

let railroad: Railroad;
let base: string;
const cookies = {} as Record<Writer, string>;
const people = {} as Record<Writer, string>;

beforeAll(async () => {
  railroad = await aRailroad();
  await addHarbor(railroad.app);
  await railroad.app.listen(0, '127.0.0.1');
  base = `http://127.0.0.1:${(railroad.app.getHttpServer().address() as AddressInfo).port}`;
  const cookie = railroad.app.get(SessionCookie).name;
  for (const writer of WRITERS) {
    const role = writer === 'phone A' || writer === 'phone B' ? 'conductor' : writer;
    const { personId } = await signInAs(railroad.app, role, 'HBR');
    const { token } = await railroad.app.get(SignInService).openFor(personId, writer);
    cookies[writer] = `${cookie}=${token}`;
    people[writer] = personId;
  }
});
afterAll(() => railroad.close());

/** What the service answered to one sending. */
interface Sent {
  status: number;
  receipt: Pick<EntryReceipt, 'sequence' | 'hash'>;
}

async function send(told: Told, turnIds: readonly string[]): Promise<Sent> {
  const answer = await fetch(`${base}/api/turns/${turnIds[told.turn]}/entries`, {
    method: 'POST',
    headers: { 'Content-Type': 'application/json', Cookie: cookies[told.writer] },
    body: JSON.stringify(told.request),
  });
  const body = (await answer.json()) as EntryReceipt;
  return { status: answer.status, receipt: { sequence: body.sequence, hash: body.hash } };
}

/** Sends a batch at once, as devices do that do not know of each other; the clock goes on in between. */
async function deliver(batches: readonly Told[][], turnIds: readonly string[]): Promise<Map<string, Sent[]>> {
  const received = new Map<string, Sent[]>();
  for (const [index, batch] of batches.entries()) {
    railroad.clock.set(startOfTest + hours(2 + (index + 1) / batches.length));
    const answers = await Promise.all(batch.map((told) => send(told, turnIds)));
    for (const [place, told] of batch.entries()) {
      const answer = answers[place];
      if (answer !== undefined) received.set(told.id, [...(received.get(told.id) ?? []), answer]);
    }
  }
  return received;
}

const hours = (count: number): number => count * 3600_000;

const read = async <Body>(path: string): Promise<Body> => {
  const answer = await fetch(`${base}${path}`, { headers: { Cookie: cookies.dispatcher } });
  return (await answer.json()) as Body;
};

/** A turn without what must differ: ids of this telling, how often its row was written, and when it was heard of. */
function comparable(turn: WireTurn, telling: string, turnIds: readonly string[]): unknown {
  const { version: _version, alerts: _alerts, lastHeardAt: _heard, ...rest } = turn;
  let text = JSON.stringify(rest).replaceAll(telling, 'telling');
  for (const [index, id] of turnIds.entries()) text = text.replaceAll(id, `turn-${index}`);
  return JSON.parse(text) as unknown;
}

let tellings = 0;

/** Tells one story in one order of arrival and gives the turns as they then stand. */
async function tell(seed: number, order: number): Promise<unknown[]> {
  tellings += 1;
  const telling = `f${tellings.toString(16).padStart(7, '0')}`;
  const dispatcher = await railroad.as('dispatcher');
  railroad.clock.set(startOfTest);
  const turnIds: string[] = [];
  for (let index = 0; index < turnsInStory; index += 1) {
    const turn = await openTurn(dispatcher, {
      set: `S${telling}`,
      track: `${index + 1}`,
      arriveIn: index * 1800,
      train: `${17 + index}`,
    });
    turnIds.push(turn.id);
  }
  const { entries, batches } = tellStory({ seed, order, telling, people, turns: turnsInStory, at });
  const received = await deliver(batches, turnIds);
  for (const told of entries) expectOneReceipt(told, received.get(told.id) ?? []);
  const states: unknown[] = [];
  railroad.clock.set(startOfTest + hours(4));
  for (const id of turnIds)
    await record(dispatcher, id, anEntryRequest('note', hours(4) / 1000, { note: 'over' }));
  for (const [index, id] of turnIds.entries()) {
    const kept = await read<WireEntry[]>(`/api/turns/${id}/entries`);
    const wanted = entries.filter(({ turn }) => turn === index).map((told) => told.id);
    expect(
      kept
        .slice(0, -1)
        .map((entry) => entry.id)
        .sort(),
    ).toEqual(wanted.sort());
    states.push(comparable(await read<WireTurn>(`/api/turns/${id}`), telling, turnIds));
  }
  return states;
}

/** Taken once, the same receipt for every further try, and no receipt for something else under the same id. */
function expectOneReceipt({ id }: Told, answers: readonly Sent[]): void {
  const taken = answers.filter(({ status }) => status === 201 || status === 200);
  expect([id, answers.filter(({ status }) => status === 201).length]).toEqual([id, 1]);
  expect(new Set(taken.map(({ receipt }) => `${receipt.sequence} ${receipt.hash}`)).size).toBe(1);
  expect(answers.filter(({ status }) => ![200, 201, 409].includes(status))).toEqual([]);
}

describe('two phones, the desk, a supervisor and their retries', () => {
  test.each(Array.from({ length: stories }, (_, index) => 1000 + index))(
    'leave every turn in the same state whatever came in first, with nothing lost or doubled (story %i)',
    async (seed) => {
      const first = await tell(seed, 0);
      const others: unknown[][] = [];
      for (let order = 1; order < orders; order += 1) others.push(await tell(seed, order));
      expect(first.length).toBe(turnsInStory);
      for (const [index, other] of others.entries())
        expect([seed, index + 1, other]).toEqual([seed, index + 1, first]);
    },
  );

  test('leave one whole chain with every entry in it once', async () => {
    const text = await exportOf(await signInAs(railroad.app, 'auditor'));
    expect(verdictOf(text)).toMatchObject({ isWhole: true, faults: [] });
    const ids = linesOf(text).map((line) => (JSON.parse(line) as { id: string }).id);
    expect(new Set(ids).size).toBe(ids.length);
    expect(await railroad.app.get(ChainCheck).run()).toMatchObject({ state: 'whole', checkedTo: ids.length });
    noteSoak({
      part: 'orders of arrival',
      rounds: stories * orders,
      acknowledged: ids.length,
      lost: 0,
      doubled: 0,
      chain: 'whole',
    });
  });

  test('are told differently by every seed', () => {
    const random = seededRandom(1);
    const told = (seed: number) =>
      JSON.stringify(tellStory({ seed, order: 0, telling: '0', people, turns: 2, at }).entries);
    expect(random()).not.toBe(random());
    expect(told(1)).not.toBe(told(2));
    expect(told(1)).toBe(told(1));
  });

  test('tell of every kind that is not the inspector’s', () => {
    const kinds = new Set<unknown>();
    for (let seed = 1000; seed < 1100; seed += 1) {
      const { entries } = tellStory({ seed, order: 0, telling: 'f0', people, turns: 2, at });
      for (const { request } of entries) kinds.add(request['kind']);
    }
    expect(ENTRY_KINDS.filter((kind) => !kinds.has(kind))).toEqual(['blue-signal-up', 'blue-signal-down']);
  });
});
