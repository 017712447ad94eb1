import type { WireEntry, WireTurn } from '@stubpost/shared';
import type { Browser, Page } from 'playwright-core';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { addPerson, ApiPerson, crewPassword } from './support/api';
import {
  browserIsMissing,
  contrastFindings,
  openBrowser,
  openWindow,
  phone,
  seriousFindings,
  signIn,
} from './support/browser';
import { footSize, layoutFindings, setLargeText } from './support/layout-findings';
import { startServer, type TestServer } from './support/server';
import { strayColours } from './support/stray-colours';

const zone = 'America/New_York';
const dateOf = (instant: number): string =>
  new Intl.DateTimeFormat('en-CA', { timeZone: zone }).format(instant);
const iso = (instant: number): string => new Date(instant).toISOString();
const minutes = (count: number): number => count * 60_000;

const smallPhone = { width: 360, height: 640 };
const cars = ['1501', '1402', '1404', '1406', '1408', '1410', '1412', '1414'];
const twoBrakes = { count: 2, cars: ['1408', '1412'] };

/** The bar shall be this high, in CSS pixels, and the foot may take this much of the window when type is doubled. */
const lowestBar = 96;
const largestFootShare = 0.46;

/** How long something may take to come out right on a busy machine. */
const patience = { timeout: 15_000 };

