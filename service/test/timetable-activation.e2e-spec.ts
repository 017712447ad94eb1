import { aFeed, type FeedParts, type FeedTrain } from '@stubpost/shared/testing';
import type {
  ErrorBody,
  WireBoard,
  WireTerminal,
  WireTimetable,
  WireTimetableDifference,
  WireTurn,
} from '@stubpost/shared';
import { TimetableDays } from '../src/timetables/timetable-days.service';
import { TurnOpener } from '../src/turns/turn-opener';
import { bringIn, zipOf } from './support/feed-zips';
import { anEntryRequest, aRailroad, record, type Railroad } from './support/railroad';
import { signInAs, type SignedInAgent } from './support/sign-in';

/** The clock of the tests stands on Tuesday 3 March 2026, 17:20 in New York. */
const today = '2026-03-03';
const harbor = { code: 'HBR', name: 'Harbor Terminal', stationIds: ['harbor'] };

let railroad: Railroad;
let admin: SignedInAgent;

beforeEach(async () => {
  railroad = await aRailroad();
  admin = await signInAs(railroad.app, 'administrator');
});
afterEach(() => railroad.close());

/** Shuttles that come in at twenty past and leave at a minute of the same hour. */
const shuttle = (hour: number, leaves: string): FeedTrain[] => [
  {
    id: `${hour}a`,
    shortName: `${hour}01`,
    block: `B${hour}`,
    calls: [
      ['mill', `${hour}:00:00`],
      ['harbor-1', `${hour}:20:00`],
    ],
  },
  {
    id: `${hour}b`,
    shortName: `${hour}02`,
    block: `B${hour}`,
    calls: [
      ['harbor-1', `${hour}:${leaves}:00`],
      ['mill', `${hour}:59:00`],
    ],
  },
];

const winter: FeedParts = { trains: [...shuttle(17, '40'), ...shuttle(18, '40')] };
const spring: FeedParts = { trains: [...shuttle(17, '40'), ...shuttle(18, '35'), ...shuttle(19, '40')] };

const ready = (parts: FeedParts = winter): Promise<WireTimetable> => bringIn(admin, zipOf(aFeed(parts)));

const activate = (timetable: WireTimetable, request: object = { from: today, terminals: [harbor] }) =>
  admin.agent.post(`/api/timetables/${timetable.id}/activation`).send(request);

async function board(serviceDate = today, terminal = 'HBR'): Promise<WireTurn[]> {
  const answer = await admin.agent
    .get(`/api/board?terminal=${terminal}&serviceDate=${serviceDate}`)
    .expect(200);
  return (answer.body as WireBoard).turns;
}

const shapes = (turns: WireTurn[]): string[] =>
  turns.map(
    ({ kind, inbound, outbound }) =>
      `${kind} ${inbound?.train ?? ''}>${outbound?.train ?? ''} ${outbound?.scheduledDepartureAt.slice(11, 16) ?? ''}`,
  );

const stateOf = async (timetable: WireTimetable): Promise<WireTimetable> =>
  (await admin.agent.get(`/api/timetables/${timetable.id}`).expect(200)).body as WireTimetable;

/** Moves the clock and signs in anew: sessions do not last that long. */
async function goTo(instant: number): Promise<void> {
  railroad.clock.set(instant);
  admin = await signInAs(railroad.app, 'administrator');
}

const daysLater = (days: number): Promise<void> => goTo(railroad.clock.now() + days * 86_400_000);

