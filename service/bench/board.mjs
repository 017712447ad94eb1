import { gunzipSync } from 'node:zlib';
import { fileURLToPath } from 'node:url';
import { load, startServer } from './child-server.mjs';
import { goal, interleave, note } from './measure.mjs';

const file = (name) => fileURLToPath(new URL(`servers/${name}.mjs`, import.meta.url));
const turns = 200;

/** P1 to P3: the board route against bare node:http and better-sqlite3, by processor time of the server per request. */
export async function benchBoard({ rounds }) {
  const bare = await startServer(file('bare-board'));
  const service = await startServer(file('service'), { turns, recordedSteps: 4 });
  try {
    const { url, cookie, serviceDate } = service.ready;
    const board = { url: `${url}/api/board?terminal=OSQ&serviceDate=${serviceDate}`, headers: { cookie } };
    const plain = await fetch(board.url, { headers: { cookie, 'accept-encoding': 'identity' } });
    const body = Buffer.from(await plain.arrayBuffer());
    note(
      `the board has ${JSON.parse(body).turns.length} turns, ${body.length} bytes; the bare one ${bare.ready.bytes}`,
    );
    const packed = await import('node:zlib').then(({ gzipSync }) => gzipSync(body).length);
    if (gunzipSync(await import('node:zlib').then(({ gzipSync }) => gzipSync(body))).length !== body.length)
      throw new Error('the board does not survive compression');
    const asked = async (settings, request) => {
      for (const setting of settings) await service.ask(setting);
      return (await load(service, request)).cpu;
    };
    const known = { ...board, headers: { cookie, 'if-none-match': '*' }, expect304: true };
    const quiet = { ticksPerSecond: 0 };
    const figures = await interleave(
      [
        { name: 'bare', run: async () => (await load(bare, { url: bare.ready.url })).cpu },
        { name: 'uncached', run: () => asked(['forget', quiet], board) },
        { name: 'snapshot', run: () => asked(['remember', quiet], board) },
        {
          name: 'packed',
          run: () => asked([], { ...board, headers: { cookie, 'accept-encoding': 'gzip' } }),
        },
        { name: '304', run: () => asked([], known) },
        { name: '20 writes/s', run: () => asked([{ ticksPerSecond: 20 }], board) },
        { name: '50 writes/s', run: () => asked([{ ticksPerSecond: 50 }], board) },
      ],
      rounds,
    );
    await service.ask(quiet);
    for (const [name, cpu] of figures)
      note(`${name.padEnd(12)} ${cpu.toFixed(0).padStart(7)} µs of processor time a request`);
    const times = (name) => figures.get('bare') / figures.get(name);
    const perByte = times('uncached') * (body.length / bare.ready.bytes);
    note(`uncached, for equal bytes: ${perByte.toFixed(2)} × bare`);
    goal({
      id: 'P1',
      what: 'board put together from the tables, times as fast as bare',
      value: times('uncached'),
      atLeast: 0.9,
    });
    goal({
      id: 'P2',
      what: 'board from memory, times as fast as bare',
      value: times('snapshot'),
      atLeast: 30,
    });
    goal({
      id: 'P2',
      what: 'board unchanged (304), times as fast as bare',
      value: times('304'),
      atLeast: 45,
    });
    goal({
      id: 'P2',
      what: 'compressed board, share of its bytes',
      value: packed / body.length,
      atMost: 0.12,
      digits: 3,
    });
    goal({
      id: 'P3',
      what: 'board with 20 entries a second coming in, times as fast as bare',
      value: times('20 writes/s'),
      atLeast: 20,
    });
    goal({
      id: 'P3',
      what: 'cost of a read at 50 entries a second against none',
      value: figures.get('50 writes/s') / figures.get('snapshot'),
      atMost: 1.5,
    });
  } finally {
    bare.stop();
    service.stop();
  }
}