describe.skipIf(browserIsMissing())('the phone’s screens', () => {
  let server: TestServer;
  let browser: Browser;
  let page: Page;
  let errors: string[];
  let dispatcher: ApiPerson;
  let conductor: ApiPerson;
  const turns = new Map<string, WireTurn>();

  const turnOf = (name: string): WireTurn => {
    const turn = turns.get(name);
    if (turn === undefined) throw new Error(`no turn ${name}`);
    return turn;
  };

  /** An extra turn that came in ten minutes ago, with this conductor on it. */
  async function aTurn(name: string, train: number, leaves = true): Promise<string> {
    const now = Date.now();
    const turn = await dispatcher.send<WireTurn>('POST', '/api/turns', {
      terminal: 'HBR',
      serviceDate: dateOf(now),
      track: '3',
      set: '41',
      inbound: { train: String(train), scheduledArrivalAt: iso(now - minutes(10)) },
      ...(leaves
        ? { outbound: { train: String(train + 1), scheduledDepartureAt: iso(now + minutes(5)) } }
        : {}),
    });
    turns.set(name, turn);
    const { person } = await conductor.send<{ person: { id: string } }>('GET', '/api/session');
    await conductor.record(turn.id, 'crew', { person: person.id, as: 'conductor' });
    await dispatcher.record(turn.id, 'arrival', { observedAt: iso(now - minutes(10)), source: 'by-feed' });
    return turn.id;
  }

  async function makeTurns(): Promise<void> {
    const now = Date.now();
    const ago = (count: number): { observedAt: string } => ({ observedAt: iso(now - minutes(count)) });
    await aTurn('count', 9101);
    const release = await aTurn('release', 9201);
    await conductor.record(release, 'step-done', { step: 'handbrake-set', reading: twoBrakes, ...ago(8) });
    for (const [step, time] of [
      ['cab-brake-check', 6],
      ['ends-changed', 4],
      ['engineer-in-cab', 1],
    ] as const)
      await conductor.record(release, 'step-done', { step, ...ago(time) });
    const question = await aTurn('question', 9301);
    await conductor.record(question, 'step-done', { step: 'handbrake-set', reading: twoBrakes, ...ago(8) });
    await conductor.record(question, 'step-done', { step: 'cab-brake-check', ...ago(7) });
    const byRadio = { source: 'by-radio', saidBy: 'engineer Lindqvist' };
    await dispatcher.record(question, 'step-done', { step: 'cab-brake-check', ...byRadio, ...ago(3) });
    await dispatcher.record(question, 'step-done', { step: 'ends-changed', ...byRadio, ...ago(2) });
    const tieUp = await aTurn('tie-up', 9401, false);
    await conductor.record(tieUp, 'defect', {
      car: '1406',
      cause: 'door',
      note: 'third door will not close',
    });
  }

  beforeAll(async () => {
    server = await startServer('off');
    browser = await openBrowser();
    const admin = await ApiPerson.signIn(server.url);
    await admin.send('POST', '/api/terminals', { code: 'HBR', name: 'Harbor', zone });
    const units = cars.map((number) => ({ number, kind: 'coach' }));
    await admin.send('PUT', '/api/sets/41', { units });
    const emails = [];
    for (const role of ['conductor', 'dispatcher']) emails.push(await addPerson(admin, role, 'HBR'));
    [conductor, dispatcher] = (await Promise.all(
      emails.map((email) => ApiPerson.signIn(server.url, email, crewPassword)),
    )) as [ApiPerson, ApiPerson];
    await makeTurns();
    ({ page, errors } = await openWindow(browser, server.url, phone));
    await signIn(page, 'conductor@example.test', crewPassword);
  });
  afterAll(async () => {
    await browser?.close();
    await server?.stop();
  });

  const touch = (name: RegExp | string): Promise<void> => page.getByRole('button', { name }).first().click();
  const openTurn = async (name: string): Promise<void> => {
    await page.goto(`/my/turn/${turnOf(name).id}`);
    await page.getByRole('region', { name: /^(Next step|Chosen step)$/ }).waitFor();
  };

  const states: ReadonlyArray<[state: string, open: () => Promise<void>]> = [
    [
      'the next step with its cars',
      async () => {
        await openTurn('count');
        await touch('1408');
        await touch('1412');
        await page.getByText('Set: 1408 and 1412').waitFor();
      },
    ],
    [
      'the second bar of a release',
      async () => {
        await openTurn('release');
        await touch(/^1408/);
        await touch(/^1412/);
        await touch(/Released: /);
        await page.getByRole('region', { name: 'Second touch' }).waitFor();
      },
    ],
    [
      'a step by radio, and one in question',
      async () => {
        await openTurn('question');
        await page.getByText('agree?').waitFor();
        await page.getByRole('button', { name: /in question/ }).waitFor();
      },
    ],
    [
      'both accounts of a step in question',
      async () => {
        await openTurn('question');
        await touch(/in question/);
        await page.getByText('The desk rules').waitFor();
      },
    ],
    [
      'withdrawing with a reason',
      async () => {
        await openTurn('question');
        await touch(/All steps/);
        await touch(/Handbrake set/);
        await touch('Withdraw');
        await page.getByText('The first entry stays in the log').waitFor();
        await touch('Wrong time');
      },
    ],
    [
      'a defect, ready to be sent',
      async () => {
        await openTurn('count');
        await touch('Defect');
        await touch('1406');
        await touch('Heating');
        await page.getByText('Defect: 1406 heating').waitFor();
      },
    ],
    [
      'handing over',
      async () => {
        await openTurn('count');
        await touch('Hand over');
        await page.getByLabel('Name or badge').waitFor();
      },
    ],
    [
      'a tie-up with open securement',
      async () => {
        await page.goto(`/my/tie-up?turn=${turnOf('tie-up').id}`);
        await page.getByRole('heading', { name: 'Tie-up, set 41' }).waitFor();
        await touch('No handbrake');
        await touch('Cut off');
        await page.getByText('Securement is open').waitFor();
      },
    ],
  ];

  /** Puts Daylight on or leaves the theme to the system, as the page of one's own preferences does. */
  const setTheme = (theme: 'system' | 'daylight'): Promise<void> =>
    page.evaluate((wanted) => {
      const key = 'stubpost.preferences';
      localStorage.setItem(key, JSON.stringify({ theme: wanted }));
      globalThis.dispatchEvent(new StorageEvent('storage', { key }));
    }, theme);

  async function expectSoundLayout(theme: string, sizes = [phone, smallPhone]): Promise<void> {
    for (const size of sizes) {
      await page.setViewportSize(size);
      for (const isLarge of [false, true]) {
        await setLargeText(page, isLarge);
        const where = `${theme}, ${size.width} px${isLarge ? ', 200 % text' : ''}`;
        // Looked at until it stands: a new size takes the browser a moment.
        await expect.poll(() => layoutFindings(page), { message: where, ...patience }).toEqual([]);
        const { bar, share } = await footSize(page);
        if (bar > 0) expect(Math.round(bar), where).toBeGreaterThanOrEqual(lowestBar);
        expect(share, where).toBeLessThanOrEqual(largestFootShare);
      }
    }
    await setLargeText(page, false);
    await page.setViewportSize(phone);
  }

  it.each(states)('%s: nothing is cut off, small or hard to read, in any theme', async (_state, open) => {
    await page.emulateMedia({ colorScheme: 'light' });
    await open();
    await expectSoundLayout('light');
    // High enough that nothing lies behind the foot: what is half behind it is scrolled, not small.
    await page.setViewportSize({ ...phone, height: 2400 });
    expect(await seriousFindings(page)).toEqual([]);
    expect(await strayColours(page)).toEqual([]);
    await page.emulateMedia({ colorScheme: 'dark' });
    expect(await contrastFindings(page), 'dark').toEqual([]);
    expect(await strayColours(page), 'dark').toEqual([]);
    await setTheme('daylight');
    expect(await contrastFindings(page), 'daylight').toEqual([]);
    // Its lines are thicker; where they fit the smaller phone they fit the larger.
    await expectSoundLayout('daylight', [smallPhone]);
    await setTheme('system');
    expect(errors).toEqual([]);
  });

  const entriesOf = (name: string): Promise<WireEntry[]> =>
    dispatcher.send('GET', `/api/turns/${turnOf(name).id}/entries`);
  const told = (name: string): Promise<WireTurn> => dispatcher.send('GET', `/api/turns/${turnOf(name).id}`);

  it('a smaller release is kept, leaves the step open and says which car is left', async () => {
    await openTurn('release');
    await touch(/^1408/);
    await touch(/Released: 1408/);
    await touch(/Released: 1 handbrake, car 1408/);
    await expect
      .poll(async () => (await told('release')).securement, patience)
      .toMatchObject({ set: 2, released: 1, carsStillSet: ['1412'] });
    await openTurn('release');
    await page.getByRole('heading', { name: '1 of 2 handbrakes released' }).waitFor();
    await page.getByText('Car 1412 still set.').waitFor();
    const turn = await told('release');
    expect(turn.steps.find(({ key }) => key === 'handbrake-released')?.doneAt).toBeNull();
  });

  it('a yes to the radio, a defect and a tie-up with its reason reach the log as they were said', async () => {
    await openTurn('question');
    await touch('Agree');
    await expect
      .poll(async () => (await entriesOf('question')).at(-1), patience)
      .toMatchObject({ kind: 'agreed' });
    expect((await told('question')).asksAgreement).toBeUndefined();

    await openTurn('count');
    await touch('Defect');
    await touch('Whole set');
    await touch('Lights');
    await touch(/Defect: set: lights/);
    await expect
      .poll(async () => (await told('count')).defects, patience)
      .toMatchObject([{ car: null, cause: 'lights' }]);

    await page.goto(`/my/tie-up?turn=${turnOf('tie-up').id}`);
    await touch('1408');
    await touch('Doors');
    await touch('Cut off');
    await touch('Mechanical has the set');
    await touch(/Tied up with a reason/);
    await expect
      .poll(async () => (await told('tie-up')).tiedUp, patience)
      .toMatchObject({
        handbrakes: { count: 1, cars: ['1408'] },
        checks: ['doors'],
        offAir: true,
        reason: 'Mechanical has the set',
      });
  });

  it('after the departure a correction waits, counts once another person approves it, and says who did', async () => {
    const { id } = turnOf('question');
    await dispatcher.record(id, 'departure', { source: 'by-radio', saidBy: 'conductor' });
    await page.goto(`/my/turn/${id}`);
    await touch(/All steps/);
    await touch(/Handbrake set/);
    await touch('Ask for correction');
    await touch('1410');
    await touch('Misread');
    await touch('Ask for it');
    const waiting = async () => (await told('question')).corrections?.[0];
    await expect.poll(waiting, patience).toMatchObject({ state: 'waiting', newReading: { cars: ['1410'] } });
    const asked = await waiting();
    const admin = await ApiPerson.signIn(server.url);
    const supervisor = await ApiPerson.signIn(
      server.url,
      await addPerson(admin, 'supervisor', 'HBR'),
      crewPassword,
    );
    await supervisor.record(id, 'correction-approved', { target: asked?.entryId });
    await touch(/All steps/);
    await touch(/Handbrake set/);
    await page.getByText(/Approved .* by S\. supervisorson/).waitFor();
    const step = (await told('question')).steps.find(({ key }) => key === 'handbrake-set');
    expect(step?.reading?.cars).toEqual(['1410']);
  });
});
