import type { Browser, Page } from 'playwright-core';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import {
  browserIsMissing,
  contrastFindings,
  desk,
  openBrowser,
  openWindow,
  phone,
  seriousFindings,
} from './support/browser';
import { startServer, type TestServer } from './support/server';
import { strayColours } from './support/stray-colours';

interface DemoPerson {
  id: string;
  role: string;
}

/** Every page with a role that opens it; the phone's pages in a phone's window. */
const pages: ReadonlyArray<[role: string, path: string, window: 'desk' | 'phone', heading: RegExp | string]> =
  [
    ['nobody', '/sign-in', 'desk', /./],
    ['nobody', '/help', 'desk', /./],
    ['dispatcher', '/board/OSQ', 'desk', /./],
    ['dispatcher', '/board/OSQ?view=table', 'desk', /./],
    ['dispatcher', '/alerts', 'desk', /./],
    ['supervisor', '/alerts/quality', 'desk', 'Alert quality'],
    ['supervisor', '/desk/roster', 'desk', /^Roster/],
    ['administrator', '/status/boxes', 'desk', 'Messages'],
    ['nobody', '/t/AAAAAAAAAAAAAAAAAAAAAA', 'phone', 'Take an alert'],
    ['dispatcher', '/board/OSQ', 'phone', /./],
    ['conductor', '/my', 'phone', 'My turns'],
    ['analyst', '/history', 'desk', 'On-time departure'],
    ['administrator', '/people', 'desk', /./],
    ['administrator', '/timetables', 'desk', /./],
    ['administrator', '/setup', 'desk', /./],
    ['supervisor', '/setup', 'desk', /./],
    ['supervisor', '/records/corrections?state=all', 'desk', 'Corrections'],
    ['auditor', '/records/check', 'desk', 'Check the log'],
    ['supervisor', '/me', 'desk', /./],
    ['dispatcher', '/keys', 'desk', /./],
    ['dispatcher', '/accessibility', 'desk', /./],
  ];

describe.skipIf(browserIsMissing())('every page of the demo', () => {
  let server: TestServer;
  let browser: Browser;
  let people: DemoPerson[] = [];

  beforeAll(async () => {
    server = await startServer('live');
    browser = await openBrowser();
    for (let attempt = 0; attempt < 300 && people.length < 9; attempt += 1) {
      const demo = (await (await fetch(`${server.url}/api/demo`)).json()) as {
        people?: DemoPerson[];
        message?: string;
      };
      if (demo.message?.startsWith('History') === true) people = demo.people ?? [];
      else await new Promise((resolve) => setTimeout(resolve, 500));
    }
    expect(people.length).toBe(9);
  }, 180_000);
  afterAll(async () => {
    await browser?.close();
    await server?.stop();
  });

  async function openAs(role: string, path: string, window: 'desk' | 'phone') {
    const opened = await openWindow(browser, server.url, window === 'desk' ? desk : phone);
    const person = people.find((each) => each.role === role);
    if (person !== undefined)
      await opened.context.request.post('/api/demo/session', { data: { personId: person.id } });
    await opened.page.goto(path);
    return opened;
  }

  /** The page stands: its heading is there and nothing says that it is still loading. */
  async function stands(page: Page, heading: RegExp | string): Promise<void> {
    await page.getByRole('heading', { level: 1, name: heading }).first().waitFor({ state: 'attached' });
    await page.waitForFunction(() => !/\bLoading /.test(document.body.innerText), undefined, {
      timeout: 30_000,
    });
  }

  it.each(pages)(
    '%s at %s (%s) has no serious finding, no stray colour and says it is a demo, in light and dark',
    async (role, path, window, heading) => {
      const { context, page, errors } = await openAs(role, path, window);
      await stands(page, heading);
      expect(await seriousFindings(page)).toEqual([]);
      expect(await strayColours(page)).toEqual([]);
      expect(await page.getByText(/demo/i).first().isVisible()).toBe(true);
      const width = await page.evaluate(() => document.documentElement.scrollWidth - globalThis.innerWidth);
      if (window === 'phone' && path.startsWith('/my')) expect(width).toBeLessThanOrEqual(0);
      await page.emulateMedia({ colorScheme: 'dark' });
      await page.locator('html.bp6-dark').waitFor({ state: 'attached' });
      await page.waitForFunction(() =>
        document.getAnimations().every(({ playState }) => playState !== 'running'),
      );
      expect(await contrastFindings(page)).toEqual([]);
      expect(await strayColours(page)).toEqual([]);
      expect(errors).toEqual([]);
      await context.close();
    },
  );

  it('the board can be worked by the keyboard alone', async () => {
    const { context, page } = await openAs('dispatcher', '/board/OSQ', 'desk');
    await stands(page, /./);
    const inGrid = () => page.evaluate(() => document.activeElement?.closest('[role=grid]') !== null);
    for (let presses = 0; presses < 60 && !(await inGrid()); presses += 1) await page.keyboard.press('Tab');
    expect(await inGrid()).toBe(true);
    const focused = () => page.evaluate(() => document.activeElement?.getAttribute('data-turn') ?? '');
    const first = await focused();
    await page.keyboard.press('ArrowDown');
    const second = await focused();
    expect(second).not.toBe('');
    expect(second).not.toBe(first);
    await page.keyboard.press('Enter');
    await page.waitForURL(/\/turns\//);
    await page.getByRole('dialog').getByRole('heading').first().waitFor();
    await page.keyboard.press('Escape');
    await page.waitForURL(/\/board\//);
    await expect.poll(focused).toBe(second);
    await page.keyboard.press('Tab');
    expect(await inGrid()).toBe(false);
    await context.close();
  });

  it('the phone never loads the timeline library', async () => {
    const opened = await openWindow(browser, server.url, phone);
    const scripts: string[] = [];
    opened.page.on('response', (response) => {
      if (response.url().endsWith('.js')) scripts.push(response.url());
    });
    const conductor = people.find((each) => each.role === 'conductor');
    await opened.context.request.post('/api/demo/session', { data: { personId: conductor?.id } });
    await opened.page.goto('/my');
    await stands(opened.page, 'My turns');
    expect(scripts.length).toBeGreaterThan(0);
    expect(scripts.filter((url) => /timeline/i.test(url))).toEqual([]);
    await opened.context.close();
  });
});
