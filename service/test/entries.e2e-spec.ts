import { createHash, randomUUID } from 'node:crypto';
import type { EntryReceipt, WireEntry, WireTurn } from '@stubpost/shared';
import { Reader } from '../src/database/reader';
import { UnitOfWork } from '../src/database/unit-of-work';
import { PeopleService } from '../src/people/people.service';
import { TerminalsService } from '../src/terminals/terminals.service';
import { signInAs } from './support/sign-in';
import {
  type Railroad,
  aRailroad,
  addHarbor,
  anEntryRequest,
  at,
  openTurn,
  record,
} from './support/railroad';

let railroad: Railroad;

beforeEach(async () => {
  railroad = await aRailroad();
  await addHarbor(railroad.app);
});
afterEach(() => railroad.close());

const open = async (options: Parameters<typeof openTurn>[1] = {}): Promise<WireTurn> =>
  openTurn(await railroad.as('dispatcher'), options);
const post = async (role: Parameters<Railroad['as']>[0], turn: WireTurn, request: object) =>
  (await railroad.as(role)).agent.post(`/api/turns/${turn.id}/entries`).send(request);
const toTime = (seconds: number) => railroad.clock.set(Date.parse(at(seconds)));

describe('an entry', () => {
  test('carries who wrote it, who said it, how it is known, when it was seen and when it came in', async () => {
    const turn = await open();
    toTime(100);
    const dispatcher = await railroad.as('dispatcher');
    await record(
      dispatcher,
      turn.id,
      anEntryRequest('step-done', 60, {
        step: 'handbrake-set',
        source: 'by-radio',
        saidBy: 'Conductor Ortiz',
        clockOffsetMilliseconds: -120,
        reading: { count: 2, cars: ['5512', '5513'] },
      }),
    );
    const answer = await dispatcher.agent.get(`/api/turns/${turn.id}/entries`).expect(200);
    expect(answer.body).toMatchObject([
      {
        sequence: 1,
        kind: 'step-done',
        step: 'handbrake-set',
        observedAt: at(60),
        receivedAt: at(100),
        source: 'by-radio',
        by: { id: dispatcher.personId, name: dispatcher.name },
        saidBy: 'Conductor Ortiz',
        clockOffsetMilliseconds: -120,
        reading: { count: 2, cars: ['5512', '5513'] },
      },
    ]);
  });

  test('sent twice is one entry with one receipt', async () => {
    const turn = await open();
    const request = anEntryRequest('arrival', 0);
    const first = await post('conductor', turn, request);
    toTime(60);
    const second = await post('conductor', turn, { ...request, observedAt: '2026-03-03T17:20:00-05:00' });
    expect([first.status, second.status]).toEqual([201, 200]);
    const [one, two] = [first.body as EntryReceipt, second.body as EntryReceipt];
    expect([two.sequence, two.hash]).toEqual([one.sequence, one.hash]);
    expect(two.turn.version).toBe(one.turn.version);
  });

  test('is refused when another one has its id: other body, other writer, other turn', async () => {
    const turn = await open();
    const request = anEntryRequest('arrival', 0);
    await post('conductor', turn, request);
    const others = [
      await post('conductor', turn, { ...request, observedAt: at(1) }),
      await post('dispatcher', turn, request),
      await post('conductor', await open({ train: '2' }), request),
    ];
    for (const other of others) {
      expect(other.status).toBe(409);
      expect(other.body).toMatchObject({ code: 'entry.id_taken' });
    }
  });

  test('sent many times at once is still one entry', async () => {
    const turn = await open();
    const conductor = await railroad.as('conductor');
    const request = anEntryRequest('arrival', 0);
    const answers = await Promise.all(
      Array.from({ length: 20 }, () => conductor.agent.post(`/api/turns/${turn.id}/entries`).send(request)),
    );
    expect(answers.filter((answer) => answer.status === 201)).toHaveLength(1);
    expect(answers.filter((answer) => answer.status === 200)).toHaveLength(19);
    expect(new Set(answers.map((answer) => (answer.body as EntryReceipt).hash)).size).toBe(1);
  });

  test('that two people record at once is recorded for both', async () => {
    const turn = await open();
    const answers = await Promise.all([
      post('conductor', turn, anEntryRequest('arrival', 0)),
      post('dispatcher', turn, anEntryRequest('arrival', 30, { source: 'by-radio', saidBy: 'Ortiz' })),
    ]);
    expect(answers.map((answer) => answer.status)).toEqual([201, 201]);
    const versions = answers.map((answer) => (answer.body as EntryReceipt).turn.version).sort();
    expect(versions).toEqual([turn.version + 1, turn.version + 2]);
    const after = await (await railroad.as('conductor')).agent.get(`/api/turns/${turn.id}`);
    expect((after.body as WireTurn).inbound?.actualArrivalAt).toBe(at(0));
  });

  test('is never refused for what it says: out of order, too early, a smaller count, after the departure', async () => {
    const turn = await open();
    const requests = [
      anEntryRequest('step-done', 0, { step: 'leaving-end-test' }),
      anEntryRequest('departure', 5),
      anEntryRequest('step-done', 10, { step: 'handbrake-set', reading: { count: 2 } }),
      anEntryRequest('step-done', 20, { step: 'handbrake-released', reading: { count: 1 } }),
      anEntryRequest('withdrawn', 20, { target: randomUUID(), reason: 'wrong step' }),
      anEntryRequest('blue-signal-up', 30),
    ];
    for (const request of requests) {
      const role = request['kind'] === 'blue-signal-up' ? 'inspector' : 'dispatcher';
      expect((await post(role, turn, request)).status).toBe(201);
    }
    const after = await (await railroad.as('dispatcher')).agent.get(`/api/turns/${turn.id}`);
    const findings = (after.body as WireTurn).findings.join('\n');
    expect(findings).toContain('1 of 2 handbrakes released');
    expect(findings).toContain('Left at');
  });

  test.each([
    ['no id', { id: undefined }, 'request.invalid'],
    ['a kind nobody knows', { kind: 'hopping' }, 'request.invalid'],
    ['a field nobody knows', { colour: 'red' }, 'request.invalid'],
    ['a time without a zone', { observedAt: '2026-03-03T17:20:00' }, 'request.invalid'],
    ['a step nobody knows', { kind: 'step-done', step: 'dance' }, 'entry.step_unknown'],
    ['a person nobody knows', { kind: 'crew', person: 'nobody', as: 'engineer' }, 'entry.person_unknown'],
    ['half a character', { kind: 'note', note: 'a\ud800' }, 'request.invalid'],
  ])('with %s cannot be read', async (_, fields, code) => {
    const answer = await post('conductor', await open(), { ...anEntryRequest('arrival', 0), ...fields });
    expect(answer.status).toBe(400);
    expect(answer.body).toMatchObject({ code });
  });

  test('needs somebody who is signed in, a role that records its kind, and a turn', async () => {
    const turn = await open();
    const arrival = () => anEntryRequest('arrival', 0);
    const stranger = await signInAs(railroad.app, null);
    await stranger.agent.post(`/api/turns/${turn.id}/entries`).send(arrival()).expect(403);
    await railroad.app.get(TerminalsService).add({ code: 'CAM', name: 'Camden', zone: 'America/New_York' });
    const elsewhere = await signInAs(railroad.app, 'dispatcher', 'CAM');
    const refused = await elsewhere.agent.post(`/api/turns/${turn.id}/entries`).send(arrival()).expect(403);
    expect(refused.body).toMatchObject({ code: 'entry.kind_not_permitted' });
    const hold = anEntryRequest('hold', 0, { until: at(60), reason: 'Connection' });
    expect((await post('conductor', turn, hold)).body).toMatchObject({ code: 'entry.kind_not_permitted' });
    expect((await post('inspector', turn, arrival())).status).toBe(403);
    expect((await post('administrator', turn, arrival())).status).toBe(403);
    expect((await post('conductor', { ...turn, id: randomUUID() }, arrival())).body).toMatchObject({
      code: 'turn.unknown',
    });
  });
});

