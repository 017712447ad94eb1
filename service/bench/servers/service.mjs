import { randomUUID } from 'node:crypto';
import { mkdtempSync } from 'node:fs';
import { createRequire } from 'node:module';
import { tmpdir } from 'node:os';
import path from 'node:path';
import { answerCpu } from './answer-cpu.mjs';

const require = createRequire(import.meta.url);
const dist = (file) => require(`../../dist/${file}.js`);
const { createApp } = dist('create-app');
const { readConfig } = dist('config/config');
const { PeopleService } = dist('people/people.service');
const { SignInService } = dist('auth/sign-in.service');
const { SessionCookie } = dist('auth/session-cookie');
const { TerminalsService } = dist('terminals/terminals.service');
const { ExtraTurns } = dist('turns/extra-turns.service');
const { TurnsService } = dist('turns/turns.service');
const { TurnFiles } = dist('turns/turn-files');
const { TurnBoards } = dist('turns/turn-boards');
const { UnitOfWork } = dist('database/unit-of-work');

const { turns, recordedSteps } = JSON.parse(process.env.BENCH);
const steps = ['handbrake-set', 'cab-brake-check', 'ends-changed', 'engineer-in-cab'].slice(0, recordedSteps);
const config = readConfig({
  DATA_DIR: mkdtempSync(path.join(tmpdir(), 'stubpost-bench-')),
  DEMO: 'off',
  LOG_LEVEL: 'error',
  PORT: '0',
});
const app = await createApp({ config });
await app.get(TerminalsService).add({ code: 'OSQ', name: 'Ostrel Quay', zone: 'America/New_York' });
const roles = [{ role: 'dispatcher', terminal: '*' }];
const { id } = await app.get(PeopleService).add({ email: 'desk@example.test', name: 'D. Desk', roles });
const actor = { id, name: 'D. Desk', roles };

const base = Date.now() - 2 * 3_600_000;
const iso = (instant) => new Date(instant).toISOString();
const serviceDate = new Intl.DateTimeFormat('en-CA', { timeZone: 'America/New_York' }).format(base);
const ids = [];
for (let turn = 0; turn < turns; turn += 1) {
  const at = base + turn * 30_000;
  const file = await app.get(ExtraTurns).create(
    {
      terminal: 'OSQ',
      serviceDate,
      track: String(1 + (turn % 8)),
      set: String(11 + (turn % 24)),
      inbound: { train: String(1700 + turn), scheduledArrivalAt: iso(at) },
      outbound: { train: String(2700 + turn), scheduledDepartureAt: iso(at + 1_200_000) },
    },
    base,
  );
  ids.push(file.record.id);
  const entry = (kind, more, later) => ({
    turnId: file.record.id,
    request: { id: randomUUID(), observedAt: iso(at + later), source: 'by-hand', kind, ...more },
    actor,
    now: at + later,
  });
  await app
    .get(TurnsService)
    .recordEntries([
      entry('arrival', {}, 5000),
      ...steps.map((step, index) => entry('step-done', { step }, 60_000 * (index + 1))),
    ]);
}
await app.listen(0, '127.0.0.1');
const { token } = await app.get(SignInService).openFor(id, 'bench');
const address = app.getHttpServer().address();

// What nobody has asked for yet costs most: with this, every board is put together from the tables.
let forgets = false;
const boards = app.get(TurnBoards);
const find = boards.find.bind(boards);
boards.find = (query, now) => {
  if (forgets) {
    app.get(TurnFiles).files.clear();
    boards.snapshots.clear();
  }
  return find(query, now);
};

let ticking;
answerCpu(async (message) => {
  if (message === 'forget') forgets = true;
  if (message === 'remember') forgets = false;
  if (message?.ticksPerSecond !== undefined) {
    clearInterval(ticking);
    if (message.ticksPerSecond === 0) return;
    ticking = setInterval(() => {
      const turnId = ids[Math.floor(Math.random() * ids.length)];
      const request = {
        id: randomUUID(),
        observedAt: iso(Date.now()),
        source: 'by-hand',
        kind: 'note',
        note: 'still here',
      };
      void app.get(TurnsService).recordEntry({ turnId, request, actor, now: Date.now() });
    }, 1000 / message.ticksPerSecond);
  }
  if (message === 'unit of work') {
    const started = process.hrtime.bigint();
    const rounds = 1500;
    for (let round = 0; round < rounds; round += 1)
      await app.get(UnitOfWork).run(async (transaction) => {
        await transaction.execute(
          'INSERT INTO setting (scope, name, value, version, changed_by, changed_at) VALUES (?, ?, ?, 1, NULL, ?)',
          ['bench', String(round) + randomUUID(), '{"a":1}', Date.now()],
        );
        await transaction.execute(`UPDATE counter SET value = value WHERE name = 'change'`);
      });
    return Number(process.hrtime.bigint() - started) / 1e3 / rounds;
  }
});
process.send({
  url: `http://127.0.0.1:${address.port}`,
  cookie: `${app.get(SessionCookie).name}=${token}`,
  serviceDate,
  turnIds: ids,
});
