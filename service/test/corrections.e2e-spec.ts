import { randomUUID } from 'node:crypto';
import type { EntryReceipt, ErrorBody, ListedCorrection, Role, WireEntry, WireTurn } from '@stubpost/shared';
import { PeopleService } from '../src/people/people.service';
import {
  type Railroad,
  aRailroad,
  addHarbor,
  anEntryRequest,
  at,
  openTurn,
  passTo,
  record,
} from './support/railroad';

let railroad: Railroad;

beforeEach(async () => {
  railroad = await aRailroad();
  await addHarbor(railroad.app);
});
afterEach(() => railroad.close());

const toTime = (seconds: number) => railroad.clock.set(Date.parse(at(seconds)));
const post = async (role: Role, turn: WireTurn, request: object) =>
  (await railroad.as(role)).agent.post(`/api/turns/${turn.id}/entries`).send(request);
const told = async (role: Role, turn: WireTurn, request: Record<string, unknown>): Promise<WireTurn> =>
  (await record(await railroad.as(role), turn.id, request)).turn;
const stepOf = (turn: WireTurn, key: string) => turn.steps.find((step) => step.key === key);
const list = async (role: Role, query: Record<string, string> = {}): Promise<ListedCorrection[]> => {
  const { agent } = await railroad.as(role);
  const answer = await agent
    .get('/api/records/corrections')
    .query({ terminal: 'HBR', ...query })
    .expect(200);
  return answer.body as ListedCorrection[];
};
const corrected = (target: string, seconds: number, fields: object = {}) => {
  const { observedAt: _, ...rest } = anEntryRequest('corrected', 0, { target, reason: 'misread', ...fields });
  return { ...rest, observedAt: at(seconds) };
};

/** A turn that left 905 s after the start, with one check in its record; now it is 1,000 s. */
async function aTurnThatLeft(): Promise<{ turn: WireTurn; check: string }> {
  const turn = await openTurn(await railroad.as('dispatcher'));
  const check = anEntryRequest('step-done', 300, { step: 'cab-brake-check' });
  toTime(310);
  await told('conductor', turn, check);
  toTime(910);
  await told('dispatcher', turn, anEntryRequest('departure', 905));
  toTime(1000);
  return { turn, check: check.id };
}

describe('a correction', () => {
  test('before the departure takes effect at once, and the log gives it as it was sent', async () => {
    const turn = await openTurn(await railroad.as('dispatcher'));
    const check = anEntryRequest('step-done', 300, { step: 'cab-brake-check' });
    toTime(310);
    await told('conductor', turn, check);
    toTime(400);
    const after = await told('conductor', turn, corrected(check.id, 240));
    expect(stepOf(after, 'cab-brake-check')).toMatchObject({ doneAt: at(240), state: 'done' });
    expect(after.corrections).toBeUndefined();
    const { agent } = await railroad.as('conductor');
    const entries = (await agent.get(`/api/turns/${turn.id}/entries`).expect(200)).body as WireEntry[];
    expect(entries.at(-1)).toMatchObject({ kind: 'corrected', observedAt: at(240), madeAt: at(400) });
    expect(entries.at(-1)).not.toHaveProperty('correctedObservedAt');
    expect(entries[0]).toMatchObject({ kind: 'step-done', observedAt: at(300) });
  });

  test('after the departure waits, is listed old beside new, and takes effect when a supervisor approves it', async () => {
    const { turn, check } = await aTurnThatLeft();
    const asked = corrected(check, 240);
    const waiting = await told('conductor', turn, asked);
    expect(stepOf(waiting, 'cab-brake-check')?.doneAt).toBe(at(300));
    expect(await list('supervisor')).toMatchObject([
      {
        ...{ turnId: turn.id, entryId: asked.id, target: check, kind: 'corrected', state: 'waiting' },
        ...{ what: 'cab-brake-check', whatLabel: 'Cab brake check', track: '3', outboundTrain: '1742' },
        ...{ oldAt: at(300), newAt: at(240), askedAt: at(1000), reason: 'misread' },
      },
    ]);
    toTime(1100);
    const approved = await told(
      'supervisor',
      turn,
      anEntryRequest('correction-approved', 1100, { target: asked.id }),
    );
    expect(stepOf(approved, 'cab-brake-check')?.doneAt).toBe(at(240));
    const supervisor = await railroad.as('supervisor');
    expect(approved.corrections).toMatchObject([
      { state: 'approved', decidedAt: at(1100), decidedBy: { personId: supervisor.personId } },
    ]);
    expect(await list('supervisor')).toEqual([]);
    expect(await list('auditor', { state: 'all' })).toMatchObject([{ entryId: asked.id, state: 'approved' }]);
  });

  test('that is declined keeps the record and says why', async () => {
    const { turn, check } = await aTurnThatLeft();
    const asked = corrected(check, 240);
    await told('conductor', turn, asked);
    const declined = await told(
      'supervisor',
      turn,
      anEntryRequest('correction-declined', 1010, { target: asked.id, reason: 'the recorder says 17:25' }),
    );
    expect(stepOf(declined, 'cab-brake-check')?.doneAt).toBe(at(300));
    expect(declined.corrections).toMatchObject([
      { state: 'declined', declinedBecause: 'the recorder says 17:25' },
    ]);
    expect(await list('dispatcher')).toEqual([]);
  });

  test("of somebody else's entry may be asked for by the crew once the train has left, not before", async () => {
    const turn = await openTurn(await railroad.as('dispatcher'));
    const check = anEntryRequest('step-done', 300, { step: 'cab-brake-check', source: 'by-radio' });
    toTime(310);
    await told('dispatcher', turn, check);
    const early = await post('conductor', turn, corrected(check.id, 240));
    expect([early.status, (early.body as ErrorBody).code]).toEqual([403, 'entry.not_yours']);
    await told('dispatcher', turn, anEntryRequest('departure', 905));
    toTime(1000);
    const late = await post('conductor', turn, corrected(check.id, 240));
    expect(late.status).toBe(201);
    const departure = (await told('dispatcher', turn, anEntryRequest('departure', 906))).id;
    expect(departure).toBe(turn.id);
  });

  test('is one entry and one receipt when it is sent again, also without a time of its own', async () => {
    const { turn, check } = await aTurnThatLeft();
    const asked = corrected(check, 240);
    const first = await post('conductor', turn, asked);
    toTime(1500);
    const second = await post('conductor', turn, asked);
    expect([first.status, second.status]).toEqual([201, 200]);
    const [one, other] = [first.body as EntryReceipt, second.body as EntryReceipt];
    expect([other.sequence, other.hash]).toEqual([one.sequence, one.hash]);
    const changed = await post('conductor', turn, { ...asked, observedAt: at(250) });
    expect([changed.status, (changed.body as ErrorBody).code]).toEqual([409, 'entry.id_taken']);
  });
});

