import { ConfigProblem, readConfig } from './config';

const problemOf = (environment: NodeJS.ProcessEnv): string => {
  try {
    readConfig(environment);
  } catch (error) {
    if (error instanceof ConfigProblem) return error.message;
    throw error;
  }
  throw new Error('the environment was taken');
};

describe('readConfig', () => {
  test('an empty environment gives the shipped values', () => {
    const config = readConfig({});
    expect(config).toMatchObject({
      port: 4600,
      host: '127.0.0.1',
      publicUrl: 'http://127.0.0.1:4600',
      isSecure: false,
      tls: null,
      trustProxy: null,
      demo: undefined,
      firstAdministrator: null,
      sessionSecret: null,
    });
    expect(config.dataDir).toMatch(/\/data$/);
  });

  test('everything that is wrong is told at once', () => {
    const problem = problemOf({
      PORT: 'many',
      PUBLIC_URL: 'ftp://example.org',
      DEMO: 'yes',
      SESSION_SECRET: 'short',
      TLS_CERT: '/nowhere/cert.pem',
    });
    for (const name of ['PORT', 'PUBLIC_URL', 'DEMO', 'SESSION_SECRET', 'TLS_CERT'])
      expect(problem).toContain(name);
  });

  test.each([
    ['TLS_CERT without its key', { TLS_CERT: __filename }, 'TLS_CERT and TLS_KEY go together'],
    [
      'an administrator without a password',
      { ADMIN_EMAIL: 'a@example.org' },
      'ADMIN_EMAIL and ADMIN_PASSWORD go together',
    ],
    ['a port past the last one', { PORT: '65536' }, 'PORT'],
  ])('%s is refused', (_name, environment, complaint) => {
    expect(problemOf(environment)).toContain(complaint);
  });

  test('a blank value is as good as none', () => {
    expect(readConfig({ PORT: '', DEMO: '', ADMIN_EMAIL: '', ADMIN_PASSWORD: '' })).toMatchObject({
      port: 4600,
    });
  });

  test.each([
    [{ PORT: '4700' }, 'http://127.0.0.1:4700', false],
    [{ PORT: '4700', HOST: '0.0.0.0' }, 'http://127.0.0.1:4700', false],
    [{ PORT: '4700', HOST: '::1' }, 'http://[::1]:4700', false],
    [{ PUBLIC_URL: 'https://turns.example.org/' }, 'https://turns.example.org', true],
    [{ TLS_CERT: __filename, TLS_KEY: __filename, PORT: '443' }, 'https://127.0.0.1:443', true],
  ])('%j is reached at %s', (environment, publicUrl, isSecure) => {
    expect(readConfig(environment)).toMatchObject({ publicUrl, isSecure });
  });

  test.each([
    ['1', 1],
    ['loopback', 'loopback'],
    ['10.0.0.0/8, 127.0.0.1', '10.0.0.0/8, 127.0.0.1'],
    ['false', false],
  ])('TRUST_PROXY=%s', (text, trustProxy) => {
    expect(readConfig({ TRUST_PROXY: text }).trustProxy).toEqual(trustProxy);
  });
});
