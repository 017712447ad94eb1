import { type WireAlertQuality, alertQualitySchema, recordEntrySchema } from '@stubpost/shared';
import type { Actor } from '../src/turns/recording-rights';
import { TurnsService } from '../src/turns/turns.service';
import { signInAs } from './support/sign-in';
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
  startOfTest,
} from './support/railroad';

const today = '2026-03-03';
let railroad: Railroad;

beforeEach(async () => {
  railroad = await aRailroad();
  await addHarbor(railroad.app);
});
afterEach(() => railroad.close());

const asked = async (query: Record<string, string> = {}) =>
  (await railroad.as('supervisor')).agent
    .get('/api/alerts/quality')
    .query({ terminal: 'HBR', from: today, to: today, ...query });

const quality = async (query: Record<string, string> = {}): Promise<WireAlertQuality> => {
  const answer = await asked(query);
  expect(answer.status).toBe(200);
  return alertQualitySchema.parse(answer.body);
};

/** A train that came in and nothing since; its alert of a late departure stands from about 190 s on. */
async function aForgottenTurn(train: string, track: string): Promise<string> {
  const { id } = await openTurn(await railroad.as('dispatcher'), { layoverSeconds: 600, train, track });
  await record(await railroad.as('conductor'), id, anEntryRequest('arrival', 0));
  return id;
}

const leave = async (turnId: string, seconds: number) => {
  await record(await railroad.as('dispatcher'), turnId, anEntryRequest('departure', seconds));
};

describe('GET /api/alerts/quality', () => {
  test('answers with what was raised, what became of it, and what could be watched', async () => {
    const late = await aForgottenTurn('1742', '3');
    const taken = await aForgottenTurn('1744', '4');
    const nobodys = await aForgottenTurn('1746', '5');
    await passTo(railroad, 240);
    const alerts = await alertsOf(railroad);
    expect(alerts.map(({ cause }) => cause)).toEqual(Array(3).fill('late-departure'));
    const dispatcher = await railroad.as('dispatcher');
    const toTake = alerts.find(({ turnId }) => turnId === taken);
    await dispatcher.agent.post(`/api/alerts/${toTake?.id}/taking`).expect(200);

    const standing = await quality();
    expect(standing.standing).toMatchObject({ count: 3, untaken: 2 });
    expect(standing.standing.longest[0]).toMatchObject({ isStale: false });
    expect(standing.precision).toMatchObject({
      verdicts: { 'no-departure': 3 },
      atLeast: { counted: 0, share: null, interval: null },
    });

    railroad.clock.set(startOfTest + 661_000);
    for (const id of [taken, nobodys]) await leave(id, 600);
    await leave(late, 660);
    const after = await quality();
    expect(after).toMatchObject({
      terminal: 'HBR',
      thresholdSeconds: 59,
      asOf: at(661),
      watchedTurns: 3,
      unwatchedTurns: 0,
      bursts: [],
      repeaters: { chattering: 0, cameBack: 0 },
      precision: {
        verdicts: { 'left-late': 1, taken: 1, needless: 1, 'no-departure': 0 },
        atLeast: { count: 1, counted: 3 },
        atMost: { count: 2, counted: 3 },
      },
      warned: { count: 1, counted: 1, share: 1 },
    });
    const lateOnes = after.warning;
    expect(lateOnes.counted).toBe(3);
    expect(lateOnes.median).toBeGreaterThan(360);
    expect(lateOnes.median).toBeLessThan(600);
    expect(after.untaken.counted).toBe(after.alerts);
    expect(after.sources.sources.map(({ train }) => train)).toEqual(
      expect.arrayContaining(['1742', '1744', '1746']),
    );
    const { all } = after.load;
    expect(all.alerts).toBe(after.alerts);
    expect(all.histogram.reduce((sum, periods) => sum + periods, 0)).toBe(all.periods);
  });

  test('says which turns nobody could watch, and counts them and their alerts for nothing', async () => {
    const { id } = await openTurn(await railroad.as('dispatcher'), { arriveIn: -7200, train: '1700' });
    const { personId } = await railroad.as('conductor');
    const actor: Actor = { id: personId, name: 'C. Later', roles: [{ role: 'conductor', terminal: 'HBR' }] };
    await railroad.app.get(TurnsService).recordPastEntries([
      {
        turnId: id,
        request: recordEntrySchema.parse(anEntryRequest('departure', -6000)),
        actor,
        now: startOfTest - 5_990_000,
      },
    ]);
    const [unseen] = await alertsOf(railroad, 'all');
    expect(unseen).toMatchObject({ cause: 'no-required-record', raisedAt: at(-5990) });
    expect(await quality()).toMatchObject({
      watchedTurns: 0,
      unwatchedTurns: 1,
      unseenAlerts: 1,
      alerts: 0,
      load: { all: { periods: 0, median: null, shareInBurst: null }, peakFromTurns: null },
      warned: { counted: 0, share: null },
    });
    const all = await quality({ afterwards: 'counted' });
    expect(all).toMatchObject({ watchedTurns: 1, unwatchedTurns: 1, unseenAlerts: 1, alerts: 1 });
    expect(all.load.all).toMatchObject({ alerts: 1, most: 1 });
    expect(all.load.all.periods).toBeGreaterThan(1);
    expect(all.untaken.counted).toBe(0);
  });

  test('keeps to the days it was asked for, on the calendar of the terminal', async () => {
    await aForgottenTurn('1742', '3');
    await passTo(railroad, 240);
    expect((await quality()).alerts).toBe(1);
    expect((await quality({ from: '2026-02-01', to: '2026-03-02' })).alerts).toBe(0);
    expect((await quality({ from: '2026-03-04', to: '2026-03-09' })).load.all.periods).toBe(0);
  });

  test('refuses a range that ends before it begins or is too long, and crews', async () => {
    for (const range of [{ from: '2026-03-04' }, { from: '2024-01-01' }]) {
      expect(await asked(range)).toMatchObject({ status: 400, body: { code: 'history.range' } });
    }
    const conductor = await signInAs(railroad.app, 'conductor', 'HBR');
    await conductor.agent.get(`/api/alerts/quality?terminal=HBR&from=${today}&to=${today}`).expect(403);
  });
});
