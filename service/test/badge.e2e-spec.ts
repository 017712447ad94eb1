import { randomUUID } from 'node:crypto';
import type { CreatedPerson, WirePerson } from '@stubpost/shared';
import supertest from 'supertest';
import { FixedClock } from '../src/common/clock';
import { Reader } from '../src/database/reader';
import { TerminalsService } from '../src/terminals/terminals.service';
import { bootApp, type Booted } from './support/boot';
import { signInAs, type SignedInAgent } from './support/sign-in';

const password = 'seven tall lanterns';
const pin = '4471';

let clock: FixedClock;
let booted: Booted;
let admin: SignedInAgent;

beforeEach(async () => {
  clock = new FixedClock(Date.parse('2026-03-03T22:00:00Z'));
  booted = await bootApp({ clock });
  await booted.app.get(TerminalsService).add({ code: 'HBR', name: 'Harbor', zone: 'America/New_York' });
  admin = await signInAs(booted.app, 'administrator');
});
afterEach(() => booted.close());

const ask = () => supertest(booted.app.getHttpServer());

/** A browser signed in with these; its jar would drop the cookie, since the service's clock is not the machine's. */
async function signedInWith(credentials: object): Promise<ReturnType<typeof supertest.agent>> {
  const answer = await ask().post('/api/session').send(credentials).expect(200);
  const [cookie = ''] = answer.headers['set-cookie'] as unknown as string[];
  const agent = supertest.agent(booted.app.getHttpServer());
  void agent.set('Cookie', cookie.split(';')[0] ?? '');
  return agent;
}

async function add(name: string, badge?: string): Promise<CreatedPerson> {
  const body = {
    email: `${name}@example.org`,
    name,
    password,
    roles: [{ role: 'conductor', terminal: 'HBR' }],
    ...(badge === undefined ? {} : { badge }),
  };
  return (await admin.agent.post('/api/people').send(body).expect(201)).body as CreatedPerson;
}

/** Somebody with badge C-12 and the PIN set by themselves. */
async function withPin(): Promise<CreatedPerson> {
  const person = await add('wren', 'c-12');
  const own = await signedInWith({ badge: 'C-12', password });
  await own.put('/api/session/pin').send({ current: password, pin }).expect(204);
  return person;
}

describe('badges', () => {
  test('are given out by the administrator, in large letters, and open with the password', async () => {
    expect(await add('wren', ' c-12 ')).toMatchObject({ badge: 'C-12', hasPin: false });
    await ask().post('/api/session').send({ badge: 'c-12', password }).expect(200);
    await ask().post('/api/session').send({ badge: 'C-13', password }).expect(401);
  });

  test('belong to one person; a second is 409 and changes nothing', async () => {
    await add('wren', 'C-12');
    const other = await add('osei');
    const answer = await admin.agent.put(`/api/people/${other.id}`).send({ badge: 'c-12' });
    expect(answer.status).toBe(409);
    expect(answer.body).toMatchObject({ code: 'people.badge_taken', facts: { badge: 'C-12' } });
    await admin.agent.put(`/api/people/${other.id}`).send({ badge: 'C-14' }).expect(200);
    await admin.agent.put(`/api/people/${other.id}`).send({ badge: 'C-14', name: 'Osei' }).expect(200);
  });

  test('taken away, they take the PIN along', async () => {
    const person = await withPin();
    const taken = await admin.agent.put(`/api/people/${person.id}`).send({ badge: null }).expect(200);
    expect(taken.body).toMatchObject({ badge: null, hasPin: false } satisfies Partial<WirePerson>);
    await admin.agent.put(`/api/people/${person.id}`).send({ badge: 'C-12' }).expect(200);
    await ask().post('/api/session').send({ badge: 'C-12', pin }).expect(401);
  });

  test.each([['C 12'], ['-12'], ['X'], ['ABCDEFGHIJKLM']])('cannot read %s', async (badge) => {
    const body = { email: 'a@example.org', name: 'A', roles: [], badge };
    await admin.agent.post('/api/people').send(body).expect(400);
  });
});

