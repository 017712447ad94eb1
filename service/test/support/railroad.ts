import { randomUUID } from 'node:crypto';
import type { NestExpressApplication } from '@nestjs/platform-express';
import type { EntryReceipt, Role, WireTurn } from '@stubpost/shared';
import { FixedClock } from '../../src/common/clock';
import { TerminalsService } from '../../src/terminals/terminals.service';
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

/** Boots a service with the terminal HBR. */
export async function aRailroad(options: { dataDir?: string; at?: number } = {}): Promise<Railroad> {
  const clock = new FixedClock(options.at ?? startOfTest);
  const booted = await bootApp({ clock, ...(options.dataDir === undefined ? {} : { dataDir: options.dataDir }) });
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
