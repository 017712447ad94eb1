import { mkdirSync, writeFileSync } from 'node:fs';
import path from 'node:path';
import supertest from 'supertest';
import { pathForLog } from '../src/common/path-for-log';
import { bootApp, type Booted } from './support/boot';
import { signIn } from './support/sign-in';
import { temporaryFolder } from './support/temporary-folder';
import { testCertificate, testKey } from './support/tls';

describe('answers of the service', () => {
  let booted: Booted;
  beforeAll(async () => {
    booted = await bootApp();
  });
  afterAll(() => booted.close());
  const ask = () => supertest(booted.app.getHttpServer());

  test('an unknown route is 404 route.unknown, with the id that the header names', async () => {
    const answer = await ask().get('/api/nothing-here').expect(404);
    expect(answer.body).toEqual({
      code: 'route.unknown',
      message: 'there is no such route',
      facts: {},
      requestId: answer.headers['x-request-id'],
    });
  });

  test.each(['/api', '/api/', '/assets/gone.js', '/api/people/x/y/z'])(
    '%s is never the page',
    async (address) => {
      const answer = await ask().get(address).set('Accept', 'text/html').expect(404);
      expect(answer.body).toMatchObject({ code: 'route.unknown' });
    },
  );

  test('JSON that cannot be read is 400', async () => {
    const answer = await ask().post('/api/session').type('json').send('{"email": ').expect(400);
    expect(answer.body).toMatchObject({ code: 'request.malformed' });
  });

  test('a body that is too large is 413', async () => {
    const password = 'x'.repeat(600 * 1024);
    const answer = await ask().post('/api/session').send({ email: 'a@example.org', password }).expect(413);
    expect(answer.body).toMatchObject({ code: 'request.too_large' });
  });

  test('an unknown field is 400 and named', async () => {
    const answer = await ask()
      .post('/api/session')
      .send({ email: 'a@example.org', password: 'x', role: 'administrator' });
    expect(answer.status).toBe(400);
    expect(answer.body).toMatchObject({
      code: 'request.invalid',
      facts: { problems: [{ message: expect.stringContaining('role') as string }] },
    });
  });

  test('a form is not taken for JSON', async () => {
    await ask()
      .post('/api/session')
      .type('form')
      .send({ email: 'a@example.org', password: 'secret-12345' })
      .expect(400);
  });

  test('a query that reaches for the prototype changes nothing', async () => {
    const body = '{"email":"a@example.org","password":"x","__proto__":{"isAdmin":true}}';
    await ask().post('/api/session').type('json').send(body);
    expect({}).not.toHaveProperty('isAdmin');
  });

  test('the interface is kept by nobody', async () => {
    const answer = await ask().get('/api/health').expect(200);
    expect(answer.headers['cache-control']).toBe('no-store');
  });
});

describe('headers', () => {
  async function headersWith(environment: NodeJS.ProcessEnv): Promise<Record<string, string>> {
    const booted = await bootApp({ environment });
    try {
      const answer = await supertest(booted.app.getHttpServer()).get('/api/health');
      return answer.headers;
    } finally {
      await booted.close();
    }
  }

  test('on plain http: scripts of our own only, nothing that would break plain http', async () => {
    const headers = await headersWith({});
    const policy = headers['content-security-policy'] ?? '';
    expect(policy).toContain("script-src 'self';");
    expect(policy).toContain("object-src 'none'");
    expect(policy).toContain("base-uri 'none'");
    expect(policy).toContain("frame-ancestors 'none'");
    expect(policy).not.toMatch(/script-src[^;]*unsafe/);
    expect(policy).not.toContain('upgrade-insecure-requests');
    expect(headers).not.toHaveProperty('strict-transport-security');
    expect(headers['x-content-type-options']).toBe('nosniff');
    expect(headers).not.toHaveProperty('x-powered-by');
  });

  test('on https: HSTS for a year, and plain requests are upgraded', async () => {
    const headers = await headersWith({ PUBLIC_URL: 'https://turns.example.org' });
    expect(headers['strict-transport-security']).toContain('max-age=31536000');
    expect(headers['content-security-policy']).toContain('upgrade-insecure-requests');
  });
});

