import { setTimeout as pause } from 'node:timers/promises';
import type { WireHistoryImport } from '@stubpost/shared';
import { FixedClock } from '../src/common/clock';
import { TerminalsService } from '../src/terminals/terminals.service';
import { bootApp, type Booted } from './support/boot';
import { signIn } from './support/sign-in';

type Agent = Awaited<ReturnType<typeof signIn>>;

const header = 'serviceDate,terminal,train,scheduledDepartureAt,actualDepartureAt';
const range = 'terminal=HBR&from=2026-02-01&to=2026-02-28';

describe('history of departures', () => {
  let booted: Booted;
  let analyst: Agent;

  beforeEach(async () => {
    booted = await bootApp({ clock: new FixedClock(Date.parse('2026-03-03T22:00:00Z')) });
    await booted.app.get(TerminalsService).add({ code: 'HBR', name: 'Harbor', zone: 'America/New_York' });
    analyst = await signIn(booted.app, 'analyst', 'HBR');
  });
  afterEach(() => booted.close());

  async function load(text: string | Buffer, agent = analyst): Promise<WireHistoryImport> {
    const sent = await agent
      .post('/api/history/departures')
      .attach('file', Buffer.from(text), 'departures.csv')
      .expect(202);
    const { id } = sent.body as { id: string };
    for (let attempt = 0; attempt < 200; attempt += 1) {
      const answer = await agent.get(`/api/history/imports/${id}`).expect(200);
      const state = answer.body as WireHistoryImport;
      if (state.state !== 'reading') return state;
      await pause(10);
    }
    throw new Error('the import did not end');
  }

  const onTime = async (query = ''): Promise<Record<string, unknown>> =>
    (await analyst.get(`/api/history/on-time?${range}${query}`).expect(200)).body as Record<string, unknown>;

  const table = [
    header,
    '2026-02-02,HBR,1742,2026-02-02T22:40:00Z,2026-02-02T22:40:59Z',
    '2026-02-02,HBR,1744,2026-02-02T23:00:00Z,2026-02-02T23:01:00Z',
    '2026-02-03,HBR,1742,2026-02-03T22:40:00Z,2026-02-03T22:39:30Z',
    '2026-02-03,HBR,1744,2026-02-03T23:00:00Z,',
  ].join('\n');

  test('a loaded table answers with its rule, n and interval', async () => {
    expect(await load(table)).toMatchObject({ state: 'loaded', rows: 4, problems: [] });
    expect(await onTime()).toMatchObject({
      rule: { thresholdSeconds: 59, inclusive: true, early: 'on-time', annulled: 'left-out' },
      scheduled: 4,
      counted: 3,
      onTime: 2,
      annulled: 0,
      noRecord: 1,
      share: 2 / 3,
      interval: { confidence: 0.95 },
      delaySeconds: { p50: 59 },
    });
  });

  test('the rule of the question is the rule of the answer', async () => {
    await load(table);
    expect(await onTime('&inclusive=false')).toMatchObject({ onTime: 1 });
    expect(await onTime('&thresholdSeconds=60')).toMatchObject({ onTime: 3 });
    expect(await onTime('&early=not-on-time')).toMatchObject({ onTime: 1, rule: { early: 'not-on-time' } });
  });

  test('groups add up to the whole', async () => {
    await load(table);
    const answer = await onTime('&groupBy=train');
    expect(answer['groups']).toMatchObject([
      { key: '1742', scheduled: 2, onTime: 2 },
      { key: '1744', scheduled: 2, onTime: 0 },
    ]);
  });

  test('a byte order mark, Windows line ends, quotes and columns in another order change nothing', async () => {
    const other =
      '\uFEFFtrain,actualDepartureAt,terminal,"serviceDate",scheduledDepartureAt,track\r\n' +
      '"1742",2026-02-02T17:40:59-05:00,HBR,2026-02-02,2026-02-02T17:40:00-05:00,"3"\r\n';
    expect(await load(other)).toMatchObject({ state: 'loaded', rows: 1 });
    expect(await onTime()).toMatchObject({ counted: 1, onTime: 1 });
  });

  test('one bad row refuses the whole table, with its line and the reason in words', async () => {
    const bad = `${table}\n2026-02-30,HBR,1750,2026-02-02T22:40:00Z,tomorrow`;
    const state = await load(bad);
    expect(state.state).toBe('refused');
    expect(state.problems).toEqual([
      { line: 6, message: 'serviceDate "2026-02-30" is not a date such as 2026-03-03' },
      {
        line: 6,
        message: 'actualDepartureAt "tomorrow" is not a time with a zone, such as 2026-03-03T22:40:00Z',
      },
    ]);
    expect(await onTime()).toMatchObject({ scheduled: 0, share: null, interval: null });
  });

  test.each([
    ['a missing column', 'serviceDate,terminal,train\n', 'the column scheduledDepartureAt is missing'],
    [
      'an unknown terminal',
      `${header}\n2026-02-02,XYZ,1,2026-02-02T22:40:00Z,`,
      'the terminal XYZ is not known',
    ],
    ['nothing but a header', `${header}\n`, 'the table has no rows'],
    ['a short row', `${header}\n2026-02-02,HBR`, 'has 2 fields, the header has 5'],
    [
      'the same departure twice',
      `${header}\n2026-02-02,HBR,1,2026-02-02T22:40:00Z,\n2026-02-02,HBR,1,2026-02-02T22:40:00Z,`,
      'the same departure stands in line 2',
    ],
    ['an open quote', `${header}\n2026-02-02,"HBR,1,2026-02-02T22:40:00Z,`, 'Quote Not Closed'],
  ])('%s is refused in words', async (_, text, message) => {
    const state = await load(text);
    expect(state.state).toBe('refused');
    expect(state.problems.map((problem) => problem.message).join('\n')).toContain(message);
  });

  test('a table that is loaded already is refused and doubles nothing', async () => {
    await load(table);
    const again = await load(table);
    expect(again.state).toBe('refused');
    expect(again.problems[0]).toEqual({ line: 2, message: 'this departure is loaded already' });
    expect(await onTime()).toMatchObject({ scheduled: 4 });
  });

  test('something that is not text is refused at once', async () => {
    await analyst
      .post('/api/history/departures')
      .attach('file', Buffer.from([0x50, 0x4b, 0, 1, 2]), 'departures.zip')
      .expect(422);
  });

  test('a range that ends before it begins is refused', async () => {
    const answer = await analyst
      .get('/api/history/on-time?terminal=HBR&from=2026-02-02&to=2026-02-01')
      .expect(400);
    expect(answer.body).toMatchObject({ code: 'history.range' });
  });

  test('the rows behind the figure come as a file that a spreadsheet cannot mistake for formulas', async () => {
    await load(`${header},set\n2026-02-02,HBR,=1+1,2026-02-02T22:40:00Z,2026-02-02T22:39:00Z,"a ""b"""`);
    const answer = await analyst.get(`/api/history/departures.csv?${range}`).expect(200);
    expect(answer.headers['content-type']).toBe('text/csv; charset=utf-8');
    expect(answer.text).toBe(
      'serviceDate,terminal,train,track,set,scheduledDepartureAt,actualDepartureAt,annulled,delaySeconds,onTime,origin\r\n' +
        '2026-02-02,HBR,\'=1+1,,"a ""b""",2026-02-02T22:40:00.000Z,2026-02-02T22:39:00.000Z,false,-60,true,imported\r\n',
    );
  });
});
