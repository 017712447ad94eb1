import { createServer } from 'node:http';
import Database from 'better-sqlite3';
import { answerCpu } from './answer-cpu.mjs';

// The baseline: node:http and better-sqlite3 and nothing else. 200 turns with eight steps each, one joined SELECT,
// rows grouped in plain code, JSON.stringify.
const turns = 200;
const steps = 8;
const database = new Database(':memory:');
database.exec(`CREATE TABLE turn (id TEXT PRIMARY KEY, version INTEGER, kind TEXT, service_date TEXT, state TEXT,
  track TEXT, set_label TEXT, inbound TEXT, outbound TEXT, arrives INTEGER, leaves INTEGER, arrived INTEGER, left_at INTEGER);
  CREATE TABLE step (turn_id TEXT, position INTEGER, key TEXT, label TEXT, due INTEGER, done INTEGER, source TEXT, by TEXT,
  PRIMARY KEY (turn_id, position))`);
const insertTurn = database.prepare(`INSERT INTO turn VALUES (${Array(13).fill('?').join(',')})`);
const insertStep = database.prepare(`INSERT INTO step VALUES (${Array(8).fill('?').join(',')})`);
for (let turn = 0; turn < turns; turn += 1) {
  const id = `00000000-0000-4000-8000-${String(turn).padStart(12, '0')}`;
  const at = 1_772_575_200_000 + turn * 60_000;
  insertTurn.run(
    id,
    3,
    'turn',
    '2026-03-03',
    'secured',
    String(turn % 8),
    String(11 + (turn % 24)),
    String(1700 + turn),
    String(1701 + turn),
    at,
    at + 1_200_000,
    at + 4000,
    null,
  );
  for (let step = 0; step < steps; step += 1)
    insertStep.run(
      id,
      step,
      `step-number-${step}`,
      `Step number ${step}`,
      at + step * 60_000,
      step < 4 ? at + step * 61_000 : null,
      'by-hand',
      'R. Somebody',
    );
}
const select = database.prepare(`SELECT t.*, s.position, s.key, s.label, s.due, s.done, s.source, s.by
  FROM turn t JOIN step s ON s.turn_id = t.id ORDER BY t.arrives, t.id, s.position`);

function board() {
  const byId = new Map();
  for (const row of select.all()) {
    let turn = byId.get(row.id);
    if (turn === undefined) {
      turn = {
        id: row.id,
        version: row.version,
        kind: row.kind,
        serviceDate: row.service_date,
        state: row.state,
        track: row.track,
        set: row.set_label,
        inbound: row.inbound,
        outbound: row.outbound,
        arrives: row.arrives,
        leaves: row.leaves,
        arrived: row.arrived,
        left: row.left_at,
        steps: [],
      };
      byId.set(row.id, turn);
    }
    turn.steps.push({
      key: row.key,
      label: row.label,
      dueAt: row.due,
      doneAt: row.done,
      source: row.source,
      by: row.by,
    });
  }
  return JSON.stringify({ turns: [...byId.values()] });
}

const server = createServer((_, response) => {
  const body = board();
  response.setHeader('content-type', 'application/json');
  response.end(body);
});
answerCpu();
server.listen(0, '127.0.0.1', () =>
  process.send({ url: `http://127.0.0.1:${server.address().port}/`, bytes: board().length }),
);
