import { boardSchema, type FoundTurn, type WireBoard, type WireTurn } from '@stubpost/shared';
import { SetsService } from '../src/sets/sets.service';
import {
  type Railroad,
  aRailroad,
  addHarbor,
  anEntryRequest,
  at,
  openTurn,
  record,
} from './support/railroad';

describe('GET /api/board', () => {
  let railroad: Railroad;

  beforeEach(async () => {
    railroad = await aRailroad();
    await addHarbor(railroad.app);
  });
  afterEach(() => railroad.close());

  const ask = async (query = '') =>
    (await railroad.as('dispatcher')).agent.get(`/api/board?terminal=HBR${query}`);
  const turnsOf = (body: unknown): string[] =>
    (body as WireBoard).turns.map((turn) => turn.outbound?.train ?? turn.inbound?.train ?? '');

  test('gives the turns of the next hours in the order of their trains', async () => {
    const dispatcher = await railroad.as('dispatcher');
    await openTurn(dispatcher, { arriveIn: 600, train: '20' });
    await openTurn(dispatcher, { arriveIn: 0, train: '10' });
    await openTurn(dispatcher, { arriveIn: 5 * 3600, train: '30' });
    const { body } = await ask().then((answer) => answer);
    expect(boardSchema.parse(body)).toEqual(body);
    expect(body).toMatchObject({ now: at(0), terminal: 'HBR' });
    expect(turnsOf(body)).toEqual(['10', '20']);
  });

  test('takes its first instant in and leaves its last one out', async () => {
    const dispatcher = await railroad.as('dispatcher');
    await openTurn(dispatcher, { arriveIn: 3600, layoverSeconds: 900, train: '10' });
    const during = (from: number, to: number) => ask(`&from=${at(from)}&to=${at(to)}`);
    expect(turnsOf((await during(0, 3600)).body)).toEqual([]);
    expect(turnsOf((await during(0, 3601)).body)).toEqual(['10']);
    expect(turnsOf((await during(4500, 9000)).body)).toEqual(['10']);
    expect(turnsOf((await during(4501, 9000)).body)).toEqual([]);
  });

  test('gives a whole service day', async () => {
    await openTurn(await railroad.as('dispatcher'), { arriveIn: 5 * 3600, train: '30' });
    expect(turnsOf((await ask('&serviceDate=2026-03-03')).body)).toEqual(['30']);
    expect(turnsOf((await ask('&serviceDate=2026-03-04')).body)).toEqual([]);
  });

  test('keeps a train in sight that should have left long ago', async () => {
    const conductor = await railroad.as('conductor');
    const heard = await openTurn(await railroad.as('dispatcher'), { train: '10' });
    await openTurn(await railroad.as('dispatcher'), { train: '20' });
    await record(conductor, heard.id, anEntryRequest('arrival', 0));
    railroad.clock.advance(5 * 3600);
    expect(turnsOf((await ask()).body)).toEqual(['10']);
  });

  test('shows a turn exactly as its own route does', async () => {
    const conductor = await railroad.as('conductor');
    const turn = await openTurn(await railroad.as('dispatcher'), { set: 'A' });
    await record(conductor, turn.id, anEntryRequest('arrival', 10));
    for (const seconds of [0, 95, 400, 1200]) {
      railroad.clock.set(Date.parse(at(seconds)));
      const board = (await ask()).body as WireBoard;
      const alone = await conductor.agent.get(`/api/turns/${turn.id}`).expect(200);
      expect(board.turns).toEqual([alone.body]);
    }
  });

  test('is not sent again while nothing has changed', async () => {
    const dispatcher = await railroad.as('dispatcher');
    const turn = await openTurn(dispatcher, { arriveIn: 3600 });
    const first = await ask();
    const etag = first.headers['etag'] as string;
    const again = () => dispatcher.agent.get('/api/board?terminal=HBR').set('If-None-Match', etag);
    await again().expect(304).expect('ETag', etag);
    railroad.clock.advance(60);
    await again().expect(304);
    await record(dispatcher, turn.id, anEntryRequest('note', 0, { note: 'Door 3 sticks' }));
    const changed = await again().expect(200);
    expect(changed.headers['etag']).not.toBe(etag);
    expect((changed.body as WireBoard).turns[0]).toMatchObject({ noteCount: 1 });
  });

  test('is sent again when the clock alone has changed it', async () => {
    const dispatcher = await railroad.as('dispatcher');
    await openTurn(dispatcher, { arriveIn: 1805 });
    const first = await ask();
    expect((first.body as WireBoard).turns[0]?.state).toBe('scheduled');
    railroad.clock.advance(10);
    const changed = await dispatcher.agent
      .get('/api/board?terminal=HBR')
      .set('If-None-Match', first.headers['etag'] as string)
      .expect(200);
    expect((changed.body as WireBoard).turns[0]?.state).toBe('inbound');
  });

  test('is kept by the browser and asked for each time, packed when it may be', async () => {
    const answer = await ask().then((board) => board);
    expect(answer.headers).toMatchObject({
      'cache-control': 'private, no-cache',
      'content-encoding': 'gzip',
      'content-type': 'application/json; charset=utf-8',
    });
    const dispatcher = await railroad.as('dispatcher');
    const plain = await dispatcher.agent.get('/api/board?terminal=HBR').set('Accept-Encoding', 'identity');
    expect(plain.headers['content-encoding']).toBeUndefined();
    expect(plain.body).toEqual(answer.body);
  });

  test('refuses a terminal that is not there, one that is not theirs, and words it does not know', async () => {
    const administrator = await railroad.as('administrator');
    const dispatcher = await railroad.as('dispatcher');
    await dispatcher.agent.get('/api/board?terminal=CAM').expect(403);
    await dispatcher.agent.get('/api/board').expect(400);
    await dispatcher.agent.get('/api/board?terminal=HBR&to=soon').expect(400);
    await dispatcher.agent.get(`/api/board?terminal=HBR&serviceDate=2026-03-03&from=${at(0)}`).expect(400);
    await administrator.agent.get('/api/board?terminal=HBR').expect(200);
  });
});