describe('a decision on a correction', () => {
  test('is never by the person who asked, in words', async () => {
    const { turn, check } = await aTurnThatLeft();
    const asked = corrected(check, 240);
    await told('supervisor', turn, asked);
    for (const kind of ['correction-approved', 'correction-declined']) {
      const reason = kind === 'correction-declined' ? { reason: 'no' } : {};
      const answer = await post(
        'supervisor',
        turn,
        anEntryRequest(kind, 1010, { target: asked.id, ...reason }),
      );
      expect(answer.status).toBe(403);
      expect(answer.body).toMatchObject({ code: 'entry.own_request' });
    }
    expect(await list('supervisor')).toHaveLength(1);
  });

  test.each<Role>(['conductor', 'engineer', 'dispatcher', 'inspector'])('is not for a %s', async (role) => {
    const { turn, check } = await aTurnThatLeft();
    const asked = corrected(check, 240);
    await told('conductor', turn, asked);
    const answer = await post(role, turn, anEntryRequest('correction-approved', 1010, { target: asked.id }));
    expect([answer.status, (answer.body as ErrorBody).code]).toEqual([403, 'entry.kind_not_permitted']);
  });

  test('by two supervisors at once leaves both in the log and one answer for everybody', async () => {
    const { turn, check } = await aTurnThatLeft();
    const asked = corrected(check, 240);
    await told('conductor', turn, asked);
    const decisions = [
      anEntryRequest('correction-approved', 1010, { target: asked.id }),
      anEntryRequest('correction-declined', 1012, { target: asked.id, reason: 'no' }),
    ];
    const answers = await Promise.all(decisions.map((each) => post('supervisor', turn, each)));
    expect(answers.map((answer) => answer.status)).toEqual([201, 201]);
    expect(await list('auditor', { state: 'all' })).toMatchObject([{ state: 'declined' }]);
  });
});

describe('the list of corrections', () => {
  test('is for supervisor, dispatcher and auditor, and only for their terminal', async () => {
    const allowed: Role[] = ['supervisor', 'dispatcher', 'auditor'];
    const others: Role[] = ['conductor', 'engineer', 'inspector', 'planner', 'analyst', 'administrator'];
    for (const role of [...allowed, ...others]) {
      const { agent } = await railroad.as(role);
      const answer = await agent.get('/api/records/corrections').query({ terminal: 'HBR' });
      expect([role, answer.status]).toEqual([role, allowed.includes(role) ? 200 : 403]);
    }
    const { agent } = await railroad.as('supervisor');
    await agent.get('/api/records/corrections').query({ terminal: 'HBR', state: 'lost' }).expect(400);
    await agent.get('/api/records/corrections').expect(400);
  });
});

