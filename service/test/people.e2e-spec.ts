import type { CreatedPerson, OneTimeLink, WirePerson } from '@stubpost/shared';
import supertest from 'supertest';
import { FixedClock } from '../src/common/clock';
import { Reader } from '../src/database/reader';
import { TerminalsService } from '../src/terminals/terminals.service';
import { bootApp, type Booted } from './support/boot';
import { signInAs, type SignedInAgent } from './support/sign-in';

const password = 'seven tall lanterns';

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
const tokenOf = (link: OneTimeLink | undefined) => link?.url.split('/link/')[1] ?? '';

async function add(body: object): Promise<CreatedPerson> {
  const answer = await admin.agent.post('/api/people').send(body).expect(201);
  return answer.body as CreatedPerson;
}

describe('adding people', () => {
  const wren = {
    email: 'Wren@example.org',
    name: 'Wren Hollis',
    roles: [{ role: 'conductor', terminal: 'HBR' }],
  };

  test('with a password lets them sign in; the address is kept in small letters', async () => {
    const person = await add({ ...wren, password });
    expect(person).toMatchObject({
      email: 'wren@example.org',
      hasPassword: true,
      roles: wren.roles,
      active: true,
    });
    expect(person).not.toHaveProperty('link');
    await ask().post('/api/session').send({ email: 'wren@example.org', password }).expect(200);
  });

  test('never shows a password or its hash', async () => {
    await add({ ...wren, password });
    const answer = await admin.agent.get('/api/people').expect(200);
    expect(JSON.stringify(answer.body)).not.toMatch(/argon2|passwordHash/);
    const [row] = await booted.app
      .get(Reader)
      .query<{ password_hash: string }>('SELECT password_hash FROM person WHERE email = ?', [
        'wren@example.org',
      ]);
    expect(row?.password_hash).toMatch(/^\$argon2id\$v=19\$m=19456,t=2,p=1\$/);
  });

  test('twice with one address is 409', async () => {
    await add({ ...wren, password });
    const answer = await admin.agent.post('/api/people').send({ ...wren, email: 'wren@EXAMPLE.org' });
    expect(answer.status).toBe(409);
    expect(answer.body).toMatchObject({ code: 'people.exists' });
  });

  test.each([
    ['a role nobody knows', { roles: [{ role: 'king', terminal: '*' }] }, 'request.invalid'],
    [
      'a terminal that is not there',
      { roles: [{ role: 'conductor', terminal: 'XYZ' }] },
      'people.terminal_unknown',
    ],
    ['no address', { email: 'wren' }, 'request.invalid'],
    ['a password that is too short', { password: 'short' }, 'password.too_short'],
  ])('with %s is 400', async (_name, change, code) => {
    const answer = await admin.agent.post('/api/people').send({ ...wren, ...change });
    expect(answer.status).toBe(400);
    expect(answer.body).toMatchObject({ code });
  });
});