describe('taking back', () => {
  test('an own entry works until the departure, and then waits for a supervisor', async () => {
    const turn = await open();
    const done = anEntryRequest('step-done', 60, { step: 'handbrake-set', reading: { count: 1 } });
    await post('conductor', turn, done);
    const back = await post(
      'conductor',
      turn,
      anEntryRequest('withdrawn', 65, { target: done.id, reason: 'wrong step' }),
    );
    const step = (back.body as EntryReceipt).turn.steps.find((each) => each.key === 'handbrake-set');
    expect(step?.state).toBe('withdrawn');
    const again = anEntryRequest('step-done', 70, { step: 'handbrake-set', reading: { count: 1 } });
    await post('conductor', turn, again);
    await post('conductor', turn, anEntryRequest('departure', 900));
    const late = await post(
      'conductor',
      turn,
      anEntryRequest('withdrawn', 905, { target: again.id, reason: 'other' }),
    );
    expect(late.status).toBe(201);
    const asked = (late.body as EntryReceipt).turn;
    expect(asked.corrections).toMatchObject([{ what: 'handbrake-set', state: 'waiting' }]);
    expect(asked.steps.find((each) => each.key === 'handbrake-set')?.doneAt).toBe(at(70));
    const before = await post(
      'conductor',
      turn,
      anEntryRequest('withdrawn', 890, { target: again.id, reason: 'other' }),
    );
    expect(before.status).toBe(201);
  });

  test('the entry of another is for the desk', async () => {
    const turn = await open();
    const done = anEntryRequest('arrival', 0);
    await post('dispatcher', turn, done);
    const withdrawal = () => anEntryRequest('withdrawn', 5, { target: done.id, reason: 'other' });
    expect((await post('conductor', turn, withdrawal())).body).toMatchObject({ code: 'entry.not_yours' });
    expect((await post('dispatcher', turn, withdrawal())).status).toBe(201);
  });

  test('is the same whatever came in first, over every order of one story', async () => {
    const told = (): (Record<string, unknown> & { id: string })[] => {
      const set = anEntryRequest('step-done', 60, { step: 'handbrake-set', reading: { count: 2 } });
      const other = anEntryRequest('step-done', 75, {
        step: 'handbrake-set',
        source: 'by-radio',
        saidBy: 'Ortiz',
        reading: { count: 1 },
      });
      return [
        anEntryRequest('arrival', 0),
        set,
        other,
        anEntryRequest('withdrawn', 80, { target: set.id, reason: 'wrong train' }),
      ];
    };
    const seen = new Set<string>();
    for (const order of permutations([0, 1, 2, 3])) {
      const turn = await open({ track: '3', train: '7' });
      const entries = told();
      let last: WireTurn = turn;
      for (const index of order) {
        const answer = await post('dispatcher', turn, entries[index] ?? {});
        expect(answer.status).toBe(201);
        last = (answer.body as EntryReceipt).turn;
      }
      seen.add(withoutIds(last));
    }
    expect(seen.size).toBe(1);
  });
});