describe('making a timetable active', () => {
  test('makes the terminal and its tracks and opens today and the next two service days', async () => {
    const timetable = await ready();
    const answer = await activate(timetable).expect(200);
    expect(answer.body).toMatchObject({
      state: 'active',
      activeFrom: today,
      activeUntil: null,
      terminals: [harbor],
      rollBackTo: null,
    });
    const [terminal] = (await admin.agent.get('/api/terminals').expect(200)).body as WireTerminal[];
    expect(terminal).toMatchObject({
      code: 'HBR',
      name: 'Harbor Terminal',
      zone: 'America/New_York',
      tracks: [{ label: '1' }, { label: '2' }],
    });
    for (const date of ['2026-03-03', '2026-03-04', '2026-03-05']) {
      expect(shapes(await board(date))).toEqual(['turn 1701>1702 22:40', 'turn 1801>1802 23:40']);
    }
    for (const date of ['2026-03-02', '2026-03-06']) expect(await board(date)).toEqual([]);
    const [turn] = await board();
    expect(turn).toMatchObject({
      track: '1',
      set: 'B17',
      state: 'inbound',
      extra: false,
      reverses: true,
      inbound: { train: '1701', scheduledArrivalAt: '2026-03-03T22:20:00.000Z' },
    });
  });

  test('from a day in the past opens today and the next two', async () => {
    await activate(await ready(), { from: '2026-01-15', terminals: [harbor] }).expect(200);
    expect(await board()).toHaveLength(2);
    expect(await board('2026-03-02')).toEqual([]);
  });

  test('from a day to come leaves the days before it alone', async () => {
    const first = await ready();
    await activate(first).expect(200);
    const second = await ready(spring);
    await activate(second, { from: '2026-03-05', terminals: [harbor] }).expect(200);
    expect(shapes(await board('2026-03-04'))).toHaveLength(2);
    expect(shapes(await board('2026-03-05'))).toEqual([
      'turn 1701>1702 22:40',
      'turn 1801>1802 23:35',
      'turn 1901>1902 00:40',
    ]);
    expect(await stateOf(first)).toMatchObject({
      state: 'active',
      activeFrom: today,
      activeUntil: '2026-03-04',
    });
    expect(await stateOf(second)).toMatchObject({
      state: 'active',
      activeFrom: '2026-03-05',
      activeUntil: null,
    });
    await daysLater(2);
    expect((await stateOf(first)).state).toBe('retired');
  });

  test('opens first departures and last arrivals of blocks too', async () => {
    await activate(await ready({}), {
      from: today,
      terminals: [harbor, { code: 'STC', name: 'Stonecrop', stationIds: ['stonecrop'] }],
    }).expect(200);
    expect(shapes(await board(today, 'HBR'))).toEqual(['turn T1>T2 12:00', 'tie-up T3> ']);
    expect(shapes(await board(today, 'STC'))).toEqual(['first-out >T1 11:00', 'turn T2>T3 13:00']);
  });

  test('makes one terminal of several stations, and takes a platform for its station', async () => {
    const stops = [
      ['up', 'Harbor', '', 'U', '', '0'],
      ['low', 'Harbor', '', 'L', '', '0'],
      ['mill', 'Mill', '', '', '', '0'],
      ['under', 'Harbor', 'low', 'X', '', '0'],
    ];
    const trains: FeedTrain[] = [
      {
        id: 'A',
        block: 'B',
        calls: [
          ['mill', '17:00:00'],
          ['up', '17:20:00'],
        ],
      },
      {
        id: 'C',
        block: 'B',
        calls: [
          ['low', '17:40:00'],
          ['mill', '18:00:00'],
        ],
      },
    ];
    const choice = { ...harbor, stationIds: ['up', 'under'] };
    const answer = await activate(await ready({ stops, trains }), {
      from: today,
      terminals: [choice],
    }).expect(200);
    expect((answer.body as WireTimetable).terminals).toEqual([{ ...harbor, stationIds: ['up', 'low'] }]);
    expect(shapes(await board())).toEqual(['turn A>C 22:40']);
  });

  test('opens guessed pairs only when told to', async () => {
    const parts = { trains: (winter.trains ?? []).map((train) => ({ ...train, block: '' })) };
    const timetable = await ready(parts);
    await activate(timetable).expect(200);
    expect(await board()).toEqual([]);
    const answer = await activate(timetable, {
      from: today,
      terminals: [harbor],
      acceptGuesses: true,
    }).expect(200);
    expect((answer.body as WireTimetable).acceptGuesses).toBe(true);
    expect(shapes(await board())).toEqual(['turn 1701>1702 22:40', 'turn 1801>1802 23:40']);
  });

  test('keeps lengths and markers of known tracks', async () => {
    await admin.agent
      .post('/api/terminals')
      .send({ code: 'HBR', name: 'Old name', zone: 'America/New_York' })
      .expect(201);
    const track = { label: '2', lengthFeet: 850, cars: 9, markers: [{ cars: 6, label: '6' }] };
    await admin.agent.put('/api/terminals/HBR/tracks').send([track]).expect(200);
    await activate(await ready()).expect(200);
    const [terminal] = (await admin.agent.get('/api/terminals').expect(200)).body as WireTerminal[];
    expect(terminal).toMatchObject({ name: 'Harbor Terminal', tracks: [track, { label: '1' }] });
  });

  test.each([
    ['a station nobody knows', [{ ...harbor, stationIds: ['nowhere'] }], 'timetable.station_unknown'],
    ['a station in two terminals', [harbor, { ...harbor, code: 'X' }], 'timetable.station_twice'],
    ['a code twice', [harbor, { ...harbor, stationIds: ['mill'] }], 'timetable.terminal_twice'],
    ['no terminal', [], 'request.invalid'],
    ['a code with blanks', [{ ...harbor, code: 'H B R' }], 'request.invalid'],
  ])('is refused for %s, and nothing has changed', async (_, terminals, code) => {
    const timetable = await ready();
    const answer = await activate(timetable, { from: today, terminals }).expect(400);
    expect((answer.body as ErrorBody).code).toBe(code);
    expect((await admin.agent.get('/api/terminals').expect(200)).body).toEqual([]);
    expect((await stateOf(timetable)).state).toBe('ready');
  });

  test('is refused for a timetable that was refused itself', async () => {
    const answer = await activate(await ready({ trains: [] })).expect(409);
    expect((answer.body as ErrorBody).code).toBe('timetable.not_ready');
  });

  test('is for an administrator of all terminals', async () => {
    const timetable = await ready();
    await activate(timetable).expect(200);
    const ofHarbor = await signInAs(railroad.app, 'administrator', 'HBR');
    const answer = await ofHarbor.agent
      .post(`/api/timetables/${timetable.id}/activation`)
      .send({ from: today, terminals: [harbor] });
    expect(answer.status).toBe(403);
  });
});

