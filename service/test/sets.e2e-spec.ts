import { setSchema, type WireSet, type WireTurn } from '@stubpost/shared';
import { type Railroad, aRailroad, addHarbor, openTurn } from './support/railroad';

describe('equipment sets', () => {
  let railroad: Railroad;

  beforeEach(async () => {
    railroad = await aRailroad();
    await addHarbor(railroad.app);
  });
  afterEach(() => railroad.close());

  const units = (...numbers: string[]) =>
    numbers.map((number) => ({ number, kind: number.startsWith('L') ? 'locomotive' : 'coach' }));
  const put = async (label: string, body: object) =>
    (await railroad.as('dispatcher')).agent.put(`/api/sets/${label}`).send(body);
  const list = async (): Promise<WireSet[]> =>
    (await (await railroad.as('conductor')).agent.get('/api/sets').expect(200)).body as WireSet[];

  test('are described by their units, in order from the bumping post', async () => {
    const answer = await put('A', { units: units('L1', '11', '12'), leadingUnit: '12' });
    expect(answer.status).toBe(200);
    const [set] = await list();
    expect(setSchema.parse(set)).toEqual(answer.body);
    expect(set).toMatchObject({ label: 'A', version: 1, leadingUnit: '12' });
    expect(set?.units.map((unit) => unit.number)).toEqual(['L1', '11', '12']);
  });

  test('show their cars on the turns they still have to make', async () => {
    const dispatcher = await railroad.as('dispatcher');
    const turn = await openTurn(dispatcher, { set: 'A' });
    expect(turn.cars).toEqual([]);
    await put('A', { units: units('L1', '11', '12') });
    const look = async () => (await dispatcher.agent.get(`/api/turns/${turn.id}`)).body as WireTurn;
    expect(await look()).toMatchObject({ cars: ['11', '12'], version: turn.version + 1 });
    await put('B', { units: units('12') });
    expect((await look()).cars).toEqual(['11']);
  });

  test('are changed by whoever saw them last', async () => {
    await put('A', { units: units('11') });
    const late = await put('A', { units: units('12') });
    expect(late.status).toBe(412);
    expect(late.body).toMatchObject({ code: 'set.changed', facts: { version: 1 } });
    expect((await put('A', { version: 1, units: units('12') })).status).toBe(200);
  });

  test('are refused with a unit that stands in them twice, and to those who may not', async () => {
    expect((await put('A', { units: units('11', '11') })).status).toBe(400);
    await (await railroad.as('conductor')).agent.put('/api/sets/A').send({ units: [] }).expect(403);
    expect(await list()).toEqual([]);
  });
});