describe('a one-time link', () => {
  const invite = async () =>
    add({ email: 'wren@example.org', name: 'Wren Hollis', roles: [{ role: 'conductor', terminal: 'HBR' }] });

  test('comes with a person without a password, shows whom it is for, sets a password and signs in, once', async () => {
    const { link } = await invite();
    expect(link?.url).toMatch(/^http:\/\/127\.0\.0\.1:4600\/link\/[\w-]{32}$/);
    const seen = await ask()
      .get(`/api/links/${tokenOf(link)}`)
      .expect(200);
    expect(seen.body).toEqual({
      name: 'Wren Hollis',
      email: 'wren@example.org',
      expiresAt: '2026-03-04T22:00:00.000Z',
    });
    const used = await ask()
      .post(`/api/links/${tokenOf(link)}`)
      .send({ password })
      .expect(200);
    expect(used.headers['set-cookie']).toBeDefined();
    await ask().post('/api/session').send({ email: 'wren@example.org', password }).expect(200);
    await ask()
      .get(`/api/links/${tokenOf(link)}`)
      .expect(404);
    await ask()
      .post(`/api/links/${tokenOf(link)}`)
      .send({ password: 'another fine one' })
      .expect(404);
  });

  test('used twice at the same moment works for one of the two', async () => {
    const { link } = await invite();
    const answers = await Promise.all(
      ['first one of two', 'second one of two'].map((given) =>
        ask()
          .post(`/api/links/${tokenOf(link)}`)
          .send({ password: given }),
      ),
    );
    expect(answers.map((answer) => answer.status).sort()).toEqual([200, 404]);
  });

  test('runs out after a day', async () => {
    const { link } = await invite();
    clock.advance(24 * 3600 - 1);
    await ask()
      .get(`/api/links/${tokenOf(link)}`)
      .expect(200);
    clock.advance(1);
    const answer = await ask()
      .post(`/api/links/${tokenOf(link)}`)
      .send({ password })
      .expect(404);
    expect(answer.body).toMatchObject({ code: 'link.unknown' });
  });

  test('is not used up by a password that is not good enough', async () => {
    const { link } = await invite();
    await ask()
      .post(`/api/links/${tokenOf(link)}`)
      .send({ password: 'password1' })
      .expect(400);
    await ask()
      .post(`/api/links/${tokenOf(link)}`)
      .send({ password })
      .expect(200);
  });

  test('made anew makes the earlier one worthless, and ends sessions when used', async () => {
    const { id, link } = await invite();
    const first = await ask()
      .post(`/api/links/${tokenOf(link)}`)
      .send({ password })
      .expect(200);
    const cookie = (first.headers['set-cookie'] as unknown as string[])[0] ?? '';
    const second = (await admin.agent.post(`/api/people/${id}/link`).expect(201)).body as OneTimeLink;
    const third = (await admin.agent.post(`/api/people/${id}/link`).expect(201)).body as OneTimeLink;
    await ask()
      .get(`/api/links/${tokenOf(second)}`)
      .expect(404);
    await ask().get('/api/session').set('Cookie', cookie).expect(200);
    await ask()
      .post(`/api/links/${tokenOf(third)}`)
      .send({ password: 'nine small harbours' })
      .expect(200);
    await ask().get('/api/session').set('Cookie', cookie).expect(401);
  });

  test('is kept as a hash only', async () => {
    const { link } = await invite();
    const rows = await booted.app.get(Reader).query('SELECT * FROM one_time_link');
    expect(JSON.stringify(rows)).not.toContain(tokenOf(link));
  });
});

describe('changing people', () => {
  test('name and roles; a lost race is 412', async () => {
    const person = await add({ email: 'wren@example.org', name: 'Wren', password, roles: [] });
    const roles = [{ role: 'dispatcher', terminal: 'HBR' }];
    const answer = await admin.agent
      .put(`/api/people/${person.id}`)
      .send({ version: person.version, name: 'Wren Hollis', roles })
      .expect(200);
    expect(answer.body).toMatchObject({ name: 'Wren Hollis', roles, version: person.version + 1 });
    const late = await admin.agent
      .put(`/api/people/${person.id}`)
      .send({ version: person.version, name: 'W' });
    expect(late.status).toBe(412);
    expect(late.body).toMatchObject({ code: 'people.changed' });
  });

  test('new roles count from the next request on', async () => {
    const conductor = await signInAs(booted.app, 'conductor', 'HBR');
    await conductor.agent.get('/api/people').expect(403);
    await admin.agent
      .put(`/api/people/${conductor.personId}`)
      .send({ roles: [{ role: 'administrator', terminal: '*' }] })
      .expect(200);
    await conductor.agent.get('/api/people').expect(200);
  });

  test('a new password given by an administrator ends all sessions', async () => {
    const conductor = await signInAs(booted.app, 'conductor', 'HBR');
    await admin.agent.put(`/api/people/${conductor.personId}/password`).send({ password }).expect(204);
    await conductor.agent.get('/api/session').expect(401);
  });

  test('sessions can be ended for somebody', async () => {
    const conductor = await signInAs(booted.app, 'conductor', 'HBR');
    await admin.agent.delete(`/api/people/${conductor.personId}/sessions`).expect(204);
    await conductor.agent.get('/api/session').expect(401);
    const people = (await admin.agent.get('/api/people').expect(200)).body as WirePerson[];
    expect(people.find((person) => person.id === conductor.personId)?.sessions).toBe(0);
  });

  test.each([
    ['switched off', { active: false }],
    ['given another role', { roles: [{ role: 'conductor', terminal: '*' }] }],
    ['kept to one terminal', { roles: [{ role: 'administrator', terminal: 'HBR' }] }],
  ])('the last administrator cannot be %s', async (_name, change) => {
    const answer = await admin.agent.put(`/api/people/${admin.personId}`).send(change).expect(409);
    expect(answer.body).toMatchObject({ code: 'people.last_administrator' });
    await admin.agent.get('/api/people').expect(200);
    await signInAs(booted.app, 'administrator');
    await admin.agent.put(`/api/people/${admin.personId}`).send(change).expect(200);
  });

  test.each(['put', 'link', 'password', 'sessions'])('nobody is 404: %s', async (what) => {
    const calls: Record<string, () => supertest.Test> = {
      put: () => admin.agent.put('/api/people/nobody').send({ name: 'N' }),
      link: () => admin.agent.post('/api/people/nobody/link'),
      password: () => admin.agent.put('/api/people/nobody/password').send({ password }),
      sessions: () => admin.agent.delete('/api/people/nobody/sessions'),
    };
    const answer = await calls[what]?.();
    expect(answer?.status).toBe(404);
  });
});

