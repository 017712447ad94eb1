import { createHmac } from 'node:crypto';
import { statSync } from 'node:fs';
import path from 'node:path';
import supertest from 'supertest';
import { sessionIdleMilliseconds, sessionLongestMilliseconds } from '../src/auth/sessions.service';
import { SessionEndings } from '../src/auth/session-endings';
import { SignInThrottle } from '../src/auth/sign-in-throttle';
import { FixedClock } from '../src/common/clock';
import { PeopleService } from '../src/people/people.service';
import { bootApp, type Booted } from './support/boot';
import { agentFor, signInAs } from './support/sign-in';

const password = 'seven tall lanterns';
const email = 'wren@example.org';

let clock: FixedClock;
let booted: Booted;
let personId: string;

beforeEach(async () => {
  clock = new FixedClock(Date.parse('2026-03-03T22:00:00Z'));
  booted = await bootApp({ clock });
  const added = await booted.app
    .get(PeopleService)
    .add({ email, name: 'Wren Hollis', password, roles: [{ role: 'dispatcher', terminal: '*' }] });
  personId = added.id;
});
afterEach(() => booted.close());

const ask = () => supertest(booted.app.getHttpServer());
const tryWith = (given: string, as = email) =>
  ask().post('/api/session').send({ email: as, password: given });

function cookieOf(answer: supertest.Response): string {
  const [cookie] = answer.headers['set-cookie'] as unknown as string[];
  if (cookie === undefined) throw new Error('no cookie was set');
  return cookie;
}

