import { describe, expect, onTestFinished, test } from 'vitest';
import { FakeRefusal, FakeServer } from '../testing/fake-server';
import { api, ApiError, isRefusal } from './api-client';
import { errorText } from './error-texts';

function aServer(): FakeServer {
  const server = new FakeServer();
  onTestFinished(() => server.stop());
  return server;
}

const failure = async (asked: Promise<unknown>): Promise<unknown> =>
  asked.then(
    () => {
      throw new Error('was not refused');
    },
    (problem: unknown) => problem,
  );

describe('the api client', () => {
  test('sends JSON and gives back the answer', async () => {
    const server = aServer().on('POST', '/api/anything/:id', { made: true });
    expect(await api.post('/api/anything/7', { name: 'x' })).toEqual({ made: true });
    expect(server.sent('POST', '/api/anything/:id')[0]).toMatchObject({
      params: { id: '7' },
      body: { name: 'x' },
    });
  });

  test('writes the query and leaves out what is not given', async () => {
    const server = aServer().on('GET', '/api/anything', []);
    await api.get('/api/anything', { query: { terminal: 'HBR', from: undefined, n: 3 } });
    expect(server.requests[0]?.query.toString()).toBe('terminal=HBR&n=3');
  });

  test('answers nothing for a route without a body', async () => {
    aServer().on('DELETE', '/api/anything', undefined);
    expect(await api.delete('/api/anything')).toBeUndefined();
  });

  test('throws a refusal with status, code and facts', async () => {
    aServer().refuse('PUT', '/api/anything', 'password.too_short', { shortest: 8 });
    const problem = await failure(api.put('/api/anything', {}));
    expect(problem).toBeInstanceOf(ApiError);
    expect(problem).toMatchObject({
      status: 400,
      code: 'password.too_short',
      facts: { shortest: 8 },
      requestId: 'test',
    });
    expect(isRefusal(problem, 'password.too_short')).toBe(true);
    expect(errorText(problem)).toBe('Too short: at least 8 characters.');
  });

  test('says so when the server does not answer', async () => {
    const server = aServer();
    globalThis.fetch = () => Promise.reject(new TypeError('fetch failed'));
    const problem = await failure(api.get('/api/anything'));
    server.stop();
    expect(problem).toMatchObject({ status: 0, code: 'transport.unreachable' });
    expect(errorText(problem)).toContain('does not answer');
  });

  test('says so when an answer has none of our codes', async () => {
    const server = aServer();
    globalThis.fetch = () => Promise.resolve(new Response('<html>', { status: 502 }));
    const problem = await failure(api.get('/api/anything'));
    server.stop();
    expect(problem).toMatchObject({ status: 502, code: 'transport.unreadable' });
  });

  test('passes an aborted request on as what it is', async () => {
    aServer().on('GET', '/api/anything', new FakeRefusal('server.fault'));
    const gone = new AbortController();
    gone.abort();
    expect(await failure(api.get('/api/anything', { signal: gone.signal }))).toMatchObject({
      name: 'AbortError',
    });
  });
});
