import { randomUUID } from 'node:crypto';
import { turnSchema, type WireEntry, type WireTurn } from '@stubpost/shared';
import {
  type Railroad,
  aRailroad,
  addHarbor,
  anEntryRequest,
  at,
  openTurn,
  record,
} from './support/railroad';

describe('a turn', () => {
  let railroad: Railroad;

  beforeEach(async () => {
    railroad = await aRailroad();
    await addHarbor(railroad.app);
  });
  afterEach(() => railroad.close());

  test('that was entered by hand is there, with its steps and its slack', async () => {
    const dispatcher = await railroad.as('dispatcher');
    const turn = await openTurn(dispatcher);
    expect(turnSchema.parse(turn)).toEqual(turn);
    expect(turn).toMatchObject({
      kind: 'turn',
      state: 'inbound',
      health: 'on-plan',
      extra: true,
      track: '3',
      zone: 'America/New_York',
      forecast: { slackSeconds: 380 },
    });
    expect(turn.steps.map((step) => step.key)).toContain('handbrake-set');
    const answer = await dispatcher.agent.get(`/api/turns/${turn.id}`).expect(200);
    expect(answer.body).toEqual(turn);
  });

  test('is driven through its life by entries', async () => {
    const conductor = await railroad.as('conductor');
    const turn = await openTurn(await railroad.as('dispatcher'));
    const states: string[] = [];
    const say = async (kind: string, seconds: number, fields: Record<string, unknown> = {}) => {
      railroad.clock.set(Date.parse(at(seconds)));
      states.push((await record(conductor, turn.id, anEntryRequest(kind, seconds, fields))).turn.state);
    };
    await say('arrival', 0);
    await say('step-done', 90, { step: 'handbrake-set', reading: { count: 1 } });
    await say('step-done', 200, { step: 'cab-brake-check' });
    await say('step-done', 400, { step: 'ends-changed' });
    await say('step-done', 600, { step: 'engineer-in-cab', reading: { brakePipePsi: 90 } });
    await say('step-done', 660, { step: 'handbrake-released', reading: { count: 1 } });
    await say('step-done', 720, { step: 'brakes-released' });
    await say('step-done', 800, { step: 'leaving-end-test' });
    await say('departure', 905);
    await say('step-done', 1100, { step: 'running-test' });
    expect(states).toEqual([
      'arrived',
      'secured',
      'secured',
      'ends-changed',
      'crew-in-cab',
      'crew-in-cab',
      'crew-in-cab',
      'ready',
      'departed',
      'closed',
    ]);
    const answer = await conductor.agent.get(`/api/turns/${turn.id}/entries`).expect(200);
    expect((answer.body as WireEntry[]).map((entry) => entry.sequence)).toEqual([
      1, 2, 3, 4, 5, 6, 7, 8, 9, 10,
    ]);
  });

  test('answers 404 where there is none', async () => {
    const dispatcher = await railroad.as('dispatcher');
    const answer = await dispatcher.agent.get(`/api/turns/${randomUUID()}`).expect(404);
    expect(answer.body).toMatchObject({ code: 'turn.unknown' });
  });

  test('may lie in the past and stand where another stands; an unknown track is added', async () => {
    const dispatcher = await railroad.as('dispatcher');
    const first = await openTurn(dispatcher, { arriveIn: -20 * 3600, track: '9A' });
    const second = await openTurn(dispatcher, { arriveIn: -20 * 3600, track: '9A' });
    expect([first.track, second.track]).toEqual(['9A', '9A']);
    const terminals = await dispatcher.agent.get('/api/terminals').expect(200);
    expect(terminals.body).toMatchObject([{ code: 'HBR', tracks: [{ label: '9A' }] }]);
  });

  test('is a first-out without an arrival and a tie-up without a departure', async () => {
    const dispatcher = await railroad.as('dispatcher');
    const post = async (half: object) =>
      (
        await dispatcher.agent
          .post('/api/turns')
          .send({ terminal: 'HBR', serviceDate: '2026-03-03', ...half })
          .expect(201)
      ).body as WireTurn;
    const firstOut = await post({ outbound: { train: '2', scheduledDepartureAt: at(900) } });
    const tieUp = await post({ inbound: { train: '1', scheduledArrivalAt: at(900) } });
    expect(firstOut).toMatchObject({ kind: 'first-out', inbound: null, state: 'scheduled', track: null });
    expect(tieUp).toMatchObject({ kind: 'tie-up', outbound: null, forecast: { slackSeconds: null } });
  });

  test.each([
    ['no train', { inbound: undefined, outbound: undefined }, 400, 'request.invalid'],
    ['a date far from its times', { serviceDate: '2026-03-06' }, 400, 'turn.date_far_from_times'],
    [
      'a departure before the arrival',
      { inbound: { train: '1', scheduledArrivalAt: at(901) } },
      400,
      'turn.order_of_times',
    ],
    ['a terminal nobody knows', { terminal: 'CAM' }, 403, 'access.forbidden'],
    ['a field nobody knows', { colour: 'red' }, 400, 'request.invalid'],
  ])('with %s is not entered', async (_, fields, status, code) => {
    const dispatcher = await railroad.as('dispatcher');
    const answer = await dispatcher.agent
      .post('/api/turns')
      .send({
        terminal: 'HBR',
        serviceDate: '2026-03-03',
        inbound: { train: '1', scheduledArrivalAt: at(0) },
        outbound: { train: '2', scheduledDepartureAt: at(900) },
        ...fields,
      })
      .expect(status);
    expect(answer.body).toMatchObject({ code });
  });

  test('is entered by the desk alone', async () => {
    const conductor = await railroad.as('conductor');
    await conductor.agent.post('/api/turns').send({ terminal: 'HBR' }).expect(403);
  });
});
