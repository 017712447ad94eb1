import { randomUUID } from 'node:crypto';
import type { AddressInfo } from 'node:net';
import {
  type ErrorBody,
  may,
  type Role,
  type RoleGrant,
  ROLES,
  ROUTES,
  type RouteSpec,
  type WireTurn,
} from '@stubpost/shared';
import { AlertRow } from '../src/alerts/alert.entity';
import { SignInService } from '../src/auth/sign-in.service';
import { SessionCookie } from '../src/auth/session-cookie';
import { UnitOfWork } from '../src/database/unit-of-work';
import { PeopleService } from '../src/people/people.service';
import { TerminalsService } from '../src/terminals/terminals.service';
import { bootApp, type Booted } from './support/boot';
import { signIn } from './support/sign-in';

/** Somebody who tries every route; null roles: somebody who is not signed in. */
interface Caller {
  title: string;
  personId: string | null;
  roles: RoleGrant[];
}

const here = 'HBR';
const elsewhere = 'CAM';

let booted: Booted;
let base: string;
const callers: Caller[] = [];

beforeAll(async () => {
  booted = await bootApp();
  for (const code of [here, elsewhere]) {
    await booted.app.get(TerminalsService).add({ code, name: code, zone: 'America/New_York' });
  }
  await addSubjects();
  await booted.app.listen(0, '127.0.0.1');
  base = `http://127.0.0.1:${(booted.app.getHttpServer().address() as AddressInfo).port}`;
  callers.push(
    { title: 'nobody', personId: null, roles: [] },
    await callerWith('somebody without a role', []),
  );
  for (const role of ROLES) {
    callers.push(await callerWith(`${role} there`, [{ role, terminal: here }]));
    callers.push(await callerWith(`${role} elsewhere`, [{ role, terminal: elsewhere }]));
  }
});
afterAll(() => booted.close());

async function callerWith(title: string, roles: { role: Role; terminal: string }[]): Promise<Caller> {
  const email = `${title.replace(/\W+/g, '-')}@example.org`;
  const { id } = await booted.app.get(PeopleService).add({ email, name: title, roles });
  return { title, personId: id, roles };
}

const cookies = new Map<string, string>();

/** One session a caller, save where the route may end it. */
async function cookieOf(personId: string, route: RouteSpec): Promise<string> {
  const kept = route.path.startsWith('/api/session') ? undefined : cookies.get(personId);
  if (kept !== undefined) return kept;
  const { token } = await booted.app.get(SignInService).openFor(personId, 'walk');
  const cookie = `${booted.app.get(SessionCookie).name}=${token}`;
  if (!route.path.startsWith('/api/session')) cookies.set(personId, cookie);
  return cookie;
}

/** The request as that caller would send it: the terminal where the route looks for it, nothing else of use. */
async function send(route: RouteSpec, caller: Caller): Promise<{ status: number; code: string | undefined }> {
  const path = addressOf(route);
  const headers: Record<string, string> = { 'Content-Type': 'application/json' };
  if (caller.personId !== null) {
    headers.Cookie = await cookieOf(caller.personId, route);
  }
  const hasBody = route.method === 'POST' || route.method === 'PUT';
  const stop = new AbortController();
  const answer = await fetch(`${base}${path}${route.terminal === 'query' ? `?terminal=${here}` : ''}`, {
    method: route.method,
    headers,
    signal: stop.signal,
    ...(hasBody ? { body: JSON.stringify(bodyOf(route)) } : {}),
  });
  const isJson = answer.headers.get('content-type')?.includes('application/json') === true;
  const code = isJson ? ((await answer.json()) as Partial<ErrorBody>).code : undefined;
  // A live stream would never end by itself.
  stop.abort();
  return { status: answer.status, code };
}

/** Things that stand at the terminal `here`: their route knows the terminal only once it has loaded them. */
const subjects: Record<string, string> = {};

function addressOf(route: RouteSpec): string {
  if (route.terminal !== 'subject') return route.path.replace(':code', here).replace(/:\w+/g, 'unknown');
  const subject = subjects[route.path.split('/:')[0] ?? ''];
  if (subject === undefined) throw new Error(`${route.path} needs a thing that stands at a terminal`);
  return route.path.replace(/:\w+/, subject);
}

