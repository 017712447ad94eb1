import { randomUUID } from 'node:crypto';
import type { WireTurn } from '@stubpost/shared';
import { PeopleService } from '../src/people/people.service';
import { SessionsService } from '../src/auth/sessions.service';
import { UnitOfWork } from '../src/database/unit-of-work';
import { LiveHub } from '../src/live/live-hub';
import { listen, type Listening } from './support/live';
import { type Railroad, aRailroad, addHarbor, anEntryRequest, openTurn, record } from './support/railroad';

describe('GET /api/live', () => {
  let railroad: Railroad;
  let streams: Listening[];

  beforeEach(async () => {
    railroad = await aRailroad();
    await addHarbor(railroad.app);
    streams = [];
  });
  afterEach(async () => {
    for (const stream of streams) stream.close();
    await railroad.close();
  });

  const open = async (options: Parameters<typeof listen>[2] = {}): Promise<Listening> => {
    const stream = await listen(railroad.app, (await railroad.as('dispatcher')).personId, options);
    streams.push(stream);
    return stream;
  };
  const isTurn = (event: { event: string }) => event.event === 'turn';

  test('shows an entry to everybody who looks, as the turn’s own route gives it', async () => {
    const conductor = await railroad.as('conductor');
    const turn = await openTurn(await railroad.as('dispatcher'));
    const [one, other] = [await open(), await open()];
    await Promise.all([one, other].map((stream) => stream.next((event) => event.event === 'beat')));
    const receipt = await record(conductor, turn.id, anEntryRequest('arrival', 0));
    for (const stream of [one, other]) {
      const event = await stream.next(isTurn);
      expect(event.data).toEqual(receipt.turn);
      expect(event.data).toMatchObject({ id: turn.id, version: turn.version + 1 });
    }
  });

  test('keeps proxies from holding events back, and beats with the number to go on from', async () => {
    await openTurn(await railroad.as('dispatcher'));
    const stream = await open();
    expect(stream.status).toBe(200);
    expect(stream.headers).toMatchObject({
      'content-type': 'text/event-stream; charset=utf-8',
      'x-accel-buffering': 'no',
    });
    expect(stream.headers['cache-control']).toContain('no-transform');
    const beat = await stream.next((event) => event.event === 'beat');
    expect(beat.data).toEqual({ now: new Date(railroad.clock.now()).toISOString() });
    const again = await open({ lastEventId: beat.id });
    await again.next((event) => event.event === 'beat');
    expect(again.events.map((event) => event.event)).toEqual(['beat']);
  });

  test.each([[false], [true]])('goes on where it stopped, without loss (by query: %s)', async (byQuery) => {
    const conductor = await railroad.as('conductor');
    const turn = await openTurn(await railroad.as('dispatcher'));
    const first = await open();
    const { id: seen } = await first.next((event) => event.event === 'beat');
    first.close();
    for (const seconds of [0, 10, 20]) {
      await record(conductor, turn.id, anEntryRequest('note', seconds, { note: `${seconds}` }));
    }
    const second = await open({ lastEventId: seen, byQuery });
    await second.next((event) => event.event === 'beat');
    const missed = second.events.filter(isTurn);
    expect(missed.map((event) => event.id)).toEqual([seen + 1, seen + 2, seen + 3]);
    expect(missed.at(-1)?.data).toMatchObject({ noteCount: 3 });
    await record(conductor, turn.id, anEntryRequest('note', 30, { note: '30' }));
    const live = await second.next((event) => isTurn(event) && event.id === seen + 4);
    expect(live.data).toMatchObject({ noteCount: 4 });
    expect(second.events.filter(isTurn)).toHaveLength(4);
  });

  test('tells a reader to load anew once when its place is gone, or was never ours', async () => {
    const turn = await openTurn(await railroad.as('dispatcher'));
    for (const seconds of [0, 10]) {
      await record(await railroad.as('conductor'), turn.id, anEntryRequest('note', seconds, { note: 'x' }));
    }
    await railroad.app
      .get(UnitOfWork)
      .run((transaction) =>
        transaction.execute('DELETE FROM change WHERE number < (SELECT max(number) FROM change)'),
      );
    for (const lastEventId of [1, 999_999]) {
      const stream = await open({ lastEventId });
      await stream.next((event) => event.event === 'beat');
      expect(stream.events.map((event) => event.event)).toEqual(['reload', 'beat']);
    }
  });

  test('says nothing of other terminals', async () => {
    const everywhere = await railroad.app.get(PeopleService).add({
      email: 'everywhere@example.org',
      name: 'Everywhere',
      roles: [{ role: 'dispatcher', terminal: '*' }],
    });
    const stream = await listen(railroad.app, everywhere.id, { terminal: 'CAM' });
    streams.push(stream);
    await stream.next((event) => event.event === 'beat');
    await openTurn(await railroad.as('dispatcher'));
    await railroad.app.get(LiveHub).settled();
    expect(stream.events.filter(isTurn)).toEqual([]);
  });

  test('is refused at a terminal that is not theirs', async () => {
    const stream = await open({ terminal: 'CAM' });
    expect(stream.status).toBe(403);
  });

  test('ends with the session', async () => {
    const { personId } = await railroad.as('dispatcher');
    const stream = await open();
    await stream.next((event) => event.event === 'beat');
    const { app } = railroad;
    await app.get(UnitOfWork).run((transaction) => app.get(SessionsService).endAllOf(transaction, personId));
    await stream.ended;
    expect(app.get(LiveHub).readerCount).toBe(0);
  });

  test('ends when the person may not look any more, at the next look at sessions', async () => {
    const { personId } = await railroad.as('dispatcher');
    const stream = await open();
    await stream.next((event) => event.event === 'beat');
    const { app } = railroad;
    await app
      .get(UnitOfWork)
      .run((transaction) => transaction.execute('DELETE FROM person_role WHERE person_id = ?', [personId]));
    // A session that was looked at a moment ago is not looked up again at once.
    railroad.clock.advance(30);
    await app.get(LiveHub).checkSessions();
    await stream.ended;
  });

  test('ends at once when the service stops', async () => {
    const stream = await open();
    await stream.next((event) => event.event === 'beat');
    await railroad.app.close();
    await stream.ended;
    railroad = await aRailroad();
  });

  test('goes on for the others when one leaves at once', async () => {
    const turn: WireTurn = await openTurn(await railroad.as('dispatcher'));
    const [leaving, staying] = [await open(), await open()];
    leaving.close();
    await staying.next((event) => event.event === 'beat');
    await record(await railroad.as('conductor'), turn.id, anEntryRequest('note', 0, { note: randomUUID() }));
    expect(await staying.next(isTurn)).toMatchObject({ data: { id: turn.id } });
  });
});
