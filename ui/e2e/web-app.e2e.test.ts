import type { WireEntry, WireTurn } from '@stubpost/shared';
import type { Browser, Page } from 'playwright-core';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { addPerson, ApiPerson, crewPassword } from './support/api';
import { browserIsMissing, openBrowser, openWindow, phone, seriousFindings } from './support/browser';
import { startCutProxy, type CutProxy } from './support/cut-proxy';
import { layoutFindings, setLargeText } from './support/layout-findings';
import { openTurn, tickNote } from './support/phone-ticks';
import { startServer, type TestServer } from './support/server';

/** The page holds on a large and a small phone, and with type twice as large. */
async function layoutHolds(page: Page): Promise<void> {
  for (const size of [{ width: 360, height: 640 }, phone]) {
    await page.setViewportSize(size);
    expect(await layoutFindings(page)).toEqual([]);
    await setLargeText(page, true);
    expect(await layoutFindings(page)).toEqual([]);
    await setLargeText(page, false);
  }
}

const zone = 'America/New_York';
const pin = '4471';
const iso = (instant: number): string => new Date(instant).toISOString();

describe.skipIf(browserIsMissing())('one phone, two people', () => {
  let server: TestServer;
  let line: CutProxy;
  let browser: Browser;
  let page: Page;
  let errors: string[];
  let dispatcher: ApiPerson;
  let turn: WireTurn;

  /** Gives somebody a badge; they set their PIN themselves. */
  async function withBadge(admin: ApiPerson, email: string, badge: string): Promise<void> {
    const people = await admin.send<{ id: string; email: string }[]>('GET', '/api/people');
    const person = people.find((each) => each.email === email);
    await admin.send('PUT', `/api/people/${person?.id ?? ''}`, { badge });
    const own = await ApiPerson.signIn(server.url, email, crewPassword);
    await own.send('PUT', '/api/session/pin', { current: crewPassword, pin });
  }

  beforeAll(async () => {
    server = await startServer('off');
    line = await startCutProxy(server.url);
    browser = await openBrowser();
    const admin = await ApiPerson.signIn(server.url);
    await admin.send('POST', '/api/terminals', { code: 'HBR', name: 'Harbor', zone });
    await withBadge(admin, await addPerson(admin, 'conductor', 'HBR'), 'C-12');
    await withBadge(admin, await addPerson(admin, 'engineer', 'HBR'), 'E-7');
    dispatcher = await ApiPerson.signIn(
      server.url,
      await addPerson(admin, 'dispatcher', 'HBR'),
      crewPassword,
    );
    const now = Date.now();
    turn = await dispatcher.send<WireTurn>('POST', '/api/turns', {
      terminal: 'HBR',
      serviceDate: new Intl.DateTimeFormat('en-CA', { timeZone: zone }).format(now),
      track: '3',
      inbound: { train: '1741', scheduledArrivalAt: iso(now - 600_000) },
      outbound: { train: '1742', scheduledDepartureAt: iso(now + 900_000) },
    });
    const people = await dispatcher.send<{ id: string; name: string }[]>('GET', '/api/crew?terminal=HBR');
    for (const as of ['conductor', 'engineer']) {
      const person = people.find(({ name }) => name.endsWith(`${as}son`))?.id;
      await dispatcher.record(turn.id, 'crew', { person, as });
    }
    ({ page, errors } = await openWindow(browser, line.url, phone));
  });
  afterAll(async () => {
    await browser?.close();
    await line?.stop();
    await server?.stop();
  });

  async function signInByBadge(badge: string): Promise<void> {
    await page.getByLabel('Badge').fill(badge);
    for (const digit of pin) await page.getByRole('button', { name: digit, exact: true }).click();
    await page.getByRole('button', { name: 'Sign in', exact: true }).click();
    await page.getByRole('heading', { name: 'My turns' }).waitFor();
  }

  const notes = async (): Promise<string[]> =>
    (await dispatcher.send<WireEntry[]>('GET', `/api/turns/${turn.id}/entries`)).flatMap(({ note, by }) =>
      note === undefined ? [] : [`${by?.name ?? ''}: ${note}`],
    );

  it('has its shell from the worker, and never the shell for the interface or for a missing part', async () => {
    await page.goto('/my');
    await signInByBadge('c-12');
    await page.evaluate(async () => {
      await navigator.serviceWorker.ready;
      if (navigator.serviceWorker.controller === null)
        await new Promise((resolve) => {
          navigator.serviceWorker.addEventListener('controllerchange', resolve, { once: true });
        });
    });
    const kindOf = (path: string): Promise<string> =>
      page.evaluate(async (address) => {
        const answer = await fetch(address);
        return `${answer.status} ${answer.headers.get('content-type')?.split(';')[0] ?? ''}`;
      }, path);
    expect(await kindOf('/api/nothing')).toBe('404 application/json');
    expect(await kindOf('/assets/nothing-12345678.js')).toBe('404 application/json');
    expect(await kindOf('/app.webmanifest')).toBe('200 application/manifest+json');
    expect(await kindOf('/icons/mark-maskable-512.png')).toBe('200 image/png');
    expect((await page.goto('/api/health'))?.headers()['content-type']).toContain('application/json');
    expect((await page.goto('/assets/nothing-12345678.js'))?.status()).toBe(404);
    await page.goto('/my');
    await page.getByRole('link', { name: /\b1742 out/ }).waitFor();
  });

  it('says that a newer version waits for the unsent entries, and does not load it', async () => {
    line.fate = ({ method, url }) =>
      method === 'POST' && url?.endsWith('/entries') ? 'lost-before' : 'through';
    await openTurn(page, '1742');
    await tickNote(page, 'door 2 slow');
    line.workerSuffix = '\n// newer\n';
    await page.evaluate(async () => {
      await (await navigator.serviceWorker.getRegistration())?.update();
    });
    await page
      .getByText('A newer version is ready. It will load after your unsent entries are sent.')
      .waitFor();
    expect(await page.getByRole('button', { name: 'Load it now' }).isVisible()).toBe(false);
    await page.getByRole('link', { name: /On phone, not sent \(1\)/ }).click();
    await page.getByRole('heading', { name: 'Outbox' }).waitFor();
    expect(await seriousFindings(page)).toEqual([]);
    await layoutHolds(page);
  });

  it('locks at a touch and opens with the PIN, also without a signal', async () => {
    await page.context().setOffline(true);
    await page.getByRole('button', { name: 'Lock, other person' }).click();
    await page.getByRole('heading', { name: 'Locked' }).waitFor();
    expect(await seriousFindings(page)).toEqual([]);
    await layoutHolds(page);
    await page.reload();
    await page.getByRole('heading', { name: 'Locked' }).waitFor();
    await page.getByRole('textbox', { name: 'PIN' }).fill(pin);
    await page.getByRole('button', { name: 'Unlock' }).click();
    await page.getByRole('heading', { name: 'Outbox' }).waitFor();
    await page.context().setOffline(false);
  });

  it('passes to another person, who neither sees nor sends what waits', async () => {
    await page.getByRole('button', { name: 'Lock, other person' }).click();
    await page.getByRole('button', { name: 'Sign in again, or as another person' }).click();
    await page.getByText(/1 entry waits here to be sent/).waitFor();
    line.fate = () => 'through';
    await signInByBadge('E-7');
    await page.goto('/my/outbox');
    await page.getByText(/1 entry of another person waits on this phone/).waitFor();
    expect(await page.getByText('Note to the desk').count()).toBe(0);
    await page.getByText('Nothing waits on this phone').waitFor();
    expect(await notes()).toEqual([]);
  });

  it('and sends it under its writer’s name when they come back', async () => {
    await page.getByRole('button', { name: 'Sign out' }).click();
    await signInByBadge('C-12');
    await page.getByText(/^All sent/).waitFor();
    expect(await notes()).toEqual(['C. conductorson: door 2 slow']);
    expect(errors).toEqual([]);
  });
});
