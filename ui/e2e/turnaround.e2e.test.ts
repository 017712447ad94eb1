import type { WireAlert, WireTurn } from '@stubpost/shared';
import type { Browser, Page } from 'playwright-core';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { addPerson, ApiPerson, crewPassword } from './support/api';
import { browserIsMissing, desk, openBrowser, openWindow, phone, signIn } from './support/browser';
import { recordNext, takeTurn } from './support/phone-crew';
import { startServer, type TestServer } from './support/server';

const zone = 'America/New_York';
const clock = (instant: number): string =>
  new Intl.DateTimeFormat('en-GB', { timeZone: zone, hour: '2-digit', minute: '2-digit' }).format(instant);
const dateOf = (instant: number): string =>
  new Intl.DateTimeFormat('en-CA', { timeZone: zone }).format(instant);
const iso = (instant: number): string => new Date(instant).toISOString();

/** How soon another browser must show what a phone has recorded. */
const shownWithinMilliseconds = 2000;

describe.skipIf(browserIsMissing())('an extra turn, from the desk to the last step', () => {
  let server: TestServer;
  let browser: Browser;
  let dispatcher: ApiPerson;

  beforeAll(async () => {
    server = await startServer('off');
    browser = await openBrowser();
    const admin = await ApiPerson.signIn(server.url);
    await admin.send('POST', '/api/terminals', { code: 'HBR', name: 'Harbor', zone });
    await addPerson(admin, 'conductor', 'HBR');
    dispatcher = await ApiPerson.signIn(
      server.url,
      await addPerson(admin, 'dispatcher', 'HBR'),
      crewPassword,
    );
  });
  afterAll(async () => {
    await browser?.close();
    await server?.stop();
  });

  const turnOf = async (train: string): Promise<WireTurn> => {
    const now = Date.now();
    const query = `terminal=HBR&from=${iso(now - 7_200_000)}&to=${iso(now + 7_200_000)}`;
    const { turns } = await dispatcher.send<{ turns: WireTurn[] }>('GET', `/api/board?${query}`);
    const turn = turns.find((each) => each.outbound?.train === train);
    if (turn === undefined) throw new Error(`no turn of train ${train}`);
    return turn;
  };
  const alertsOf = async (turnId: string): Promise<WireAlert[]> =>
    (await dispatcher.send<WireAlert[]>('GET', '/api/alerts?terminal=HBR&state=all')).filter(
      (alert) => alert.turnId === turnId && alert.cause === 'late-departure',
    );
  const until = async <Value>(
    look: () => Promise<Value>,
    isSo: (value: Value) => boolean,
  ): Promise<Value> => {
    const end = Date.now() + 60_000;
    for (;;) {
      const value = await look();
      if (isSo(value)) return value;
      if (Date.now() > end) throw new Error(`not within a minute: ${JSON.stringify(value)}`);
      await new Promise((resolve) => setTimeout(resolve, 500));
    }
  };

  async function enterExtraTurn(page: Page): Promise<void> {
    const now = Date.now();
    await page.getByRole('button', { name: 'Extra turn' }).click();
    const dialog = page.getByRole('dialog', { name: 'Extra turn' });
    await dialog.getByLabel('Inbound train').fill('9731');
    await dialog.getByLabel('Arrives').fill(clock(now));
    await dialog.getByLabel('Outbound train').fill('9742');
    await dialog.getByLabel('Leaves').fill(clock(now + 240_000));
    await dialog.getByLabel('Track, if known').fill('3');
    await dialog.getByRole('button', { name: 'Add turn' }).click();
    await dialog.waitFor({ state: 'hidden' });
  }

  it('is driven through all its steps from a phone while a second browser shows each within two seconds', async () => {
    const atDesk = await openWindow(browser, server.url, desk);
    await signIn(atDesk.page, 'dispatcher@example.test', crewPassword);
    await atDesk.page.goto('/board/HBR');
    await enterExtraTurn(atDesk.page);
    const { id } = await turnOf('9742');

    const onPhone = await openWindow(browser, server.url, phone);
    await signIn(onPhone.page, 'conductor@example.test', crewPassword);
    await takeTurn(onPhone.page, '9742');
    await atDesk.page.goto(`/turns/${id}`);
    const steps = atDesk.page.getByRole('table', { name: /steps/i });
    await steps.waitFor();

    const recorded: string[] = [];
    while (recorded.at(-1) !== 'Running test' && recorded.length < 12) {
      const label = await recordNext(onPhone.page);
      recorded.push(label);
      const row = steps.getByRole('row', { name: new RegExp(`${label}.*by hand`) });
      const isStep = !/marker|Left|Leaves|Departure|departed/i.test(label);
      if (isStep) await row.first().waitFor({ timeout: shownWithinMilliseconds });
    }
    const turn = await turnOf('9742');
    expect(turn.steps.map((step) => step.state)).toEqual(turn.steps.map(() => 'done'));
    expect(turn.inbound?.actualArrivalAt).not.toBeNull();
    expect(turn.outbound?.actualDepartureAt).not.toBeNull();
    expect(turn.state).toBe('closed');
    expect([...atDesk.errors, ...onPhone.errors]).toEqual([]);
    await atDesk.context.close();
    await onPhone.context.close();
  }, 240_000);

  it('with a step left out goes Short, raises one alert with what to do and who, and clears it when the train leaves', async () => {
    const now = Date.now();
    const made = await dispatcher.send<WireTurn>('POST', '/api/turns', {
      terminal: 'HBR',
      serviceDate: dateOf(now),
      track: '4',
      inbound: { train: '9801', scheduledArrivalAt: iso(now - 900_000) },
      outbound: { train: '9802', scheduledDepartureAt: iso(now + 150_000) },
    });
    await dispatcher.record(made.id, 'arrival', { observedAt: iso(now - 890_000) });
    await dispatcher.record(made.id, 'step-done', { step: 'handbrake-set', observedAt: iso(now - 800_000) });
    expect((await turnOf('9802')).health).toBe('short');

    const alerts = await until(
      () => alertsOf(made.id),
      (found) => found.length > 0,
    );
    expect(alerts).toHaveLength(1);
    expect(alerts[0]).toMatchObject({ state: 'raised' });
    expect(alerts[0]?.action).not.toBe('');
    expect(alerts[0]?.actor).toMatch(/dispatcher|conductor|engineer/);

    const atDesk = await openWindow(browser, server.url, desk);
    await signIn(atDesk.page, 'dispatcher@example.test', crewPassword);
    await atDesk.page.goto('/board/HBR');
    await atDesk.page
      .getByText(alerts[0]?.text ?? '')
      .first()
      .waitFor({ timeout: 10_000 });
    await atDesk.context.close();

    await server.crashAndRestart();
    expect(await alertsOf(made.id)).toMatchObject([{ id: alerts[0]?.id, state: 'raised' }]);
    await dispatcher.record(made.id, 'departure', { source: 'by-radio', saidBy: 'Conductor' });
    const cleared = await until(
      () => alertsOf(made.id),
      (found) => found[0]?.state === 'cleared',
    );
    expect(cleared).toHaveLength(1);
  }, 180_000);
});