describe('signing in', () => {
  test('with the right pair answers the person and sets one strict cookie', async () => {
    const answer = await tryWith(password).expect(200);
    expect(answer.body).toEqual({
      person: { id: personId, name: 'Wren Hollis', roles: [{ role: 'dispatcher', terminal: '*' }] },
    });
    const cookie = cookieOf(answer);
    expect(cookie).toMatch(/^stubpost-4600=/);
    expect(cookie).toMatch(/; HttpOnly/);
    expect(cookie).toMatch(/; SameSite=Strict/);
    expect(cookie).toMatch(/; Path=\//);
    expect(cookie).not.toMatch(/Secure/);
    const who = await ask().get('/api/session').set('Cookie', cookie).expect(200);
    expect(who.body).toEqual(answer.body);
  });

  test('does not ask for small letters in the address', async () => {
    await tryWith(password, 'Wren@Example.ORG').expect(200);
  });

  test.each([
    ['a wrong password', email, 'seven tall lantern'],
    ['an unknown address', 'nobody@example.org', password],
    ['no address at all', 'wren', password],
  ])('with %s is 401 and does not say which was wrong', async (_name, as, given) => {
    const answer = await tryWith(given, as).expect(401);
    expect(answer.body).toMatchObject({
      code: 'session.wrong_credentials',
      message: 'the two do not fit together',
    });
    expect(answer.headers).not.toHaveProperty('set-cookie');
  });

  test('over https the cookie is Secure and bound to the host', async () => {
    const secure = await bootApp({ environment: { PUBLIC_URL: 'https://turns.example.org' } });
    await secure.app.get(PeopleService).add({ email, name: 'Wren Hollis', password, roles: [] });
    const answer = await supertest(secure.app.getHttpServer()).post('/api/session').send({ email, password });
    expect(cookieOf(answer)).toMatch(/^__Host-stubpost-443=.*; Secure/);
    expect(cookieOf(answer)).not.toMatch(/Domain/);
    await secure.close();
  });

  test('anew ends the session the browser had', async () => {
    const first = cookieOf(await tryWith(password));
    await ask().post('/api/session').set('Cookie', first).send({ email, password }).expect(200);
    await ask().get('/api/session').set('Cookie', first).expect(401);
  });
});

describe('a session', () => {
  test('ends with signing out, at once and for every copy of the cookie', async () => {
    const cookie = cookieOf(await tryWith(password));
    const ended: string[] = [];
    booted.app.get(SessionEndings).ended.subscribe((id) => ended.push(id));
    await ask().delete('/api/session').set('Cookie', cookie).expect(204);
    const answer = await ask().get('/api/session').set('Cookie', cookie).expect(401);
    expect(answer.body).toMatchObject({ code: 'session.missing' });
    expect(ended).toHaveLength(1);
  });

  test('falls idle when nobody uses it, and not while somebody does', async () => {
    const cookie = cookieOf(await tryWith(password));
    const who = () => ask().get('/api/session').set('Cookie', cookie);
    clock.advance(sessionIdleMilliseconds / 1000 - 1);
    await who().expect(200);
    clock.advance(sessionIdleMilliseconds / 1000 - 1);
    await who().expect(200);
    clock.advance(sessionIdleMilliseconds / 1000);
    await who().expect(401);
  });

  test('is over after its longest time, however much it is used', async () => {
    const cookie = cookieOf(await tryWith(password));
    const step = sessionIdleMilliseconds / 2000;
    for (let passed = step; passed < sessionLongestMilliseconds / 1000; passed += step) {
      clock.advance(step);
      await ask().get('/api/session').set('Cookie', cookie).expect(200);
    }
    clock.advance(step);
    await ask().get('/api/session').set('Cookie', cookie).expect(401);
  });

  test('of a person who was switched off is worth nothing', async () => {
    const cookie = cookieOf(await tryWith(password));
    const admin = await signInAs(booted.app, 'administrator');
    await admin.agent.put(`/api/people/${personId}`).send({ active: false }).expect(200);
    await ask().get('/api/session').set('Cookie', cookie).expect(401);
    await tryWith(password).expect(401);
  });

  test.each([
    ['unsigned', (header: string, body: string) => `${header}.${body}.`, { alg: 'none' }],
    [
      'signed with another key',
      (header: string, body: string) =>
        `${header}.${body}.${createHmac('sha256', 'x'.repeat(48)).update(`${header}.${body}`).digest('base64url')}`,
      { alg: 'HS256' },
    ],
  ])('%s token is nobody', async (_name, seal, header) => {
    const token =
      cookieOf(await tryWith(password))
        .split(';')[0]
        ?.split('=')[1] ?? '';
    const body = token.split('.')[1] ?? '';
    const forged = seal(Buffer.from(JSON.stringify({ ...header, typ: 'JWT' })).toString('base64url'), body);
    await ask().get('/api/session').set('Cookie', `stubpost-4600=${token}`).expect(200);
    await ask().get('/api/session').set('Cookie', `stubpost-4600=${forged}`).expect(401);
  });

  test('stands in a list of one’s own, from which any can be ended', async () => {
    const elsewhere = cookieOf(await tryWith(password));
    clock.advance(60);
    const here = cookieOf(
      await ask().post('/api/session').set('User-Agent', 'desk browser').send({ email, password }),
    );
    const list = await ask().get('/api/session/list').set('Cookie', here).expect(200);
    const sessions = list.body as { id: string; current: boolean; device: string; startedAt: string }[];
    expect(sessions.map(({ current, device }) => ({ current, device }))[0]).toEqual({
      current: true,
      device: 'desk browser',
    });
    const other = sessions.find((session) => !session.current);
    await ask().delete(`/api/session/list/${other?.id}`).set('Cookie', here).expect(204);
    await ask().get('/api/session').set('Cookie', elsewhere).expect(401);
    await ask().delete(`/api/session/list/${other?.id}`).set('Cookie', here).expect(404);
  });

  test('of somebody else cannot be ended from one’s own list', async () => {
    const other = await signInAs(booted.app, 'conductor');
    const list = await other.agent.get('/api/session/list').expect(200);
    const [session] = list.body as { id: string }[];
    await (await agentFor(booted.app, personId)).delete(`/api/session/list/${session?.id}`).expect(404);
    await other.agent.get('/api/session').expect(200);
  });

  test('is signed with a secret that only its owner can read and that outlives a restart', async () => {
    expect(statSync(path.join(booted.dataDir, 'session-secret')).mode & 0o777).toBe(0o600);
    const cookie = cookieOf(await tryWith(password));
    await booted.app.close();
    const again = await bootApp({ clock, dataDir: booted.dataDir });
    await supertest(again.app.getHttpServer()).get('/api/session').set('Cookie', cookie).expect(200);
    await again.close();
  });
});

describe('failed tries', () => {
  const failTimes = async (times: number, as = email) => {
    for (let n = 0; n < times; n += 1) await tryWith('wrong guess', as).expect(401);
  };

  test('for one account are slowed down after five, also for the right password, until the wait is over', async () => {
    await failTimes(5);
    const answer = await tryWith(password).expect(429);
    expect(answer.body).toMatchObject({ code: 'session.too_many_tries', facts: { retryAfterSeconds: 30 } });
    expect(answer.headers['retry-after']).toBe('30');
    clock.advance(30);
    await tryWith(password).expect(200);
  });

  test('wait twice as long with each further one, but never longer than a quarter of an hour', async () => {
    await failTimes(5);
    const waits: number[] = [];
    for (let n = 0; n < 7; n += 1) {
      const answer = await tryWith('wrong guess').expect(429);
      const { facts } = answer.body as { facts: { retryAfterSeconds: number } };
      waits.push(facts.retryAfterSeconds);
      clock.advance(facts.retryAfterSeconds);
      await tryWith('wrong guess').expect(401);
    }
    expect(waits).toEqual([30, 60, 120, 240, 480, 900, 900]);
  });

  test('are forgotten with a good one', async () => {
    await failTimes(4);
    await tryWith(password).expect(200);
    await failTimes(4);
    await tryWith(password).expect(200);
  });

  test('for one account do not lock others out', async () => {
    const other = 'juno@example.org';
    await booted.app.get(PeopleService).add({ email: other, name: 'Juno', password, roles: [] });
    await failTimes(5);
    await tryWith(password, other).expect(200);
  });

  test('sent all at once count as many', async () => {
    const answers = await Promise.all([...Array(20).keys()].map(() => tryWith('wrong guess')));
    expect(answers.filter((answer) => answer.status === 401)).toHaveLength(5);
    expect(answers.filter((answer) => answer.status === 429)).toHaveLength(15);
  });

  test('from one address are slowed down after fifty; a forwarded address counts behind a trusted proxy only', async () => {
    const trusting = await bootApp({ environment: { TRUST_PROXY: 'loopback' } });
    const tryFrom = (address: string, app: Booted) =>
      supertest(app.app.getHttpServer())
        .post('/api/session')
        .set('X-Forwarded-For', address)
        .send({ email: `guess-from-${address}@example.org`, password: 'wrong guess' });
    for (const { app } of [trusting, booted]) {
      for (let n = 0; n < 50; n += 1) {
        await app.get(SignInThrottle).admit({ account: `guess-${n}@example.org`, address: '203.0.113.7' });
      }
    }
    await tryFrom('203.0.113.7', trusting).expect(429);
    await tryFrom('203.0.113.8', trusting).expect(401);
    await tryFrom('203.0.113.7', booted).expect(401);
    await trusting.close();
  });
});

describe('one’s own password', () => {
  const change = async (current: string, next: string, cookie: string) =>
    ask().put('/api/session/password').set('Cookie', cookie).send({ current, password: next });

  test('is changed with the current one; other sessions end, this one stays', async () => {
    const elsewhere = cookieOf(await tryWith(password));
    const here = cookieOf(await tryWith(password));
    expect((await change(password, 'nine small harbours', here)).status).toBe(204);
    await ask().get('/api/session').set('Cookie', here).expect(200);
    await ask().get('/api/session').set('Cookie', elsewhere).expect(401);
    await tryWith(password).expect(401);
    await tryWith('nine small harbours').expect(200);
  });

  test('is not changed with a wrong one, and guesses are counted', async () => {
    const cookie = cookieOf(await tryWith(password));
    for (let n = 0; n < 5; n += 1)
      expect((await change('wrong guess', 'nine small harbours', cookie)).status).toBe(403);
    expect((await change(password, 'nine small harbours', cookie)).status).toBe(429);
  });

  test.each([
    ['a short one', 'short', 'password.too_short'],
    ['a well-known one', 'Password2024!', 'password.common'],
    ['one’s own name', 'wren hollis', 'password.common'],
    ['an endless one', 'x9'.repeat(70), 'password.too_long'],
  ])('%s is refused', async (_name, next, code) => {
    const cookie = cookieOf(await tryWith(password));
    const answer = await change(password, next, cookie);
    expect(answer.status).toBe(400);
    expect(answer.body).toMatchObject({ code });
  });

  test('may be long, and of any characters', async () => {
    const long = 'ünïcödé und Schienen, zwölf Wagen und ein Prellbock am Ende des Gleises 7';
    const cookie = cookieOf(await tryWith(password));
    expect((await change(password, long, cookie)).status).toBe(204);
    await tryWith(long).expect(200);
  });
});
