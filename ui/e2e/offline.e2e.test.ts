import type { WireEntry, WireTurn } from '@stubpost/shared';
import type { IncomingMessage } from 'node:http';
import { setTimeout as pause } from 'node:timers/promises';
import type { Page } from 'playwright-core';
import { afterAll, afterEach, beforeAll, beforeEach, describe, expect, it } from 'vitest';
import { addPerson, ApiPerson, crewPassword } from './support/api';
import { browserIsMissing, signIn } from './support/browser';
import { startCutProxy, type CutProxy } from './support/cut-proxy';
import { makePhone, type KillablePhone } from './support/killable-phone';
import { openTurn, PLAIN_STEPS, tickNote, tickStep, type Tick } from './support/phone-ticks';
import { seeded } from './support/seeded';
import { startServer, type TestServer } from './support/server';

const zone = 'America/New_York';
const email = 'conductor@example.test';
const iso = (instant: number): string => new Date(instant).toISOString();
const dateOf = (instant: number): string =>
  new Intl.DateTimeFormat('en-CA', { timeZone: zone }).format(instant);

/** One round in the everyday run; as many as asked for when the machine has a night to spare. */
const rounds = Number(process.env['SOAK_ROUNDS'] ?? '1');
const firstSeed = Number(process.env['SOAK_SEED'] ?? '1');
const roundMilliseconds = 180_000;

const isEntry = ({ method, url }: IncomingMessage): boolean =>
  method === 'POST' && url?.endsWith('/entries') === true;

const clockAheadMilliseconds = 90_000;
/** Answers tell the time to about a second, and the machine may be busy. */
const clockToleranceMilliseconds = 2500;
const turnCount = 4;
const tickCount = 30;

