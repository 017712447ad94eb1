import { writeFileSync } from 'node:fs';
import path from 'node:path';
import { railRouteTypes, type WireTimetable } from '@stubpost/shared';
import { aFeed, type FeedTrain } from '@stubpost/shared/testing';
import { feedLimits } from '../src/timetables/feed-limits';
import { type FeedProgress, readFeed } from '../src/timetables/feed-reader';
import { SameThreadFeedReaders, WorkerFeedReaders } from '../src/timetables/feed-readers';
import { zipOf } from './support/feed-zips';
import { freePort, type ServiceProcess, startService, untilHealthy } from './support/service-process';
import { temporaryFolder } from './support/temporary-folder';

jest.setTimeout(120_000);

const workerFile = path.join(__dirname, '../dist/timetables/feed-worker.js');
const request = { routeTypes: railRouteTypes, limits: feedLimits, shortestTurnSeconds: 520 };

let temporary: ReturnType<typeof temporaryFolder>;
beforeEach(() => {
  temporary = temporaryFolder();
});
afterEach(() => temporary.remove());

/** A feed that takes a while: so many shuttles a day, each of many calls. */
function longFeed(trains: number): Buffer {
  const calls = (start: number): FeedTrain['calls'] =>
    Array.from({ length: 40 }, (_, call) => {
      const seconds = start + call * 60;
      const two = (value: number): string => String(Math.floor(value)).padStart(2, '0');
      const stop = call === 0 || call === 39 ? 'harbor-1' : 'mill';
      return [stop, `${two(seconds / 3600)}:${two((seconds / 60) % 60)}:${two(seconds % 60)}`] as const;
    });
  const list = Array.from({ length: trains }, (_, index) => ({
    id: `T${index}`,
    block: `B${index % 50}`,
    calls: calls((index * 37) % 80_000),
  }));
  return zipOf(aFeed({ trains: list }));
}

function keep(zip: Buffer): string {
  const file = path.join(temporary.folder, 'feed.zip');
  writeFileSync(file, zip);
  return file;
}

describe('reading in a worker thread', () => {
  const readers = new WorkerFeedReaders(workerFile);

  test('gives what reading in this thread gives, and tells how far it is', async () => {
    const file = keep(longFeed(300));
    const told: FeedProgress[] = [];
    const signal = new AbortController().signal;
    const answer = await readers.read(
      { ...request, path: file },
      { signal, onProgress: (progress) => told.push(progress) },
    );
    expect(answer).toEqual(await readFeed({ ...request, path: file }, () => undefined));
    expect(told.length).toBeGreaterThan(0);
    expect(told.every(({ share }) => share >= 0 && share <= 1)).toBe(true);
  });

  test('leaves this thread free meanwhile', async () => {
    const file = keep(longFeed(1200));
    const signal = new AbortController().signal;
    let longestGap = 0;
    let tickedAt = performance.now();
    const ticker = setInterval(() => {
      longestGap = Math.max(longestGap, performance.now() - tickedAt);
      tickedAt = performance.now();
    }, 5);
    const startedAt = performance.now();
    const answer = await readers.read({ ...request, path: file }, { signal, onProgress: () => undefined });
    clearInterval(ticker);
    expect(answer.ok).toBe(true);
    // Everything in one thread would show as one gap as long as the reading itself.
    expect(longestGap).toBeLessThan((performance.now() - startedAt) / 2);
  });

  test('can be stopped', async () => {
    const stop = new AbortController();
    const options = { signal: stop.signal, onProgress: () => stop.abort() };
    for (const kind of [readers, new SameThreadFeedReaders()]) {
      await expect(kind.read({ ...request, path: keep(longFeed(300)) }, options)).rejects.toMatchObject({
        name: 'AbortError',
      });
    }
  });

  test('that cannot even begin says so', async () => {
    const none = new WorkerFeedReaders(path.join(temporary.folder, 'none.js'));
    const options = { signal: new AbortController().signal, onProgress: () => undefined };
    await expect(none.read({ ...request, path: 'x' }, options)).rejects.toThrow('Cannot find module');
  });
});

describe('kill -9 in the middle of an import', () => {
  const started: ServiceProcess[] = [];
  afterEach(async () => {
    for (const service of started.splice(0)) {
      service.child.kill('SIGKILL');
      await service.ended;
    }
  });

  async function serve(): Promise<{ service: ServiceProcess; cookie: string }> {
    const credentials = { email: 'admin@example.org', password: 'a long way home' };
    const service = startService({
      PORT: String(await freePort()),
      DATA_DIR: temporary.folder,
      ADMIN_EMAIL: credentials.email,
      ADMIN_PASSWORD: credentials.password,
    });
    started.push(service);
    await untilHealthy(service);
    const answer = await fetch(`${service.url}/api/session`, {
      method: 'POST',
      headers: { 'Content-Type': 'application/json' },
      body: JSON.stringify(credentials),
    });
    return { service, cookie: answer.headers.get('set-cookie')?.split(';')[0] ?? '' };
  }

  test('loses nothing: the file is read again at the next start', async () => {
    const zip = new Uint8Array(longFeed(1000));
    const first = await serve();
    const form = new FormData();
    form.append('file', new Blob([zip]), 'spring.zip');
    const headers = { Cookie: first.cookie };
    const receipt = await fetch(`${first.service.url}/api/timetables`, {
      method: 'POST',
      headers,
      body: form,
    });
    expect(receipt.status).toBe(202);
    const { id } = (await receipt.json()) as { id: string };
    first.service.child.kill('SIGKILL');
    await first.service.ended;

    const second = await serve();
    const look = async (): Promise<WireTimetable> => {
      const answer = await fetch(`${second.service.url}/api/timetables/${id}`, {
        headers: { Cookie: second.cookie },
      });
      expect(answer.status).toBe(200);
      return (await answer.json()) as WireTimetable;
    };
    let timetable = await look();
    expect(timetable.state).toBe('reading');
    while (timetable.state === 'reading') {
      await new Promise((resolve) => setTimeout(resolve, 50));
      timetable = await look();
    }
    expect(timetable).toMatchObject({ state: 'ready', fileName: 'spring.zip', summary: { trips: 1000 } });
  });
});
