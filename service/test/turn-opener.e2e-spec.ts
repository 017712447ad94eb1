import type { PlannedOpening, WireBoard, WireTurn } from '@stubpost/shared';
import { Reader } from '../src/database/reader';
import { UnitOfWork } from '../src/database/unit-of-work';
import { TurnOpener } from '../src/turns/turn-opener';
import { TurnSweep } from '../src/turns/turn-sweep.service';
import {
  type Railroad,
  aRailroad,
  addHarbor,
  alertsOf,
  anEntryRequest,
  passTo,
  record,
  startOfTest,
} from './support/railroad';

describe('turns of a timetable', () => {
  let railroad: Railroad;

  beforeEach(async () => {
    railroad = await aRailroad();
    await addHarbor(railroad.app);
  });
  afterEach(() => railroad.close());

  const opening = (
    pairKey: string,
    minutes: number,
    fields: Partial<PlannedOpening> = {},
  ): PlannedOpening => ({
    pairKey,
    terminal: 'HBR',
    serviceDate: '2026-03-03',
    kind: 'turn',
    inboundTrain: pairKey.split('>')[0] ?? null,
    outboundTrain: pairKey.split('>')[1] ?? null,
    scheduledArrivalAt: startOfTest + minutes * 60_000,
    scheduledDepartureAt: startOfTest + (minutes + 15) * 60_000,
    track: '2',
    block: 'B1',
    reverses: true,
    ...fields,
  });
  const openAll = (openings: PlannedOpening[], timetableId = 'first') =>
    railroad.app.get(UnitOfWork).run((transaction) =>
      railroad.app.get(TurnOpener).openTurns(transaction, {
        timetableId,
        zones: { HBR: 'America/New_York' },
        openings,
        now: railroad.clock.now(),
      }),
    );
  const withdraw = (keep: string[]) =>
    railroad.app.get(UnitOfWork).run((transaction) =>
      railroad.app.get(TurnOpener).withdrawUnstarted(transaction, {
        terminal: 'HBR',
        serviceDate: '2026-03-03',
        keep,
        now: railroad.clock.now(),
      }),
    );
  const board = async (): Promise<WireTurn[]> => {
    const answer = await (await railroad.as('dispatcher')).agent.get('/api/board?terminal=HBR').expect(200);
    return (answer.body as WireBoard).turns;
  };

  test('are opened once, however often they are asked for', async () => {
    const openings = [opening('1>2', 5), opening('3>4', 20)];
    expect(await openAll(openings)).toEqual({ opened: 2, replanned: 0, kept: 0 });
    expect(await openAll(openings)).toEqual({ opened: 0, replanned: 0, kept: 2 });
    const turns = await board();
    expect(turns.map((turn) => turn.outbound?.train)).toEqual(['2', '4']);
    expect(turns[0]).toMatchObject({ extra: false, track: '2', set: 'B1', version: 1, reverses: true });
  });

  test('that do not reverse have no steps, and first-outs and tie-ups have theirs', async () => {
    await openAll([
      opening('1>2', 5, { reverses: false }),
      opening('>4', 20, {
        kind: 'first-out',
        inboundTrain: null,
        outboundTrain: '4',
        scheduledArrivalAt: null,
      }),
      opening('5>', 30, { kind: 'tie-up', outboundTrain: null, scheduledDepartureAt: null }),
    ]);
    const steps = new Map((await board()).map((turn) => [turn.kind, turn.steps.map((step) => step.key)]));
    expect(steps.get('turn')).toEqual([]);
    expect(steps.get('first-out')?.[0]).toBe('engineer-in-cab');
    expect(steps.get('tie-up')).toEqual(['handbrake-set']);
  });

  test('are planned anew by another timetable unless something has happened', async () => {
    await openAll([opening('1>2', 5), opening('3>4', 20)]);
    const [begun] = await board();
    await record(await railroad.as('conductor'), begun?.id ?? '', anEntryRequest('arrival', 300));
    const counts = await openAll([opening('1>2', 9), opening('3>4', 24), opening('5>6', 40)], 'second');
    expect(counts).toEqual({ opened: 1, replanned: 1, kept: 1 });
    const turns = await board();
    const arrivals = turns.map(
      (turn) => (Date.parse(turn.inbound?.scheduledArrivalAt ?? '') - startOfTest) / 60_000,
    );
    expect(arrivals).toEqual([5, 24, 40]);
  });

  test('are taken back while nothing has happened, and come back with an entry or an opening', async () => {
    await openAll([opening('1>2', 5), opening('3>4', 20), opening('5>6', 40)]);
    const [first, second, third] = await board();
    await record(await railroad.as('conductor'), first?.id ?? '', anEntryRequest('arrival', 300));
    expect(await withdraw(['3>4'])).toBe(1);
    expect((await board()).map((turn) => turn.id)).toEqual([first?.id, second?.id]);
    const dispatcher = await railroad.as('dispatcher');
    await dispatcher.agent.get(`/api/turns/${third?.id}`).expect(404);
    expect(await openAll([opening('5>6', 40)])).toEqual({ opened: 0, replanned: 1, kept: 0 });
    expect(await withdraw(['3>4'])).toBe(1);
    await record(await railroad.as('conductor'), third?.id ?? '', anEntryRequest('arrival', 2400));
    expect((await board()).map((turn) => turn.id)).toEqual([first?.id, second?.id, third?.id]);
  });

  test('leave no alert behind when they are taken back', async () => {
    await openAll([opening('1>2', 1)]);
    await passTo(railroad, 300);
    expect(await alertsOf(railroad)).toMatchObject([{ cause: 'no-word' }]);
    await withdraw([]);
    await railroad.app.get(TurnSweep).sweep(railroad.clock.now());
    expect(await alertsOf(railroad)).toEqual([]);
    expect(await railroad.app.get(Reader).query('SELECT * FROM alert_watch')).toEqual([]);
  });

  test('that are opened after their time raise nothing until somebody records something', async () => {
    await openAll([opening('1>2', -60), opening('3>4', -10)]);
    await passTo(railroad, 60);
    const [gone, going] = await railroad.app
      .get(Reader)
      .query<{ id: string }>('SELECT id FROM turn ORDER BY span_from');
    const causes = async () => (await alertsOf(railroad)).map((alert) => [alert.turnId, alert.cause]);
    expect(new Set((await causes()).map(([id]) => id))).toEqual(new Set([going?.id]));
    expect((await board()).map((turn) => turn.id)).toEqual([going?.id]);
    await record(await railroad.as('conductor'), gone?.id ?? '', anEntryRequest('arrival', -3600));
    expect(new Set((await causes()).map(([id]) => id))).toEqual(new Set([going?.id, gone?.id]));
  });
});