describe.skipIf(browserIsMissing())('thirty ticks over four turns without a signal', () => {
  let server: TestServer;
  let admin: ApiPerson;
  let dispatcher: ApiPerson;
  let line: CutProxy;
  let phone: KillablePhone;

  beforeAll(async () => {
    server = await startServer('off');
    admin = await ApiPerson.signIn(server.url);
    await admin.send('POST', '/api/terminals', { code: 'HBR', name: 'Harbor', zone });
    await addPerson(admin, 'conductor', 'HBR');
    dispatcher = await ApiPerson.signIn(
      server.url,
      await addPerson(admin, 'dispatcher', 'HBR'),
      crewPassword,
    );
  });
  afterAll(() => server?.stop());
  beforeEach(async () => {
    line = await startCutProxy(server.url);
    phone = await makePhone(clockAheadMilliseconds);
  });
  afterEach(async () => {
    await phone?.discard();
    await line?.stop();
  });

  /** Four turns with the conductor on them, whose trains came in ten minutes ago. */
  async function fourTurns(seed: number): Promise<WireTurn[]> {
    const now = Date.now();
    const conductor = await ApiPerson.signIn(server.url, email, crewPassword);
    const { person } = await conductor.send<{ person: { id: string } }>('GET', '/api/session');
    const turns: WireTurn[] = [];
    for (let at = 0; at < turnCount; at += 1) {
      const turn = await dispatcher.send<WireTurn>('POST', '/api/turns', {
        terminal: 'HBR',
        serviceDate: dateOf(now),
        track: String(at + 1),
        inbound: { train: `${seed}${at}1`, scheduledArrivalAt: iso(now - 600_000) },
        outbound: { train: `${seed}${at}2`, scheduledDepartureAt: iso(now + 900_000 + at * 60_000) },
      });
      await dispatcher.record(turn.id, 'arrival', { observedAt: iso(now - 590_000) });
      await dispatcher.record(turn.id, 'crew', { person: person.id, as: 'conductor' });
      turns.push(turn);
    }
    return turns;
  }

  /** Which turn each tick is for: spells of one to four ticks, until all are used up. */
  function spells(chance: () => number): number[] {
    const left = Array.from({ length: turnCount }, (_, at) => Math.floor((tickCount + at) / turnCount));
    const order: number[] = [];
    while (order.length < tickCount) {
      const open = left.flatMap((count, at) => (count > 0 ? [at] : []));
      const turn = open[Math.floor(chance() * open.length)] ?? 0;
      const spell = Math.min(left[turn] ?? 0, 2 + Math.floor(chance() * 4));
      left[turn] = (left[turn] ?? 0) - spell;
      for (let tick = 0; tick < spell; tick += 1) order.push(turn);
    }
    return order;
  }

  /** A person at work: ticks whatever comes next on a turn, and notes down when. */
  class Conductor {
    readonly ticks: Tick[] = [];
    private readonly doneOf = new Map<string, number>();
    private openTrain = '';

    constructor(private readonly turns: readonly WireTurn[]) {}

    /** The page is new: no turn is open on it. */
    lookAnew(): void {
      this.openTrain = '';
    }

    async tick(page: Page, at: number): Promise<void> {
      const turn = this.turns[at];
      const train = turn?.outbound?.train ?? '';
      if (turn === undefined) throw new Error(`no turn ${at}`);
      if (this.openTrain !== train) await openTurn(page, train);
      this.openTrain = train;
      const count = this.doneOf.get(turn.id) ?? 0;
      this.doneOf.set(turn.id, count + 1);
      const step = PLAIN_STEPS[count];
      const words = `note ${count} of ${train}`;
      const from = Date.now();
      if (step === undefined) await tickNote(page, words);
      else await tickStep(page, step[1]);
      this.ticks.push({
        turnId: turn.id,
        kind: step === undefined ? 'note' : 'step-done',
        what: step === undefined ? words : step[0],
        from,
        to: Date.now(),
      });
    }
  }

  const ownEntries = async (turnId: string): Promise<WireEntry[]> =>
    (await dispatcher.send<WireEntry[]>('GET', `/api/turns/${turnId}/entries`)).filter(
      ({ by }) => by?.name === 'C. conductorson',
    );

  async function untilAllArrived(turns: readonly WireTurn[], page: Page): Promise<WireEntry[][]> {
    let entries: WireEntry[][] = [];
    await until(page, async () => {
      entries = await Promise.all(turns.map(({ id }) => ownEntries(id)));
      const tryNow = page.getByRole('button', { name: /Try now/ });
      if (await tryNow.isVisible()) await tryNow.click({ timeout: 1000 }).catch(() => undefined);
      return entries.flat().length >= tickCount;
    });
    return entries;
  }

  /** The cookie may not have reached the disk before the phone died: the person then signs in again, as the page asks. */
  async function signInIfAsked(page: Page): Promise<void> {
    const asks = page.getByRole('heading', { name: 'Sign in', exact: true, level: 2 });
    if (!(await asks.isVisible())) return;
    await signIn(page, email, crewPassword);
    await page.goto('/my/outbox');
  }

  async function openOutbox(page: Page): Promise<void> {
    await page.goto('/my/outbox');
    await page
      .getByRole('heading', { name: /^(Outbox|Sign in)$/ })
      .first()
      .waitFor();
  }

  /** Goes on looking, signing in again where that is asked for, until it is so. */
  async function until(page: Page, isSo: () => boolean | Promise<boolean>): Promise<void> {
    const end = Date.now() + 60_000;
    while (!(await isSo())) {
      if (Date.now() > end) throw new Error(`not within a minute: ${await page.locator('body').innerText()}`);
      await signInIfAsked(page);
      await pause(50);
    }
  }

  async function shellIsKept(page: Page): Promise<void> {
    await page.evaluate(async () => {
      await navigator.serviceWorker.ready;
      if (navigator.serviceWorker.controller === null)
        await new Promise((resolve) => {
          navigator.serviceWorker.addEventListener('controllerchange', resolve, { once: true });
        });
    });
    // What was read is gathered for three seconds before it is written down.
    await pause(4000);
  }

  async function round(seed: number): Promise<void> {
    const chance = seeded(seed);
    const order = spells(chance);
    const firstKill = 8 + Math.floor(chance() * 10);
    const turns = await fourTurns(seed);
    const conductor = new Conductor(turns);

    let page = await phone.start(line.url);
    await signIn(page, email, crewPassword);
    await page.getByRole('list', { name: 'My turns' }).waitFor();
    await shellIsKept(page);

    // Into the tunnel; the phone dies there, and comes back without a signal.
    line.isDown = true;
    await phone.setOffline(true);
    for (const at of order.slice(0, firstKill)) await conductor.tick(page, at);
    await page.getByText(`On phone, not sent (${firstKill})`).waitFor();
    await phone.kill();
    page = await phone.start(line.url);
    await page.goto('/my');
    await page.getByText(`On phone, not sent (${firstKill})`).waitFor();
    conductor.lookAnew();
    for (const at of order.slice(firstKill)) await conductor.tick(page, at);
    expect(line.entriesForwarded).toBe(0);

    // A first breath of signal: entries get through, their answers do not, and the phone dies in the middle of it.
    line.fate = (request) => (isEntry(request) ? 'lost-after' : 'through');
    line.isDown = false;
    await phone.setOffline(false);
    await openOutbox(page);
    await until(page, () => line.entriesForwarded > 0);
    await phone.kill();

    // A newer version was put in place meanwhile, and the line flaps.
    line.workerSuffix = `\n// newer version ${seed}\n`;
    line.fate = () => 'through';
    page = await phone.start(line.url);
    line.fate = (request) => {
      if (!isEntry(request)) return 'through';
      const draw = chance();
      return draw < 0.25 ? 'lost-before' : draw < 0.5 ? 'lost-after' : 'through';
    };
    await openOutbox(page);
    const entries = await untilAllArrived(turns, page);
    line.fate = () => 'through';
    check(turns, conductor.ticks, entries);
    await loadsNewerVersion(page);
    await page
      .getByText(/^All sent/)
      .first()
      .waitFor();
    // Nothing was doubled by what came after.
    check(turns, conductor.ticks, await Promise.all(turns.map(({ id }) => ownEntries(id))));
  }

  function check(turns: readonly WireTurn[], ticks: readonly Tick[], entries: WireEntry[][]): void {
    expect(ticks).toHaveLength(tickCount);
    const ids = entries.flat().map(({ id }) => id);
    expect(new Set(ids).size).toBe(ids.length);
    for (const [at, turn] of turns.entries()) {
      const made = ticks.filter(({ turnId }) => turnId === turn.id);
      const kept = [...(entries[at] ?? [])].sort((a, b) => a.sequence - b.sequence);
      // Each once, in the order in which they were made.
      expect(kept.map(({ step, note }) => step ?? note)).toEqual(made.map(({ what }) => what));
      for (const [index, entry] of kept.entries()) {
        const { from, to } = made[index] ?? { from: Number.NaN, to: Number.NaN };
        const observedAt = Date.parse(entry.observedAt ?? '');
        expect(observedAt).toBeGreaterThan(from - clockToleranceMilliseconds);
        expect(observedAt).toBeLessThan(to + clockToleranceMilliseconds);
        expect(Date.parse(entry.receivedAt)).toBeGreaterThan(to);
        expect(Math.abs(Number(entry['clockOffsetMilliseconds']) - clockAheadMilliseconds)).toBeLessThan(
          clockToleranceMilliseconds,
        );
      }
    }
  }

  async function loadsNewerVersion(page: Page): Promise<void> {
    await page.evaluate(async () => {
      await (await navigator.serviceWorker.getRegistration())?.update();
    });
    const load = page.getByRole('button', { name: 'Load it now' });
    await load.waitFor();
    const before = await page.evaluate(() => performance.timeOrigin);
    await load.click();
    await page.waitForFunction((origin) => performance.timeOrigin !== origin, before);
    await page.getByRole('heading', { name: 'Outbox' }).waitFor();
    expect(await page.getByText('A newer version is ready').isVisible()).toBe(false);
  }

  const seeds = Array.from({ length: rounds }, (_, at) => firstSeed + at);
  it.each(seeds)(
    'all arrive once, in order and with their own times, through kills, cuts and a new version (seed %i)',
    (seed) => round(seed),
    roundMilliseconds,
  );
});