describe('a service with a certificate', () => {
  test('serves https itself, with a cookie bound to the host', async () => {
    const temporary = temporaryFolder();
    const [cert, key] = ['cert.pem', 'key.pem'].map((name) => path.join(temporary.folder, name));
    writeFileSync(cert ?? '', testCertificate);
    writeFileSync(key ?? '', testKey);
    const environment = {
      TLS_CERT: cert,
      TLS_KEY: key,
      ADMIN_EMAIL: 'boss@example.org',
      ADMIN_PASSWORD: 'seven tall lanterns',
    };
    const booted = await bootApp({ environment });
    const answer = await supertest(booted.app.getHttpServer())
      .post('/api/session')
      .ca(testCertificate)
      .send({ email: 'boss@example.org', password: 'seven tall lanterns' })
      .expect(200);
    expect(String(answer.headers['set-cookie'])).toMatch(/^__Host-.*; Secure/);
    await booted.close();
    temporary.remove();
  });
});

describe('the cross-site rule', () => {
  let booted: Booted;
  let agent: Awaited<ReturnType<typeof signIn>>;
  beforeAll(async () => {
    booted = await bootApp({ environment: { PUBLIC_URL: 'http://turns.example.org' } });
    agent = await signIn(booted.app, 'administrator');
  });
  afterAll(() => booted.close());

  test.each([
    ['no header at all', {}],
    ['same origin', { 'Sec-Fetch-Site': 'same-origin' }],
    ['typed by the user', { 'Sec-Fetch-Site': 'none' }],
    ['our own address', { Origin: 'http://turns.example.org' }],
    ['the address it was sent to', { Host: 'desk:4600', Origin: 'http://desk:4600' }],
  ])('lets pass: %s', async (_name, headers) => {
    await agent.get('/api/session').set(headers).expect(200);
  });

  test.each([
    ['another site', { 'Sec-Fetch-Site': 'cross-site' }],
    ['another port of the site', { 'Sec-Fetch-Site': 'same-site' }],
    ['another origin', { Origin: 'https://elsewhere.example' }],
    ['an origin that hides', { Origin: 'null' }],
    ['our name by another scheme', { Origin: 'https://turns.example.org' }],
  ])('refuses, also when only reading: %s', async (_name, headers) => {
    const answer = await agent.get('/api/session').set(headers).expect(403);
    expect(answer.body).toMatchObject({ code: 'session.cross_site' });
  });

  test('refuses that another site signs somebody in', async () => {
    await supertest(booted.app.getHttpServer())
      .post('/api/session')
      .set('Origin', 'https://elsewhere.example')
      .send({ email: 'a@example.org', password: 'secret-12345' })
      .expect(403);
  });

  test('lets anybody read what is public, without a cookie', async () => {
    await supertest(booted.app.getHttpServer())
      .get('/api/health')
      .set('Sec-Fetch-Site', 'cross-site')
      .expect(200);
  });
});

describe('the user interface', () => {
  const temporary = temporaryFolder();
  let booted: Booted;
  beforeAll(async () => {
    mkdirSync(path.join(temporary.folder, 'assets'));
    writeFileSync(path.join(temporary.folder, 'index.html'), '<title>Stubpost</title>');
    writeFileSync(path.join(temporary.folder, 'assets', 'app-1a2b.js'), '0');
    writeFileSync(path.join(temporary.folder, 'icon.svg'), '<svg/>');
    booted = await bootApp({ uiFolder: temporary.folder });
  });
  afterAll(async () => {
    await booted.close();
    temporary.remove();
  });
  const ask = () => supertest(booted.app.getHttpServer());

  test.each(['/', '/board/HBR', '/turns/0b5c', '/link/abc'])('%s is the one page', async (address) => {
    const answer = await ask().get(address).expect(200);
    expect(answer.text).toContain('Stubpost');
    expect(answer.headers['cache-control']).toBe('no-cache');
  });

  test('files with a hash in their name are kept for good, others asked for again', async () => {
    const hashed = await ask().get('/assets/app-1a2b.js').expect(200);
    expect(hashed.headers['cache-control']).toContain('immutable');
    const plain = await ask().get('/icon.svg').expect(200);
    expect(plain.headers['cache-control']).toBe('no-cache');
  });

  test.each(['/assets/old.js', '/gone.png', '/../package.json'])('%s is not there', async (address) => {
    await ask().get(address).expect(404);
  });

  test('only reading gets the page', async () => {
    await ask().post('/board/HBR').expect(404);
  });
});

describe('the log', () => {
  test.each([
    ['/api/board?terminal=HBR', '/api/board'],
    ['/api/links/secret-token', '/api/links/…'],
    ['/link/secret-token?x=1', '/link/…'],
    ['/api/takings/secret-token', '/api/takings/…'],
    ['/t/secret-token', '/t/…'],
    ['/turns/t1', '/turns/t1'],
  ])('%s is told as %s', (url, told) => {
    expect(pathForLog(url)).toBe(told);
  });
});
