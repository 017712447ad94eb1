import { randomUUID } from 'node:crypto';
import { mkdtempSync } from 'node:fs';
import { tmpdir } from 'node:os';
import path from 'node:path';
import { fileURLToPath } from 'node:url';
import Database from 'better-sqlite3';
import { load, startServer } from './child-server.mjs';
import { goal, interleave, note } from './measure.mjs';

const file = (name) => fileURLToPath(new URL(`servers/${name}.mjs`, import.meta.url));

/** Microseconds of one bare transaction {insert, update} in FULL. */
function bareTransaction() {
  const database = new Database(
    path.join(mkdtempSync(path.join(tmpdir(), 'stubpost-bench-')), 'bare.sqlite'),
  );
  database.pragma('journal_mode = WAL');
  database.pragma('synchronous = FULL');
  database.exec(
    'CREATE TABLE tick (id TEXT PRIMARY KEY, body TEXT); CREATE TABLE counter (value INTEGER); INSERT INTO counter VALUES (0)',
  );
  const insert = database.prepare('INSERT INTO tick VALUES (?, ?)');
  const update = database.prepare('UPDATE counter SET value = value + 1');
  const both = database.transaction((id) => {
    insert.run(id, '{"a":1}');
    update.run();
  });
  const rounds = 1500;
  const started = process.hrtime.bigint();
  for (let round = 0; round < rounds; round += 1) both(randomUUID());
  const micros = Number(process.hrtime.bigint() - started) / 1e3 / rounds;
  database.close();
  return micros;
}

/** P4 and P5: a durable entry over HTTP against a bare insert over HTTP, and the unit of work against a bare transaction. */
export async function benchEntry({ rounds }) {
  const bare = await startServer(file('bare-entry'));
  const service = await startServer(file('service'), { turns: 60, recordedSteps: 0 });
  try {
    const { url, cookie, turnIds } = service.ready;
    const entry = () => ({
      id: randomUUID(),
      kind: 'note',
      note: 'still here',
      source: 'by-hand',
      observedAt: new Date().toISOString(),
    });
    const post = (address, headers, at) => ({
      url: address,
      method: 'POST',
      requests: [
        {
          method: 'POST',
          headers: { ...headers, 'content-type': 'application/json' },
          setupRequest: (request) => ({ ...request, path: at(), body: JSON.stringify(entry()) }),
        },
      ],
    });
    const anyTurn = () => `/api/turns/${turnIds[Math.floor(Math.random() * turnIds.length)]}/entries`;
    const requests = await interleave(
      [
        {
          name: 'bare',
          run: async () =>
            (
              await load(
                bare,
                post(bare.ready.url, {}, () => '/'),
              )
            ).perSecond,
        },
        { name: 'service', run: async () => (await load(service, post(url, { cookie }, anyTurn))).perSecond },
      ],
      rounds,
    );
    const transactions = await interleave(
      [
        { name: 'bare', run: bareTransaction },
        { name: 'unit of work', run: () => service.ask('unit of work') },
      ],
      rounds,
    );
    for (const [name, value] of requests)
      note(`${name.padEnd(12)} ${value.toFixed(0).padStart(7)} durable entries a second over HTTP`);
    for (const [name, value] of transactions)
      note(`${name.padEnd(12)} ${value.toFixed(0).padStart(7)} µs a transaction`);
    goal({
      id: 'P4',
      what: 'durable entry over HTTP, share of a bare durable insert',
      value: requests.get('service') / requests.get('bare'),
      atLeast: 0.35,
    });
    goal({
      id: 'P5',
      what: 'unit of work, share of a bare transaction',
      value: transactions.get('bare') / transactions.get('unit of work'),
      atLeast: 0.7,
    });
  } finally {
    bare.stop();
    service.stop();
  }
}