describe('a withdrawal', () => {
  test('within ten seconds is an undo, also after the departure', async () => {
    const { turn } = await aTurnThatLeft();
    const test = anEntryRequest('step-done', 995, { step: 'running-test' });
    await told('conductor', turn, test);
    toTime(1006);
    const undone = await told(
      'conductor',
      turn,
      anEntryRequest('withdrawn', 1004, { target: test.id, reason: 'undo' }),
    );
    expect(stepOf(undone, 'running-test')?.doneAt).toBeNull();
    expect(undone.corrections).toBeUndefined();
  });

  test('of the departure by the desk needs nobody', async () => {
    const { turn } = await aTurnThatLeft();
    const { agent } = await railroad.as('dispatcher');
    const entries = (await agent.get(`/api/turns/${turn.id}/entries`)).body as WireEntry[];
    const left = entries.find((entry) => entry.kind === 'departure');
    const back = await told(
      'dispatcher',
      turn,
      anEntryRequest('withdrawn', 1000, { target: left?.id, reason: 'wrong train' }),
    );
    expect(back.outbound?.actualDepartureAt).toBeNull();
  });
});

describe('a ruling', () => {
  test('by the desk settles which account counts; the crew may not rule', async () => {
    const turn = await openTurn(await railroad.as('dispatcher'));
    toTime(500);
    const byHand = anEntryRequest('step-done', 300, { step: 'cab-brake-check' });
    const byRadio = anEntryRequest('step-done', 420, {
      ...{ step: 'cab-brake-check', source: 'by-radio', saidBy: 'Varga' },
    });
    await told('conductor', turn, byHand);
    const questioned = await told('dispatcher', turn, byRadio);
    expect(questioned.inQuestion?.[0]?.accounts.map((account) => account.entryId)).toEqual([
      byHand.id,
      byRadio.id,
    ]);
    const ruling = { target: byRadio.id, considered: [byHand.id, byRadio.id] };
    expect((await post('conductor', turn, anEntryRequest('ruled', 500, ruling))).status).toBe(403);
    const ruled = await told('dispatcher', turn, anEntryRequest('ruled', 500, ruling));
    expect(ruled.inQuestion).toBeUndefined();
    expect(stepOf(ruled, 'cab-brake-check')).toMatchObject({ doneAt: at(420), state: 'done' });
  });
});

describe('what the desk wrote by radio', () => {
  test('asks the crew, who agree or put it in question', async () => {
    const turn = await openTurn(await railroad.as('dispatcher'));
    toTime(500);
    const byRadio = anEntryRequest('step-done', 420, {
      ...{ step: 'cab-brake-check', source: 'by-radio', saidBy: 'Varga' },
    });
    const asks = await told('dispatcher', turn, byRadio);
    expect(asks.asksAgreement).toMatchObject([{ entryId: byRadio.id, step: 'cab-brake-check' }]);
    const no = await told(
      'conductor',
      turn,
      anEntryRequest('disagreed', 500, { target: byRadio.id, reason: 'not tested' }),
    );
    expect(stepOf(no, 'cab-brake-check')?.state).toBe('in-question');
    expect(no.asksAgreement).toBeUndefined();
    const yes = await told('conductor', turn, anEntryRequest('agreed', 510, { target: byRadio.id }));
    expect(stepOf(yes, 'cab-brake-check')?.state).toBe('done');
    expect(
      (await post('dispatcher', turn, anEntryRequest('agreed', 510, { target: byRadio.id }))).status,
    ).toBe(403);
  });
});

describe('a relief', () => {
  test('is face to face when both have said so; until then the test it calls for is named', async () => {
    const turn = await openTurn(await railroad.as('dispatcher'));
    const engineer = await railroad.as('engineer');
    const { id: comes } = await railroad.app.get(PeopleService).add({
      ...{ email: 'comes@example.org', name: 'L. Stroud' },
      roles: [{ role: 'engineer', terminal: 'HBR' }],
    });
    toTime(500);
    const relief = anEntryRequest('relief', 480, {
      ...{ out: engineer.personId, in: comes, as: 'engineer', faceToFace: true },
    });
    const asked = await told('engineer', turn, relief);
    expect(asked.reliefs).toMatchObject([{ faceToFace: false, awaits: comes }]);
    expect(asked.findings.join(' ')).toContain('49 CFR 238.317(a)(5)');
    const byDesk = { ...relief, id: randomUUID(), observedAt: at(490) };
    expect((await told('dispatcher', turn, byDesk)).reliefs).toHaveLength(1);
  });
});

describe('a bad-order report and a tie-up', () => {
  test('are kept on the turn in the words of their lists', async () => {
    const turn = await openTurn(await railroad.as('dispatcher'));
    toTime(500);
    const defect = anEntryRequest('defect', 480, { car: '1412', cause: 'door', note: 'leaf 2 sticks' });
    expect((await told('inspector', turn, defect)).defects).toMatchObject([
      { car: '1412', cause: 'door', note: 'leaf 2 sticks' },
    ]);
    const strange = { car: '1412', cause: 'haunted' };
    expect((await post('conductor', turn, anEntryRequest('defect', 480, strange))).status).toBe(400);
    const tieUp = { handbrakes: { count: 2, cars: ['1412'] }, checks: ['lights', 'doors'], offAir: true };
    const tied = await told('conductor', turn, anEntryRequest('tied-up', 500, tieUp));
    expect(tied.tiedUp).toMatchObject(tieUp);
    expect((await post('inspector', turn, anEntryRequest('tied-up', 500, tieUp))).status).toBe(403);
    await passTo(railroad, 505);
  });
});
