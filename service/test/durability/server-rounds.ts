import { randomUUID } from 'node:crypto';
import { readdirSync } from 'node:fs';
import path from 'node:path';
import Database from 'better-sqlite3';
import { type EntryReceipt, type KeptEntry, LogCheck, type LogHead, formatLogLine } from '@stubpost/shared';
import type { WireTurn } from '@stubpost/shared';
import { SignInService } from '../../src/auth/sign-in.service';
import { SessionCookie } from '../../src/auth/session-cookie';
import { PeopleService } from '../../src/people/people.service';
import { sha256 } from '../../src/records/sha256';
import { TerminalsService } from '../../src/terminals/terminals.service';
import { bootApp } from '../support/boot';
import { freePort, startService, untilHealthy } from '../support/service-process';
import { cutPower, keepWhatIsThere, powerCutVariables } from './crash-rounds';

/** A server to be crashed again and again on one folder, and what its clients know of it. */
export interface CrashedServer {
  folder: string;
  /** Always the same: the name of the cookie carries it. */
  port: string;
  cookie: string;
  powerCutLibrary?: string;
  /** The last entry that was there after the crash before. */
  head: LogHead;
  /** Requests whose answer never came: their devices send them again. */
  pending: Pending[];
}

/** An entry on its way. */
interface Pending {
  turnId: string;
  request: { id: string } & Record<string, unknown>;
}

/** An entry with its receipt. */
interface Acknowledged extends Pick<EntryReceipt, 'sequence' | 'hash'> {
  id: string;
}

/** What was found after a crash. */
export interface AfterServerCrash {
  acknowledged: number;
  /** Ids that had a receipt and are not there, or not as the receipt says. */
  lost: string[];
  /** Answers other than a receipt. */
  refused: number[];
  /** Ids that were sent again and are not there exactly once. */
  notOnce: string[];
  integrity: string;
  isChainWhole: boolean;
  /** The number given out last is the number of entries: nothing is half written. */
  isHalfApplied: boolean;
}

const writers = 3;

/** Makes a railroad in a folder and a dispatcher who is signed in; the server itself is started by each round. */
export async function prepareServer(folder: string): Promise<CrashedServer> {
  const port = String(await freePort());
  const booted = await bootApp({ dataDir: folder, environment: { PORT: port } });
  try {
    const { app } = booted;
    await app.get(TerminalsService).add({ code: 'HBR', name: 'Harbor', zone: 'America/New_York' });
    const roles = [{ role: 'dispatcher' as const, terminal: 'HBR' }];
    const { id } = await app.get(PeopleService).add({ email: 'desk@example.org', name: 'Desk', roles });
    const { token } = await app.get(SignInService).openFor(id, 'soak');
    const cookie = `${app.get(SessionCookie).name}=${token}`;
    return { folder, port, cookie, head: { sequence: 0, hash: '0'.repeat(64) }, pending: [] };
  } finally {
    await booted.close();
  }
}

/** One round: start, send again what had no answer, write until so many receipts are in, crash, look. */
export async function crashServerOnce(server: CrashedServer, receipts: number): Promise<AfterServerCrash> {
  if (server.powerCutLibrary !== undefined) keepWhatIsThere(server.folder);
  const again = server.pending.map(({ request }) => request.id);
  const round = await writeUntilKilled(server, receipts);
  if (server.powerCutLibrary !== undefined) cutPower(server.folder);
  return { ...look(server, round.acknowledged, again), refused: round.refused };
}

async function writeUntilKilled(server: CrashedServer, receipts: number) {
  const service = startService({
    PORT: server.port,
    DATA_DIR: server.folder,
    ...powerCutVariables(server),
  });
  const acknowledged: Acknowledged[] = [];
  const refused: number[] = [];
  const waiting = server.pending.splice(0);
  const kill = () => service.child.kill('SIGKILL');
  try {
    await untilHealthy(service);
    const send = async (pending: Pending): Promise<boolean> => {
      const answer = await post(
        server,
        `${service.url}/api/turns/${pending.turnId}/entries`,
        pending.request,
      );
      if (answer === null) server.pending.push(pending);
      else if (answer.status > 201) {
        refused.push(answer.status);
        kill();
      } else {
        acknowledged.push({ id: pending.request.id, ...(answer.body as EntryReceipt) });
        if (acknowledged.length === receipts) kill();
      }
      return answer !== null;
    };
    await Promise.all(waiting.map(send));
    await Promise.all(Array.from({ length: writers }, () => writeOn(server, service.url, send)));
  } finally {
    kill();
    await service.ended;
  }
  if (acknowledged.length < receipts && refused.length === 0)
    throw new Error(`the server ended by itself: ${service.output()}`);
  return { acknowledged, refused };
}