describe('an administrator of one terminal', () => {
  let local: SignedInAgent;
  beforeEach(async () => {
    await booted.app.get(TerminalsService).add({ code: 'CAM', name: 'Camden', zone: 'America/New_York' });
    local = await signInAs(booted.app, 'administrator', 'HBR');
  });
  const grant = (terminal: string, role = 'conductor') => ({ roles: [{ role, terminal }] });
  const wren = { email: 'wren@example.org', name: 'Wren Hollis', password };

  test('adds and changes people there', async () => {
    const answer = await local.agent
      .post('/api/people')
      .send({ ...wren, ...grant('HBR') })
      .expect(201);
    const { id } = answer.body as CreatedPerson;
    await local.agent.put(`/api/people/${id}`).send(grant('HBR', 'dispatcher')).expect(200);
  });

  test('gives nobody a role elsewhere or everywhere, least of all themselves', async () => {
    for (const terminal of ['CAM', '*']) {
      const answer = await local.agent
        .post('/api/people')
        .send({ ...wren, ...grant(terminal) })
        .expect(403);
      expect(answer.body).toMatchObject({ code: 'access.forbidden' });
    }
    await local.agent.put(`/api/people/${local.personId}`).send(grant('*', 'administrator')).expect(403);
  });

  test('does nothing to people who hold roles elsewhere', async () => {
    const other = (await signInAs(booted.app, 'conductor', 'CAM')).personId;
    for (const id of [other, admin.personId]) {
      await local.agent.put(`/api/people/${id}`).send({ name: 'Taken over' }).expect(403);
      await local.agent.put(`/api/people/${id}`).send(grant('HBR')).expect(403);
      await local.agent.post(`/api/people/${id}/link`).expect(403);
      await local.agent.put(`/api/people/${id}/password`).send({ password }).expect(403);
      await local.agent.delete(`/api/people/${id}/sessions`).expect(403);
    }
  });
});

describe('GET /api/crew', () => {
  test('names the crews of one terminal and of all, by name', async () => {
    await booted.app.get(TerminalsService).add({ code: 'CAM', name: 'Camden', zone: 'America/New_York' });
    const both = [
      { role: 'conductor', terminal: 'HBR' },
      { role: 'engineer', terminal: '*' },
    ];
    await add({ email: 'b@example.org', name: 'B', roles: both });
    const local = [{ role: 'engineer', terminal: 'HBR' }];
    await add({ email: 'a@example.org', name: 'A', badge: 'E-17', roles: local });
    await add({ email: 'c@example.org', name: 'C', roles: [{ role: 'engineer', terminal: 'CAM' }] });
    const dispatcher = await signInAs(booted.app, 'dispatcher', 'HBR');
    const answer = await dispatcher.agent.get('/api/crew?terminal=HBR').expect(200);
    const crew = (answer.body as { id: string; name: string; as: string[] }[]).map(
      ({ id: _id, as, ...rest }) => ({
        ...rest,
        as: [...as].sort(),
      }),
    );
    expect(crew).toEqual([
      { name: 'A', as: ['engineer'], badge: 'E-17' },
      { name: 'B', as: ['conductor', 'engineer'] },
    ]);
    expect(JSON.stringify(answer.body)).not.toContain('example.org');
    await dispatcher.agent.get('/api/crew?terminal=CAM').expect(403);
  });
});