describe('a PIN', () => {
  test('opens together with the badge, and only with it', async () => {
    await withPin();
    const opened = await ask().post('/api/session').send({ badge: 'c-12', pin }).expect(200);
    expect(opened.body).toMatchObject({ person: { name: 'wren' } });
    await ask().post('/api/session').send({ badge: 'C-12', pin: '4472' }).expect(401);
    await ask().post('/api/session').send({ badge: 'C-12', password: pin }).expect(401);
    await ask().post('/api/session').send({ email: 'wren@example.org', password: pin }).expect(401);
    await ask().post('/api/session').send({ email: 'wren@example.org', pin }).expect(400);
  });

  test('is kept as an argon2id hash and never shown', async () => {
    const person = await withPin();
    const [row] = await booted.app
      .get(Reader)
      .query<{ pin_hash: string }>('SELECT pin_hash FROM person WHERE id = ?', [person.id]);
    expect(row?.pin_hash).toMatch(/^\$argon2id\$v=19\$m=19456,t=2,p=1\$/);
    const list = await admin.agent.get('/api/people').expect(200);
    expect(JSON.stringify(list.body)).not.toMatch(/argon2|pinHash|pin_hash/);
  });

  test('is set with the current password, goes with a badge, and is not among the first that are tried', async () => {
    await add('wren', 'C-12');
    await add('osei');
    const own = await signedInWith({ badge: 'C-12', password });
    expect((await own.get('/api/session/pin').expect(200)).body).toEqual({
      badge: 'C-12',
      hasPin: false,
      hasPassword: true,
    });
    await own.put('/api/session/pin').send({ pin }).expect(403);
    await own.put('/api/session/pin').send({ current: 'not it at all', pin }).expect(403);
    const simple = await own.put('/api/session/pin').send({ current: password, pin: '1234' }).expect(400);
    expect(simple.body).toMatchObject({ code: 'pin.too_simple' });
    await own.put('/api/session/pin').send({ current: password, pin: '44a1' }).expect(400);
    const osei = await signedInWith({ email: 'osei@example.org', password });
    const none = await osei.put('/api/session/pin').send({ current: password, pin }).expect(409);
    expect(none.body).toMatchObject({ code: 'pin.no_badge' });
  });

  test('can be taken away by its owner', async () => {
    await withPin();
    const own = await signedInWith({ badge: 'C-12', pin });
    await own.put('/api/session/pin').send({ current: password, pin: null }).expect(204);
    await ask().post('/api/session').send({ badge: 'C-12', pin }).expect(401);
  });

  test('is throttled as a password is: after five wrong ones even the right one waits', async () => {
    await withPin();
    for (let attempt = 0; attempt < 5; attempt += 1)
      await ask()
        .post('/api/session')
        .send({ badge: 'C-12', pin: `900${attempt}` })
        .expect(401);
    const waits = await ask().post('/api/session').send({ badge: 'c-12', pin });
    expect(waits.status).toBe(429);
    expect(waits.body).toMatchObject({ code: 'session.too_many_tries', facts: { retryAfterSeconds: 30 } });
    clock.set(clock.now() + 30_000);
    await ask().post('/api/session').send({ badge: 'C-12', pin }).expect(200);
  });
});

describe('a request that says whose it is', () => {
  test('is taken with that person’s session and refused with anybody else’s', async () => {
    const wren = await add('wren', 'C-12');
    const osei = await add('osei', 'C-13');
    const shared = await signedInWith({ badge: 'C-13', password });
    await shared.get('/api/session').set('stubpost-person', osei.id).expect(200);
    const refused = await shared
      .post(`/api/turns/${randomUUID()}/entries`)
      .set('stubpost-person', wren.id)
      .send({ id: randomUUID(), kind: 'briefing', observedAt: '2026-03-03T22:00:00Z', source: 'by-hand' });
    expect(refused.status).toBe(401);
    expect(refused.body).toMatchObject({ code: 'session.other_person' });
  });
});
