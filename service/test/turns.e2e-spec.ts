import { randomUUID } from 'node:crypto';
import { turnSchema, type WireEntry } from '@stubpost/shared';
import { type Railroad, aRailroad, addHarbor, anEntryRequest, at, openTurn, record } from './support/railroad';

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
    expect((answer.body as WireEntry[]).map((entry) => entry.sequence)).toEqual([1, 2, 3, 4, 5, 6, 7, 8, 9, 10]);
  });

  test('answers 404 where there is none', async () => {
    const dispatcher = await railroad.as('dispatcher');
    const answer = await dispatcher.agent.get(`/api/turns/${randomUUID()}`).expect(404);
    expect(answer.body).toMatchObject({ code: 'turn.unknown' });
  });
});