describe('a timetable that takes over', () => {
  let first: WireTimetable;
  let dispatcher: SignedInAgent;

  beforeEach(async () => {
    first = await ready();
    await activate(first).expect(200);
    dispatcher = await signInAs(railroad.app, 'dispatcher');
  });

  test('withdraws what it does not plan, moves what it plans otherwise and keeps what is the same', async () => {
    const before = await board();
    await activate(await ready(spring)).expect(200);
    const after = await board();
    expect(shapes(after)).toEqual(['turn 1701>1702 22:40', 'turn 1801>1802 23:35', 'turn 1901>1902 00:40']);
    expect(after[0]).toMatchObject({ id: before[0]?.id, version: before[0]?.version });
    expect(after[1]?.id).toBe(before[1]?.id);
    expect((await stateOf(first)).state).toBe('retired');
  });

  test('never touches a turn on which something has happened', async () => {
    const [turn] = await board();
    await record(dispatcher, turn?.id ?? '', anEntryRequest('arrival', 0));
    await activate(await ready({ trains: shuttle(19, '40') })).expect(200);
    expect(shapes(await board())).toEqual(['turn 1701>1702 22:40', 'turn 1901>1902 00:40']);
    const answer = await admin.agent.get(`/api/turns/${turn?.id}/entries`).expect(200);
    expect(answer.body).toHaveLength(1);
  });

  test('can be taken back in one action, and again the other way', async () => {
    const before = await board();
    const second = await ready(spring);
    expect((await activate(second).expect(200)).body).toMatchObject({
      rollBackTo: { id: first.id, fileName: 'winter.zip' },
    });
    const back = await admin.agent.post(`/api/timetables/${second.id}/roll-back`).expect(200);
    expect(back.body).toMatchObject({ id: first.id, state: 'active', rollBackTo: null });
    expect((await stateOf(second)).state).toBe('ready');
    const after = await board();
    expect(shapes(after)).toEqual(shapes(before));
    expect(after.map((turn) => turn.id)).toEqual(before.map((turn) => turn.id));
    await activate(second).expect(200);
    expect(await board()).toHaveLength(3);
  });

  test('is taken back with all that was ordered for it since', async () => {
    const second = await ready(spring);
    await activate(second).expect(200);
    const other = { ...harbor, name: 'Harbor' };
    const again = await activate(second, { from: today, terminals: [other] }).expect(200);
    expect((again.body as WireTimetable).rollBackTo?.id).toBe(first.id);
    const back = await admin.agent.post(`/api/timetables/${second.id}/roll-back`).expect(200);
    expect((back.body as WireTimetable).id).toBe(first.id);
    expect((await stateOf(second)).state).toBe('ready');
    expect(await board()).toHaveLength(2);
  });

  test('is not taken back when another came after it, or when there is none before', async () => {
    const second = await ready(spring);
    await activate(second).expect(200);
    const older = await admin.agent.post(`/api/timetables/${first.id}/roll-back`).expect(409);
    expect((older.body as ErrorBody).code).toBe('timetable.not_newest');
    await admin.agent.post(`/api/timetables/${second.id}/roll-back`).expect(200);
    const none = await admin.agent.post(`/api/timetables/${first.id}/roll-back`).expect(409);
    expect((none.body as ErrorBody).code).toBe('timetable.nothing_before');
  });

  test('takes back the turns of terminals that it leaves out', async () => {
    const both = [harbor, { code: 'MIL', name: 'Mill Road', stationIds: ['mill'] }];
    await activate(first, { from: today, terminals: both }).expect(200);
    expect(await board(today, 'MIL')).toHaveLength(4);
    await activate(first).expect(200);
    expect(await board(today, 'MIL')).toEqual([]);
    expect(await board()).toHaveLength(2);
  });

  test('but fails on the way leaves everything as it was', async () => {
    const before = await board();
    const second = await ready(spring);
    const broken = jest
      .spyOn(TurnOpener.prototype, 'openTurns')
      .mockRejectedValueOnce(new Error('on purpose'));
    const choice = { code: 'NEW', name: 'New', stationIds: ['mill'] };
    await activate(second, { from: today, terminals: [{ ...harbor, name: 'Renamed' }, choice] }).expect(500);
    broken.mockRestore();
    expect(await board()).toEqual(before);
    expect((await stateOf(first)).state).toBe('active');
    expect((await stateOf(second)).state).toBe('ready');
    const terminals = (await admin.agent.get('/api/terminals').expect(200)).body as WireTerminal[];
    expect(terminals.map(({ code, name }) => [code, name])).toEqual([['HBR', 'Harbor Terminal']]);
  });

  test('shows beforehand what it changes, by date and terminal', async () => {
    const second = await ready(spring);
    const answer = await admin.agent
      .get(`/api/timetables/${second.id}/difference?from=2026-03-04&days=2`)
      .expect(200);
    const difference = answer.body as WireTimetableDifference;
    const counts = { terminal: 'HBR', same: 1, moved: 1, added: 1, removed: 0 };
    expect(difference.against).toEqual({ id: first.id, fileName: 'winter.zip' });
    expect(difference.dates).toEqual([
      { serviceDate: '2026-03-04', againstDate: '2026-03-04', ...counts },
      { serviceDate: '2026-03-05', againstDate: '2026-03-05', ...counts },
    ]);
    expect(difference.turns[0]).toMatchObject({
      change: 'moved',
      before: { outboundTrain: '1802', layoverSeconds: 1200, departureAt: '2026-03-04T23:40:00.000Z' },
      after: { outboundTrain: '1802', layoverSeconds: 900 },
    });
    const alone = await admin.agent.get(`/api/timetables/${first.id}/difference`).expect(200);
    expect(alone.body).toEqual({ against: null, dates: [], turns: [] });
  });
});

