import supertest from 'supertest';
import { bootApp, type Booted } from './support/boot';

const first = { email: 'first@example.org', name: 'First', password: 'seven tall lanterns' };
let booted: Booted;
afterEach(() => booted.close());
const ask = () => supertest(booted.app.getHttpServer());

describe('the set-up of an empty installation', () => {
  test('makes the first administrator and signs them in, once', async () => {
    booted = await bootApp();
    expect((await ask().get('/api/setup').expect(200)).body).toEqual({ needed: true });
    const answer = await ask().post('/api/setup').send(first).expect(201);
    const cookie = (answer.headers['set-cookie'] as unknown as string[])[0] ?? '';
    await ask().get('/api/people').set('Cookie', cookie).expect(200);
    expect((await ask().get('/api/setup').expect(200)).body).toEqual({ needed: false });
    const again = await ask()
      .post('/api/setup')
      .send({ ...first, email: 'second@example.org' });
    expect(again.status).toBe(409);
    expect(again.body).toMatchObject({ code: 'setup.done' });
  });

  test('asked for twice at the same moment makes one administrator', async () => {
    booted = await bootApp();
    const answers = await Promise.all(
      ['a', 'b'].map((name) =>
        ask()
          .post('/api/setup')
          .send({ ...first, email: `${name}@example.org` }),
      ),
    );
    expect(answers.map((answer) => answer.status).sort()).toEqual([201, 409]);
  });

  test('is not needed when the environment names the administrator', async () => {
    booted = await bootApp({
      environment: { ADMIN_EMAIL: 'Boss@example.org', ADMIN_PASSWORD: first.password },
    });
    expect((await ask().get('/api/setup').expect(200)).body).toEqual({ needed: false });
    const answer = await ask()
      .post('/api/session')
      .send({ email: 'boss@example.org', password: first.password });
    expect(answer.body).toMatchObject({ person: { roles: [{ role: 'administrator', terminal: '*' }] } });
  });

  test('is closed while an empty database is about to become a demo', async () => {
    booted = await bootApp({ environment: { DEMO: 'live' } });
    expect((await ask().get('/api/setup').expect(200)).body).toEqual({ needed: false });
    await ask().post('/api/setup').send(first).expect(409);
  });
});
