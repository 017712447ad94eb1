import { cpSync, mkdtempSync, rmSync } from 'node:fs';
import os from 'node:os';
import path from 'node:path';
import { alertSchema, type WireAlert, type WireTurn } from '@stubpost/shared';
import { Reader } from '../src/database/reader';
import { UnitOfWork } from '../src/database/unit-of-work';
import { SweepHeartbeat } from '../src/health/sweep-heartbeat';
import { TurnSweepJob } from '../src/turns/turn-sweep.job';
import { TurnSweep } from '../src/turns/turn-sweep.service';
import { listen } from './support/live';
import { agentFor } from './support/sign-in';
import {
  type Railroad,
  aRailroad,
  addHarbor,
  alertsOf,
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

/** A turn of 10 min that has come in, and nothing since: short from about 155 s on. */
async function aForgottenTurn(): Promise<WireTurn> {
  const turn = await openTurn(await railroad.as('dispatcher'), { layoverSeconds: 600 });
  const receipt = await record(await railroad.as('conductor'), turn.id, anEntryRequest('arrival', 0));
  return receipt.turn;
}

const say = async (turn: WireTurn, kind: string, seconds: number, fields: Record<string, unknown> = {}) =>
  (await record(await railroad.as('dispatcher'), turn.id, anEntryRequest(kind, seconds, fields))).turn;

const look = async (turn: WireTurn): Promise<WireTurn> => {
  const dispatcher = await railroad.as('dispatcher');
  return (await dispatcher.agent.get(`/api/turns/${turn.id}`).expect(200)).body as WireTurn;
};

describe('a turn with a step left out', () => {
  test('raises exactly one late departure, with what to do and who', async () => {
    const turn = await aForgottenTurn();
    await passTo(railroad, 180);
    expect(await alertsOf(railroad, 'all')).toEqual([]);
    await passTo(railroad, 240);
    const alerts = await alertsOf(railroad, 'all');
    expect(alerts).toHaveLength(1);
    const [alert] = alerts;
    expect(alertSchema.parse(alert)).toEqual(alert);
    expect(alert).toMatchObject({
      cause: 'late-departure',
      state: 'raised',
      priority: 'watch',
      turnId: turn.id,
      subject: 'Track 3, train 1742',
      text: expect.stringContaining('Handbrake set not recorded') as string,
      action: expect.stringContaining('Call the conductor') as string,
      actor: expect.stringContaining('dispatcher') as string,
    });
    expect(alert?.lines.length).toBeGreaterThan(1);
    expect(await look(turn)).toMatchObject({ health: 'short', alerts: [{ id: alert?.id }] });
  });

  test('is told over the live stream, the alert and the turn that shows it', async () => {
    const turn = await aForgottenTurn();
    const stream = await listen(railroad.app, (await railroad.as('dispatcher')).personId);
    await stream.next((event) => event.event === 'beat');
    await passTo(railroad, 190);
    const alert = await stream.next((event) => event.event === 'alert');
    const shown = await stream.next((event) => event.event === 'turn');
    stream.close();
    expect(alert.data).toEqual((await alertsOf(railroad))[0]);
    expect(shown.data).toMatchObject({ id: turn.id, alerts: [{ cause: 'late-departure' }] });
  });

  test('clears 10 s after enough time to spare was won back', async () => {
    const turn = await aForgottenTurn();
    await passTo(railroad, 240);
    await say(turn, 'step-done', 100, { step: 'handbrake-set', reading: { count: 1 } });
    await say(turn, 'step-done', 160, { step: 'cab-brake-check' });
    await say(turn, 'step-done', 240, { step: 'ends-changed' });
    expect(await alertsOf(railroad)).toMatchObject([{ cause: 'late-departure', state: 'raised' }]);
    await passTo(railroad, 245);
    expect(await alertsOf(railroad)).toHaveLength(1);
    await passTo(railroad, 250);
    expect(await alertsOf(railroad)).toEqual([]);
    expect(await alertsOf(railroad, 'cleared')).toMatchObject([
      { cause: 'late-departure', clearedAt: at(250) },
    ]);
    expect((await look(turn)).alerts).toEqual([]);
  });

  test('clears at once when the train has left', async () => {
    const turn = await aForgottenTurn();
    await passTo(railroad, 240);
    const left = await say(turn, 'departure', 240);
    expect(left.alerts.map((alert) => alert.cause)).not.toContain('late-departure');
    expect(await alertsOf(railroad, 'cleared')).toMatchObject([{ cause: 'late-departure' }]);
  });

  test('clears at once when the turn is annulled', async () => {
    const turn = await aForgottenTurn();
    await passTo(railroad, 240);
    const annulled = await say(turn, 'annulled', 240, { reason: 'Set out of order' });
    expect(annulled).toMatchObject({ state: 'annulled', alerts: [] });
    await passTo(railroad, 400);
    expect(await alertsOf(railroad)).toEqual([]);
  });

  test('is not cleared by a record that wins no time back', async () => {
    const turn = await aForgottenTurn();
    await passTo(railroad, 240);
    const ticked = await say(turn, 'step-done', 238, { step: 'handbrake-set', reading: { count: 1 } });
    expect(ticked.alerts).toMatchObject([{ cause: 'late-departure' }]);
  });

  test('that comes back after clearing is a new alert with a pointer to the old one', async () => {
    const turn = await aForgottenTurn();
    await passTo(railroad, 240);
    await say(turn, 'hold', 240, { until: at(1200), reason: 'Connection' });
    await passTo(railroad, 260);
    expect(await alertsOf(railroad)).toEqual([]);
    await say(turn, 'hold', 261, { until: at(600), reason: 'Connection gone' });
    await passTo(railroad, 300);
    const [old] = await alertsOf(railroad, 'cleared');
    const standing = await alertsOf(railroad);
    expect(standing.filter((alert) => alert.cause === 'late-departure')).toMatchObject([
      { state: 'raised', previousId: old?.id },
    ]);
  });
});

describe('the sweep', () => {
  const count = async (table: string): Promise<number> =>
    (await railroad.app.get(Reader).query<{ n: number }>(`SELECT count(*) AS n FROM ${table}`))[0]?.n ?? -1;

  test('does nothing twice', async () => {
    await aForgottenTurn();
    await passTo(railroad, 240);
    const before = [await count('alert'), await count('change')];
    const sweep = railroad.app.get(TurnSweep);
    await Promise.all([sweep.sweep(railroad.clock.now()), sweep.sweep(railroad.clock.now())]);
    await sweep.sweep(railroad.clock.now());
    expect([await count('alert'), await count('change')]).toEqual(before);
  });

  test('never overlaps itself', () => {
    const sweep = railroad.app.get(TurnSweep);
    const first = sweep.sweep(railroad.clock.now());
    expect(sweep.sweep(railroad.clock.now())).toBe(first);
    return first;
  });

  test('catches up after a pause from what is in the tables', async () => {
    const turn = await aForgottenTurn();
    await passTo(railroad, 170);
    railroad.clock.set(Date.parse(at(290)));
    await railroad.app.get(TurnSweep).sweep(railroad.clock.now());
    expect(await alertsOf(railroad)).toMatchObject([
      { cause: 'late-departure', turnId: turn.id, raisedAt: at(290) },
    ]);
  });

  test('goes on after a stop without warning as if nothing had been', async () => {
    const turn = await aForgottenTurn();
    await passTo(railroad, 165);
    const dataDir = mkdtempSync(path.join(os.tmpdir(), 'stubpost-killed-'));
    cpSync(railroad.dataDir, dataDir, { recursive: true });
    await railroad.close();
    railroad = await aRailroad({ dataDir, at: Date.parse(at(165)) });
    await passTo(railroad, 200);
    const alerts = await alertsOf(railroad, 'all');
    expect(alerts).toMatchObject([{ cause: 'late-departure', turnId: turn.id, state: 'raised' }]);
    expect(Date.parse(alerts[0]?.raisedAt ?? '')).toBeLessThanOrEqual(Date.parse(at(190)));
    rmSync(dataDir, { recursive: true, force: true });
  });

  test('lets go of a turn of which everything is recorded, and of one that nobody closed after a day', async () => {
    const turn = await openTurn(await railroad.as('dispatcher'));
    await say(turn, 'arrival', 0);
    const steps = turn.steps.map((step) => step.key);
    for (const [index, step] of steps.entries()) {
      if (step === 'running-test') await say(turn, 'departure', 890);
      const reading = step.startsWith('handbrake') ? { reading: { count: 1 } } : {};
      await say(turn, 'step-done', 60 + index * 115, { step, ...reading });
    }
    expect(await look(turn)).toMatchObject({ state: 'closed' });
    const forgotten = await openTurn(await railroad.as('dispatcher'), { train: '99' });
    const unsettled = () =>
      railroad.app.get(Reader).query<{ id: string }>('SELECT id FROM turn WHERE settled_at IS NULL');
    expect(await unsettled()).toEqual([{ id: forgotten.id }]);
    railroad.clock.advance(25 * 3600);
    await railroad.app.get(TurnSweep).sweep(railroad.clock.now());
    expect(await unsettled()).toEqual([]);
    const { personId } = await railroad.as('dispatcher');
    const nextDay = await agentFor(railroad.app, personId);
    const answer = await nextDay.get(`/api/turns/${forgotten.id}`).expect(200);
    expect(answer.body).toMatchObject({ state: 'closed' });
  });

  test('looks at all the others when one turn cannot be read, and then counts as failed', async () => {
    const broken = await openTurn(await railroad.as('dispatcher'), { train: '1' });
    await railroad.app
      .get(UnitOfWork)
      .run((transaction) =>
        transaction.execute("UPDATE turn SET plan_id = 'gone', version = version + 1 WHERE id = ?", [
          broken.id,
        ]),
      );
    const turn = await aForgottenTurn();
    const sweep = railroad.app.get(TurnSweep);
    for (const seconds of [160, 200]) {
      railroad.clock.set(Date.parse(at(seconds)));
      await expect(sweep.sweep(railroad.clock.now())).rejects.toThrow('1 turns could not be looked at');
    }
    expect(await alertsOf(railroad)).toMatchObject([{ cause: 'late-departure', turnId: turn.id }]);
    const heartbeat = railroad.app.get(SweepHeartbeat);
    const before = heartbeat.lastSweepAt;
    await railroad.app.get(TurnSweepJob).tick();
    expect(heartbeat.lastSweepAt).toBe(before);
  });

  test('says when nothing was heard of a train that is due, once', async () => {
    const turn = await openTurn(await railroad.as('dispatcher'), { arriveIn: 60, layoverSeconds: 3000 });
    await passTo(railroad, 235);
    expect(await alertsOf(railroad)).toEqual([]);
    await passTo(railroad, 300);
    expect(await alertsOf(railroad, 'all')).toMatchObject([{ cause: 'no-word', turnId: turn.id }]);
    expect(await look(turn)).toMatchObject({ health: 'no-word' });
  });
});

describe('a train that stands unsecured', () => {
  const leaveUnsecured = async (): Promise<WireTurn> => {
    const turn = await openTurn(await railroad.as('dispatcher'));
    await say(turn, 'arrival', 0);
    railroad.clock.set(Date.parse(at(400)));
    return say(turn, 'step-done', 400, { step: 'ends-changed' });
  };

  test('is told with the entry itself, and clears with the handbrake, giving the gap', async () => {
    const turn = await leaveUnsecured();
    expect(turn.alerts).toMatchObject([{ cause: 'unsecured', priority: 'act-now', state: 'raised' }]);
    railroad.clock.set(Date.parse(at(460)));
    const secured = await say(turn, 'step-done', 460, { step: 'handbrake-set', reading: { count: 1 } });
    expect(secured.alerts.map((alert) => alert.cause)).not.toContain('unsecured');
    expect(await alertsOf(railroad, 'cleared')).toMatchObject([
      { cause: 'unsecured', lines: ['Gap: 60 s (1 min)'] },
    ]);
  });

  test('cannot be set aside', async () => {
    const turn = await leaveUnsecured();
    const dispatcher = await railroad.as('dispatcher');
    const answer = await dispatcher.agent
      .post(`/api/alerts/${turn.alerts[0]?.id}/setting-aside`)
      .send({ until: at(600), reason: 'Busy' })
      .expect(409);
    expect(answer.body).toMatchObject({ code: 'alert.never_aside' });
  });
});

test('a departure without its records is kept and raises an alert at once', async () => {
  const turn = await openTurn(await railroad.as('dispatcher'));
  await say(turn, 'arrival', 0);
  const left = await say(turn, 'departure', 900);
  expect(left.alerts).toMatchObject([{ cause: 'no-required-record', priority: 'act-now' }]);
  expect(left.findings.length).toBeGreaterThan(0);
});

describe('an alert', () => {
  const raise = async (): Promise<WireAlert> => {
    await aForgottenTurn();
    await passTo(railroad, 240);
    const [alert] = await alertsOf(railroad);
    if (alert === undefined) throw new Error('nothing was raised');
    return alert;
  };
  const post = async (alert: WireAlert, act: string, body: object = {}) =>
    (await railroad.as('dispatcher')).agent.post(`/api/alerts/${alert.id}/${act}`).send(body);

  test('is taken, and says who has it', async () => {
    const alert = await raise();
    const answer = await post(alert, 'taking');
    const { name } = await railroad.as('dispatcher');
    expect(answer.status).toBe(200);
    expect(answer.body).toMatchObject({
      state: 'taken',
      takenBy: name,
      takenAt: at(240),
      version: alert.version + 1,
    });
    await passTo(railroad, 260);
    expect(await alertsOf(railroad)).toMatchObject([{ id: alert.id, state: 'taken' }]);
  });

  test('is set aside for half an hour at most, with a reason, and returns by itself', async () => {
    const alert = await raise();
    const until = (seconds: number) => ({ until: at(seconds), reason: 'Crew is on the way' });
    expect((await post(alert, 'setting-aside', until(240))).body).toMatchObject({ code: 'alert.until_past' });
    expect((await post(alert, 'setting-aside', until(240 + 1801))).body).toMatchObject({
      code: 'alert.until_far',
    });
    expect((await post(alert, 'setting-aside', { until: at(300) })).status).toBe(400);
    const aside = await post(alert, 'setting-aside', until(300));
    expect(aside.body).toMatchObject({
      state: 'set-aside',
      setAsideUntil: at(300),
      setAsideReason: 'Crew is on the way',
    });
    await passTo(railroad, 295);
    expect((await alertsOf(railroad))[0]).toMatchObject({ state: 'set-aside' });
    await passTo(railroad, 300);
    expect((await alertsOf(railroad)).find((each) => each.id === alert.id)).toMatchObject({
      state: 'raised',
      setAsideUntil: null,
    });
  });

  test('is closed with a cause once it has cleared, not before', async () => {
    const alert = await raise();
    const early = await post(alert, 'closing', { cause: 'Conductor was late' });
    expect(early.status).toBe(409);
    expect(early.body).toMatchObject({ code: 'alert.still_standing' });
    const turn = { id: alert.turnId } as WireTurn;
    await say(turn, 'departure', 240);
    const closed = await post(alert, 'closing', { cause: 'Conductor was late' });
    expect(closed.body).toMatchObject({
      state: 'closed',
      closedCause: 'Conductor was late',
      closedAt: at(240),
    });
    expect((await post(alert, 'taking')).status).toBe(409);
  });

  test('is not for a conductor to take, and 404 where there is none', async () => {
    const alert = await raise();
    const conductor = await railroad.as('conductor');
    await conductor.agent.post(`/api/alerts/${alert.id}/taking`).expect(403);
    expect((await post({ ...alert, id: 'none' }, 'taking')).body).toMatchObject({ code: 'alert.unknown' });
  });

  test('is listed by state', async () => {
    const alert = await raise();
    await post(alert, 'taking');
    const ids = async (state: string) => (await alertsOf(railroad, state)).map((each) => each.id);
    expect(await ids('standing')).toEqual([alert.id]);
    expect(await ids('taken')).toEqual([alert.id]);
    expect(await ids('raised')).toEqual([]);
    expect(await ids('all')).toEqual([alert.id]);
    const dispatcher = await railroad.as('dispatcher');
    await dispatcher.agent.get('/api/alerts?terminal=HBR&state=loud').expect(400);
    const everywhere = await dispatcher.agent.get('/api/alerts').expect(200);
    expect((everywhere.body as WireAlert[]).map((each) => each.id)).toEqual([alert.id]);
  });
});