describe('the engineer of a turn', () => {
  const onTurn = async () => {
    const turn = await open({ set: 'A' });
    const engineer = await railroad.as('engineer');
    await record(engineer, turn.id, anEntryRequest('crew', 0, { person: engineer.personId, as: 'engineer' }));
    return turn;
  };

  test('never records the running test or the own arrival in the cab at the time', async () => {
    const turn = await onTurn();
    for (const step of ['engineer-in-cab', 'running-test']) {
      const answer = await post('engineer', turn, anEntryRequest('step-done', 10, { step }));
      expect(answer.status).toBe(403);
      expect(answer.body).toMatchObject({ code: 'entry.at_the_controls' });
    }
    expect(
      (await post('engineer', turn, anEntryRequest('step-done', 10, { step: 'cab-brake-check' }))).status,
    ).toBe(201);
    expect(
      (await post('conductor', turn, anEntryRequest('step-done', 20, { step: 'engineer-in-cab' }))).status,
    ).toBe(201);
  });

  test('records nothing from the cab on until the set has come in somewhere, and later enters it later', async () => {
    const turn = await onTurn();
    await post('conductor', turn, anEntryRequest('step-done', 600, { step: 'engineer-in-cab' }));
    toTime(700);
    const atControls = await post('engineer', turn, anEntryRequest('note', 700, { note: 'ready' }));
    expect(atControls.body).toMatchObject({ code: 'entry.at_the_controls' });
    const next = await open({ set: 'A', arriveIn: 3600, train: '1750' });
    await post('conductor', next, anEntryRequest('arrival', 3590));
    toTime(3700);
    const later = anEntryRequest('step-done', 1200, { step: 'running-test', source: 'entered-later' });
    expect((await post('engineer', turn, later)).status).toBe(201);
  });
});

