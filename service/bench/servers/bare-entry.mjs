import { createServer } from 'node:http';
import { mkdtempSync } from 'node:fs';
import { tmpdir } from 'node:os';
import path from 'node:path';
import Database from 'better-sqlite3';
import { answerCpu } from './answer-cpu.mjs';

// The baseline of a durable entry: one synchronous transaction {insert, update} in FULL, nothing else.
const database = new Database(path.join(mkdtempSync(path.join(tmpdir(), 'stubpost-bench-')), 'bare.sqlite'));
database.pragma('journal_mode = WAL');
database.pragma('synchronous = FULL');
database.exec(
  'CREATE TABLE tick (id TEXT PRIMARY KEY, body TEXT); CREATE TABLE step (id INTEGER PRIMARY KEY, done INTEGER); INSERT INTO step VALUES (1, 0)',
);
const insert = database.prepare('INSERT INTO tick VALUES (?, ?)');
const update = database.prepare('UPDATE step SET done = ? WHERE id = 1');
const record = database.transaction((id, body) => {
  insert.run(id, body);
  update.run(Date.now());
});

const server = createServer((request, response) => {
  let text = '';
  request.on('data', (chunk) => (text += chunk));
  request.on('end', () => {
    const body = JSON.parse(text);
    record(body.id, text);
    response.setHeader('content-type', 'application/json');
    response.statusCode = 201;
    response.end('{"sequence":1}');
  });
});
answerCpu();
server.listen(0, '127.0.0.1', () => process.send({ url: `http://127.0.0.1:${server.address().port}/` }));