/** A device that writes one entry after another until the server is gone. */
async function writeOn(
  server: CrashedServer,
  url: string,
  send: (pending: Pending) => Promise<boolean>,
): Promise<void> {
  const scheduledDepartureAt = new Date(Date.now() + 2 * 3600_000).toISOString();
  const serviceDate = scheduledDepartureAt.slice(0, 10);
  const outbound = { train: '100', scheduledDepartureAt };
  const opened = await post(server, `${url}/api/turns`, { terminal: 'HBR', serviceDate, outbound });
  if (opened === null) return;
  if (opened.status !== 201) throw new Error(`no turn could be opened: ${JSON.stringify(opened.body)}`);
  const { id: turnId } = opened.body as WireTurn;
  for (let number = 1; ; number += 1) {
    const observedAt = new Date().toISOString();
    const note = { id: randomUUID(), kind: 'note', observedAt, source: 'by-hand', note: `note ${number}` };
    if (!(await send({ turnId, request: note }))) return;
  }
}

/** The answer to a request; null when the server was gone before it answered. */
async function post(server: CrashedServer, url: string, body: object) {
  try {
    const answer = await fetch(url, {
      method: 'POST',
      headers: { 'Content-Type': 'application/json', Cookie: server.cookie },
      body: JSON.stringify(body),
    });
    return { status: answer.status, body: await answer.json() };
  } catch {
    return null;
  }
}

function look(server: CrashedServer, acknowledged: readonly Acknowledged[], again: readonly string[]) {
  const database = new Database(databaseIn(server.folder));
  try {
    const byId = database.prepare<string, { sequence: number; hash: string }>(
      'SELECT sequence, hash FROM entry WHERE id = ?',
    );
    const rows = (id: string) => byId.all(id);
    const lost = acknowledged.filter(({ id, sequence, hash }) => {
      const [row] = rows(id);
      return row?.sequence !== sequence || row.hash !== hash;
    });
    const resent = again.filter((id) => acknowledged.some((each) => each.id === id));
    const counter = database.prepare(`SELECT value FROM counter WHERE name = 'entry'`).pluck().get() ?? 0;
    const count = database.prepare('SELECT count(*) FROM entry').pluck().get();
    return {
      acknowledged: acknowledged.length,
      lost: lost.map(({ id }) => id),
      notOnce: resent.filter((id) => rows(id).length !== 1),
      integrity: String(database.pragma('integrity_check', { simple: true })),
      isChainWhole: goesOn(server, database),
      isHalfApplied: counter !== count,
    };
  } finally {
    database.close();
  }
}

/** The whole log in the folder of a server that is not running, as it would be exported. */
export function wholeLogOf(folder: string): string {
  const database = new Database(databaseIn(folder));
  try {
    return [...entriesAfter(database, 0)].map((entry) => `${formatLogLine(entry)}\n`).join('');
  } finally {
    database.close();
  }
}

function entriesAfter(database: Database.Database, sequence: number): IterableIterator<KeptEntry> {
  return database
    .prepare<number, KeptEntry>(
      `SELECT sequence, id, received_at AS receivedAt, previous_hash AS previousHash, body_hash AS bodyHash, hash, body
       FROM entry WHERE sequence > ? ORDER BY sequence`,
    )
    .iterate(sequence);
}

/** Whether what was written since the crash before goes on from where the log ended then. */
function goesOn(server: CrashedServer, database: Database.Database): boolean {
  const check = new LogCheck({ sha256, heads: server.head.sequence === 0 ? [] : [server.head] });
  for (const entry of entriesAfter(database, server.head.sequence)) check.take(formatLogLine(entry));
  const isUntouched = check.newest !== null || server.head.sequence === 0;
  server.head = check.newest ?? server.head;
  return isUntouched && check.end().isWhole;
}

function databaseIn(folder: string): string {
  const name = readdirSync(folder).find((each) => each.endsWith('.sqlite'));
  if (name === undefined) throw new Error('there is no database');
  return path.join(folder, name);
}