describe('the crew of a set', () => {
  test('is carried over to its next turn until somebody says otherwise', async () => {
    const { personId, name } = await railroad.as('conductor');
    const first = await open({ set: 'B' });
    const second = await open({ set: 'B', arriveIn: 3600, train: '1750' });
    const third = await open({ set: 'B', arriveIn: 7200, train: '1760' });
    await post('conductor', first, anEntryRequest('crew', 0, { person: personId, as: 'conductor' }));
    const look = async (turn: WireTurn) =>
      (await (await railroad.as('dispatcher')).agent.get(`/api/turns/${turn.id}`)).body as WireTurn;
    const crew = [{ as: 'conductor', personId, name }];
    expect([(await look(second)).crew, (await look(third)).crew]).toEqual([crew, crew]);
    const other = await railroad.app.get(PeopleService).add({
      email: 'other@example.org',
      name: 'Other',
      roles: [{ role: 'conductor', terminal: 'HBR' }],
    });
    await post('dispatcher', second, anEntryRequest('crew', 5, { person: other.id, as: 'conductor' }));
    expect((await look(third)).crew).toEqual([{ as: 'conductor', personId: other.id, name: 'Other' }]);
    expect((await look(first)).crew).toEqual(crew);
    await post('dispatcher', second, anEntryRequest('set', 6, { set: 'C' }));
    expect((await look(third)).crew).toEqual(crew);
  });

  test('does not wait over night', async () => {
    const { personId } = await railroad.as('conductor');
    const first = await open({ set: 'B' });
    await post('conductor', first, anEntryRequest('crew', 0, { person: personId, as: 'conductor' }));
    const morning = await open({ set: 'B', arriveIn: 6 * 3600, train: '1750' });
    expect(morning.crew).toEqual([]);
  });
});

describe('the log', () => {
  test('is a chain that anybody can work out again', async () => {
    const turn = await open();
    for (const seconds of [0, 10, 20]) {
      await post(
        'conductor',
        turn,
        anEntryRequest('note', seconds, { note: `Zürich → ${seconds} "quoted" \u2028` }),
      );
    }
    const rows = await railroad.app
      .get(Reader)
      .query<Record<string, string | number>>('SELECT * FROM entry ORDER BY sequence');
    const sha256 = (text: string) => createHash('sha256').update(text).digest('hex');
    let previous = '0'.repeat(64);
    for (const [index, row] of rows.entries()) {
      expect(row['sequence']).toBe(index + 1);
      expect(row['previous_hash']).toBe(previous);
      const bodyHash = sha256(sorted(JSON.parse(String(row['body']))));
      expect(row['body_hash']).toBe(bodyHash);
      previous = sha256(
        sorted({
          previousHash: previous,
          sequence: row['sequence'],
          id: row['id'],
          receivedAt: new Date(Number(row['received_at'])).toISOString(),
          bodyHash,
        }),
      );
      expect(row['hash']).toBe(previous);
    }
    expect(rows).toHaveLength(3);
    const listed = await (await railroad.as('conductor')).agent.get(`/api/turns/${turn.id}/entries`);
    expect((listed.body as WireEntry[]).at(-1)?.hash).toBe(previous);
  });

  test('lets nobody change or delete an entry', async () => {
    await post('conductor', await open(), anEntryRequest('arrival', 0));
    const run = (sql: string) => railroad.app.get(UnitOfWork).run((transaction) => transaction.execute(sql));
    await expect(run(`UPDATE entry SET body = '{}'`)).rejects.toThrow('never changed');
    await expect(run('DELETE FROM entry')).rejects.toThrow('never deleted');
  });
});

function permutations(items: number[]): number[][] {
  if (items.length < 2) return [items];
  return items.flatMap((item) =>
    permutations(items.filter((other) => other !== item)).map((rest) => [item, ...rest]),
  );
}

/** A turn without what differs from one telling of the story to the next. */
function withoutIds(turn: WireTurn): string {
  const ids = new Set(['id', 'entryId', 'target']);
  return JSON.stringify(turn, (key, value: unknown) => (ids.has(key) ? null : value));
}

/** JSON with sorted members, written apart from the code under test. */
function sorted(value: unknown): string {
  return JSON.stringify(value, (_, each: unknown) =>
    typeof each === 'object' && each !== null && !Array.isArray(each)
      ? Object.fromEntries(Object.entries(each).sort(([a], [b]) => (a < b ? -1 : 1)))
      : each,
  );
}
