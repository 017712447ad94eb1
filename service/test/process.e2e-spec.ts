import { mkdirSync, writeFileSync } from 'node:fs';
import { connect } from 'node:net';
import path from 'node:path';
import { freePort, type ServiceProcess, startService, untilHealthy } from './support/service-process';
import { temporaryFolder } from './support/temporary-folder';

jest.setTimeout(60_000);

let temporary: ReturnType<typeof temporaryFolder>;
const started: ServiceProcess[] = [];
beforeEach(() => {
  temporary = temporaryFolder();
});
afterEach(async () => {
  for (const service of started.splice(0)) {
    service.child.kill('SIGKILL');
    await service.ended;
  }
  temporary.remove();
});

function start(environment: NodeJS.ProcessEnv): ServiceProcess {
  const service = startService({ DATA_DIR: temporary.folder, ...environment });
  started.push(service);
  return service;
}

describe('the process', () => {
  test('names everything that is wrong with its environment, and ends', async () => {
    const service = start({ PORT: 'many', DEMO: 'maybe' });
    expect(await service.ended).toBe(1);
    expect(service.output()).toContain('PORT');
    expect(service.output()).toContain('DEMO: must be live or off');
    expect(service.output()).not.toContain('    at ');
  });

  test('says that its port is taken, and ends', async () => {
    const port = String(await freePort());
    await untilHealthy(start({ PORT: port }));
    const second = start({ PORT: port, DATA_DIR: path.join(temporary.folder, 'second') });
    expect(await second.ended).toBe(1);
    expect(second.output()).toContain(`Port ${port} on 127.0.0.1 is taken by another program`);
  });

  test('ends within five seconds of SIGTERM, also with a request that will never be finished', async () => {
    const service = start({ PORT: String(await freePort()) });
    await untilHealthy(service);
    const socket = connect(Number(new URL(service.url).port), '127.0.0.1');
    socket.on('error', () => undefined);
    const head = [
      'POST /api/session HTTP/1.1',
      'Host: x',
      'Content-Type: application/json',
      'Content-Length: 99',
    ];
    socket.write(`${[...head, 'Expect: 100-continue'].join('\r\n')}\r\n\r\n`);
    // The service has taken the request up when it asks for the rest of it.
    await new Promise((resolve) => socket.once('data', resolve));
    const toldAt = performance.now();
    service.child.kill('SIGTERM');
    expect(await service.ended).toBe(0);
    expect(performance.now() - toldAt).toBeLessThan(5000);
    socket.destroy();
  });

  test('ends within five seconds of SIGTERM with a live stream open, and the stream ends', async () => {
    const email = 'boss@example.org';
    const password = 'seven tall lanterns';
    const service = start({ PORT: String(await freePort()), ADMIN_EMAIL: email, ADMIN_PASSWORD: password });
    await untilHealthy(service);
    const post = (address: string, body: object, cookie = '') =>
      fetch(`${service.url}${address}`, {
        method: 'POST',
        headers: { 'Content-Type': 'application/json', Cookie: cookie },
        body: JSON.stringify(body),
      });
    const cookie =
      (await post('/api/session', { email, password })).headers.get('set-cookie')?.split(';')[0] ?? '';
    await post('/api/terminals', { code: 'HBR', name: 'Harbor', zone: 'UTC' }, cookie);
    const stream = await fetch(`${service.url}/api/live?terminal=HBR`, { headers: { Cookie: cookie } });
    expect(stream.headers.get('content-type')).toContain('text/event-stream');
    const read = stream.text().catch(() => 'cut off');
    const toldAt = performance.now();
    service.child.kill('SIGTERM');
    expect(await service.ended).toBe(0);
    expect(performance.now() - toldAt).toBeLessThan(5000);
    await read;
  });

  test('runs twice side by side with other ports and folders', async () => {
    const first = start({ PORT: String(await freePort()), DATA_DIR: path.join(temporary.folder, 'a') });
    const second = start({ PORT: String(await freePort()), DATA_DIR: path.join(temporary.folder, 'b') });
    await Promise.all([untilHealthy(first), untilHealthy(second)]);
  });

  test('opens a folder that kill -9 left', async () => {
    const port = String(await freePort());
    const killed = start({ PORT: port });
    await untilHealthy(killed);
    killed.child.kill('SIGKILL');
    await killed.ended;
    await untilHealthy(start({ PORT: port }));
  });

  test('does not start on a data folder whose choice of database cannot be read', async () => {
    mkdirSync(temporary.folder, { recursive: true });
    writeFileSync(path.join(temporary.folder, 'current-database'), '../elsewhere.sqlite\n');
    const service = start({ PORT: String(await freePort()) });
    expect(await service.ended).toBe(1);
    expect(service.output()).toContain('does not name a database');
  });
});
