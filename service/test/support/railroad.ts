import { randomUUID } from 'node:crypto';
import type { NestExpressApplication } from '@nestjs/platform-express';
import { SchedulerRegistry } from '@nestjs/schedule';
import type { EntryReceipt, Role, WireAlert, WireTurn } from '@stubpost/shared';
import { FixedClock } from '../../src/common/clock';
import { TerminalsService } from '../../src/terminals/terminals.service';
import { TurnSweepJob, turnSweepTimer } from '../../src/turns/turn-sweep.job';
import { TurnSweep } from '../../src/turns/turn-sweep.service';
import { type Booted, bootApp } from './boot';
import { type SignedInAgent, signInAs } from './sign-in';

/** A quiet afternoon in New York: 17:20. */
export const startOfTest = Date.parse('2026-03-03T22:20:00Z');

/** One terminal with a stopped clock, and people to work at it. */
export interface Railroad extends Booted {
  clock: FixedClock;
  app: NestExpressApplication;
  as(role: Role): Promise<SignedInAgent>;
}

/** Boots a service whose clock and sweeps are in the hands of the test. */
export async function aRailroad(options: { dataDir?: string; at?: number } = {}): Promise<Railroad> {
  const clock = new FixedClock(options.at ?? startOfTest);
  const booted = await bootApp({
    clock,
    ...(options.dataDir === undefined ? {} : { dataDir: options.dataDir }),
  });
  booted.app.get(SchedulerRegistry).deleteInterval(turnSweepTimer);
  await booted.app.get(TurnSweepJob).tick();
  const people = new Map<Role, SignedInAgent>();
  const railroad: Railroad = {
    ...booted,
    clock,
    as: async (role) => {
      const known = people.get(role) ?? (await signInAs(booted.app, role, 'HBR'));
      people.set(role, known);
      return known;
    },
  };
  return railroad;
}

/** The terminal most tests play at. */
export async function addHarbor(app: NestExpressApplication): Promise<void> {
  await app.get(TerminalsService).add({ code: 'HBR', name: 'Harbor', zone: 'America/New_York' });
}

/** Moves the clock to a second of the test, with a sweep every 5 s on the way, as the timer would have it. */
export async function passTo(railroad: Railroad, seconds: number): Promise<void> {
  const end = startOfTest + seconds * 1000;
  for (let now = railroad.clock.now(); now < end;) {
    now = Math.min(end, now + 5000);
    railroad.clock.set(now);
    await railroad.app.get(TurnSweep).sweep(now);
  }
}

/** Alerts at the terminal as the list gives them. */
export async function alertsOf(railroad: Railroad, state = 'standing'): Promise<WireAlert[]> {
  const dispatcher = await railroad.as('dispatcher');
  const answer = await dispatcher.agent.get('/api/alerts').query({ terminal: 'HBR', state }).expect(200);
  return answer.body as WireAlert[];
}

/** An instant so many seconds after the start of the test, as text. */
export function at(seconds: number): string {
  return new Date(startOfTest + seconds * 1000).toISOString();
}

/** Enters an extra turn that came in at the start of the test and leaves after a layover. */
export async function openTurn(
  dispatcher: SignedInAgent,
  options: { layoverSeconds?: number; arriveIn?: number; track?: string; set?: string; train?: string } = {},
): Promise<WireTurn> {
  const { layoverSeconds = 900, arriveIn = 0, track = '3', train = '1742', set } = options;
  const answer = await dispatcher.agent
    .post('/api/turns')
    .send({
      terminal: 'HBR',
      serviceDate: '2026-03-03',
      track,
      ...(set === undefined ? {} : { set }),
      inbound: { train: '1741', scheduledArrivalAt: at(arriveIn) },
      outbound: { train, scheduledDepartureAt: at(arriveIn + layoverSeconds) },
    })
    .expect(201);
  return answer.body as WireTurn;
}

/** An entry as a device sends it; by hand, seen at a time, with an id of its own. */
export function anEntryRequest(
  kind: string,
  seconds: number,
  fields: Record<string, unknown> = {},
): Record<string, unknown> & { id: string } {
  return { id: randomUUID(), kind, observedAt: at(seconds), source: 'by-hand', ...fields };
}

/** Records an entry and gives its receipt. */
export async function record(
  person: SignedInAgent,
  turnId: string,
  request: Record<string, unknown>,
): Promise<EntryReceipt> {
  const answer = await person.agent.post(`/api/turns/${turnId}/entries`).send(request).expect(201);
  return answer.body as EntryReceipt;
}