describe('GET /api/find', () => {
  let railroad: Railroad;

  beforeEach(async () => {
    railroad = await aRailroad();
    await addHarbor(railroad.app);
  });
  afterEach(() => railroad.close());

  const find = async (q: string): Promise<FoundTurn[]> => {
    const dispatcher = await railroad.as('dispatcher');
    const answer = await dispatcher.agent.get('/api/find').query({ terminal: 'HBR', q }).expect(200);
    return answer.body as FoundTurn[];
  };

  test('finds a turn by train, set, car, person and track', async () => {
    const conductor = await railroad.as('conductor');
    await railroad.app.get(SetsService).put({
      label: 'A7',
      request: { units: [{ number: '5512', kind: 'cab-car' }] },
      now: railroad.clock.now(),
    });
    const turn: WireTurn = await openTurn(await railroad.as('dispatcher'), {
      set: 'A7',
      track: '11',
      train: '1742',
    });
    await record(
      conductor,
      turn.id,
      anEntryRequest('crew', 0, { person: conductor.personId, as: 'conductor' }),
    );
    expect(await find('1742')).toEqual([
      {
        turnId: turn.id,
        terminal: 'HBR',
        serviceDate: '2026-03-03',
        text: '1741 → 1742, track 11, 17:20, Tue 3 Mar',
        matched: 'train',
        at: at(0),
      },
    ]);
    expect((await find('a7')).map((each) => each.matched)).toEqual(['set']);
    expect((await find('551')).map((each) => each.matched)).toEqual(['car']);
    expect((await find(conductor.name)).map((each) => each.matched)).toEqual(['person']);
    expect((await find('11')).map((each) => each.matched)).toEqual(['track']);
    expect(await find('nothing of the kind')).toEqual([]);
  });

  test('puts the whole word before a part of one', async () => {
    const dispatcher = await railroad.as('dispatcher');
    await openTurn(dispatcher, { train: '1742', track: '9' });
    const whole = await openTurn(dispatcher, { train: '42', track: '9', arriveIn: 3600 });
    expect((await find('42')).map((each) => each.turnId)[0]).toBe(whole.id);
  });
});