/** Good enough to get past the parser where the terminal is judged behind it; elsewhere only the terminal. */
function bodyOf(route: RouteSpec): object {
  const observedAt = new Date().toISOString();
  const until = new Date(Date.now() + 10 * 60 * 1000).toISOString();
  const bodies: Record<string, object> = {
    '/api/turns/:id/entries': { id: randomUUID(), kind: 'note', observedAt, source: 'by-hand', note: 'walk' },
    '/api/alerts/:id/setting-aside': { until, reason: 'walk' },
    '/api/alerts/:id/closing': { cause: 'walk' },
  };
  return bodies[route.path] ?? { terminal: here };
}

async function addSubjects(): Promise<void> {
  const dispatcher = await signIn(booted.app, 'dispatcher', here);
  const scheduledDepartureAt = new Date(Date.now() + 2 * 3600 * 1000).toISOString();
  const serviceDate = scheduledDepartureAt.slice(0, 10);
  const outbound = { train: '100', scheduledDepartureAt };
  const answer = await dispatcher
    .post('/api/turns')
    .send({ terminal: here, serviceDate, outbound })
    .expect(201);
  const turn = answer.body as WireTurn;
  const alertId = randomUUID();
  await booted.app.get(UnitOfWork).run((transaction) =>
    transaction.manager.insert(AlertRow, {
      ...{ id: alertId, version: 1, terminalCode: here, serviceDate, lines: [], raisedAt: 0, createdAt: 0 },
      ...{ subjectKind: 'terminal', subjectId: here, cause: 'feed', priority: 'watch', state: 'raised' },
      ...{ subject: 'Harbor', text: 'walk', action: 'walk', actor: 'dispatcher' },
    }),
  );
  Object.assign(subjects, { '/api/turns': turn.id, '/api/plans': turn.planId, '/api/alerts': alertId });
}

/** What the table and the policy say must come of it. */
function expected(route: RouteSpec, caller: Caller): 'in' | 'signed out' | 'forbidden' {
  if (route.permission === 'public') return 'in';
  if (caller.personId === null) return 'signed out';
  const isNamed = route.terminal !== undefined && route.terminal !== 'none';
  const person = { id: caller.personId, roles: caller.roles };
  return may(person, route.permission, isNamed ? here : undefined) ? 'in' : 'forbidden';
}

function outcome(answer: { status: number; code: string | undefined }): string {
  if (answer.status === 401 && answer.code === 'session.missing') return 'signed out';
  if (answer.status === 403) return 'forbidden';
  if (answer.code === 'route.unknown') return 'no such route';
  return answer.status >= 500 ? `${answer.status}` : 'in';
}

describe('the table of routes', () => {
  const titleOf = (route: { method: string; path: string }) => `${route.method} ${route.path}`;

  test('names every route the service has, and none that it has not', () => {
    const { router } = booted.app.getHttpAdapter().getInstance();
    const served = router.stack.flatMap((layer) =>
      (layer.route?.stack ?? []).map((handler) => `${handler.method.toUpperCase()} ${layer.route?.path}`),
    );
    // The log hangs on every address by a pattern of its own.
    const ours = [...new Set(served)].filter((title) => !title.endsWith(' /{*path}'));
    expect(ours.sort()).toEqual(ROUTES.map(titleOf).sort());
  });

  test('names no route twice', () => {
    expect(new Set(ROUTES.map(titleOf)).size).toBe(ROUTES.length);
  });

  test('lets somebody in everywhere, and keeps somebody out of all that is not for everybody', () => {
    for (const route of ROUTES) {
      const outcomes = new Set(callers.map((caller) => expected(route, caller)));
      const isForAll = route.permission === 'public';
      expect([titleOf(route), outcomes.has('in'), outcomes.has('signed out')]).toEqual([
        titleOf(route),
        true,
        !isForAll,
      ]);
    }
  });
});

describe('every role on every route', () => {
  test.each(ROUTES.map((route) => [`${route.method} ${route.path}`, route] as const))(
    '%s',
    async (_title, route) => {
      const seen: Record<string, string> = {};
      const wanted: Record<string, string> = {};
      for (const caller of callers) {
        seen[caller.title] = outcome(await send(route, caller));
        wanted[caller.title] = expected(route, caller);
      }
      expect(seen).toEqual(wanted);
    },
  );
});