describe('service days', () => {
  test('are opened as they come near, each once', async () => {
    await activate(await ready()).expect(200);
    const days = railroad.app.get(TimetableDays);
    expect(await days.roll()).toEqual([]);
    await daysLater(1);
    expect(await days.roll()).toEqual(['2026-03-06']);
    expect(await days.roll()).toEqual([]);
    expect(await board('2026-03-06')).toHaveLength(2);
    await daysLater(1);
    // Saturday and Sunday have no trains; they are looked at once all the same.
    expect(await days.roll()).toEqual(['2026-03-07']);
    expect(await board('2026-03-07')).toEqual([]);
  });

  test('begin at midnight of the zone, also in the nights when clocks change', async () => {
    await activate(await ready({ ...winter, calendar: [['WKD', '1111111', '20260101', '20261231']] })).expect(
      200,
    );
    const days = railroad.app.get(TimetableDays);
    await goTo(Date.parse('2026-03-08T04:59:59Z'));
    await days.roll();
    expect(await board('2026-03-10')).toEqual([]);
    await goTo(Date.parse('2026-03-08T05:00:00Z'));
    expect(await days.roll()).toEqual(['2026-03-10']);
    await goTo(Date.parse('2026-11-01T03:59:59Z'));
    await days.roll();
    expect(await board('2026-11-03')).toEqual([]);
    await goTo(Date.parse('2026-11-01T04:00:00Z'));
    expect(await days.roll()).toEqual(['2026-11-03']);
  });

  test('after a pause of the service are caught up with', async () => {
    await activate(await ready()).expect(200);
    await daysLater(7);
    expect(await railroad.app.get(TimetableDays).roll()).toEqual(['2026-03-10', '2026-03-11', '2026-03-12']);
    expect(await board('2026-03-10')).toHaveLength(2);
  });

  test('go on after a timetable has ended, empty', async () => {
    await activate(await ready({ ...winter, calendar: [['WKD', '1111111', '20260101', '20260304']] })).expect(
      200,
    );
    expect(await board('2026-03-04')).toHaveLength(2);
    expect(await board('2026-03-05')).toEqual([]);
  });
});
