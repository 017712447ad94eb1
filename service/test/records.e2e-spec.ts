import { execFileSync } from 'node:child_process';
import { randomUUID } from 'node:crypto';
import { mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import os from 'node:os';
import path from 'node:path';
import type { EntryKind, ErrorBody, LogLine, Role, WireDailyHead, WireLogState } from '@stubpost/shared';
import { ENTRY_KINDS, ROUTES, recordEntrySchema } from '@stubpost/shared';
import { Reader } from '../src/database/reader';
import { UnitOfWork } from '../src/database/unit-of-work';
import { ChainCheck } from '../src/records/chain-check.service';
import { DailyHeads } from '../src/records/daily-heads.service';
import { RecordsJob } from '../src/records/records.job';
import { TerminalsService } from '../src/terminals/terminals.service';
import { TurnsService } from '../src/turns/turns.service';
import {
  type Railroad,
  aRailroad,
  addHarbor,
  anEntryRequest,
  at,
  openTurn,
  record,
} from './support/railroad';
import { exportOf, linesOf, verdictOf } from './support/sealed-log';
import { signInAs } from './support/sign-in';

let railroad: Railroad;

beforeEach(async () => {
  railroad = await aRailroad();
  await addHarbor(railroad.app);
});
afterEach(() => railroad.close());

const noon = (day: string) => railroad.clock.set(Date.parse(`${day}T12:00:00Z`));
const publish = () => railroad.app.get(DailyHeads).publish(railroad.clock.now());
const checkChain = () => railroad.app.get(ChainCheck).run();

/** Somebody with a session of this moment: the clock of these tests jumps over days, and old sessions run out. */
const signedIn = (role: Role) => signInAs(railroad.app, role);

/** Has some notes come in at noon of a day. */
async function notesOn(day: string, count: number): Promise<void> {
  const dispatcher = await railroad.as('dispatcher');
  const [turn] = await railroad.app.get(Reader).query<{ id: string }>('SELECT id FROM turn LIMIT 1');
  const turnId = turn?.id ?? (await openTurn(dispatcher)).id;
  noon(day);
  const { personId: id, name } = dispatcher;
  const actor = { id, name, roles: [{ role: 'dispatcher' as const, terminal: 'HBR' }] };
  for (let index = 0; index < count; index += 1) {
    const note = anEntryRequest('note', index, { note: `note ${index} of ${day}` });
    const request = recordEntrySchema.parse(note);
    await railroad.app.get(TurnsService).recordEntry({ turnId, request, actor, now: railroad.clock.now() });
  }
}

const headsFor = async (role: Role, query: object = {}): Promise<WireDailyHead[]> =>
  (await (await signedIn(role)).agent.get('/api/records/heads').query(query).expect(200))
    .body as WireDailyHead[];
const stateFor = async (role: Role, query: object = {}): Promise<WireLogState> =>
  (await (await signedIn(role)).agent.get('/api/records/state').query(query).expect(200))
    .body as WireLogState;
const exportFor = async (role: Role, query = {}): Promise<string> => exportOf(await signedIn(role), query);
const numbersIn = (text: string): number[] =>
  linesOf(text).map((line) => (JSON.parse(line) as LogLine).sequence);

/** One entry of every kind, each by somebody who may; the record type asks for every kind there is. */
async function oneOfEachKind(): Promise<void> {
  const { personId: crew } = await railroad.as('conductor');
  const turn = await openTurn(await railroad.as('dispatcher'), { set: 'A' });
  const done = anEntryRequest('step-done', 60, {
    step: 'handbrake-set',
    reading: { count: 2, cars: ['5512'] },
  });
  const asked = anEntryRequest('corrected', 70, {
    target: done.id,
    reason: 'misread',
    reading: { count: 1 },
  });
  const askedAgain = { ...asked, id: randomUUID(), reason: 'misread again' };
  for (const each of [asked, askedAgain]) Object.assign(each, { madeAt: at(80) });
  const reason = 'a reason “with marks” \u2028';
  const of: Record<EntryKind, [Role, Record<string, unknown>]> = {
    'step-done': ['conductor', done],
    arrival: ['conductor', { clockOffsetMilliseconds: -120 }],
    departure: ['dispatcher', { source: 'by-radio', saidBy: 'Zoë Ångström' }],
    'expected-arrival': ['dispatcher', { expectedAt: at(-60) }],
    corrected: ['conductor', asked],
    withdrawn: ['conductor', { target: randomUUID(), reason }],
    'cannot-do': ['conductor', { step: 'cab-brake-check', reason }],
    crew: ['dispatcher', { person: crew, as: 'conductor' }],
    relief: ['dispatcher', { out: crew, in: null, as: 'conductor', faceToFace: false }],
    briefing: ['conductor', {}],
    track: ['dispatcher', { track: '4' }],
    set: ['dispatcher', { set: 'B' }],
    hold: ['dispatcher', { until: at(1000), reason }],
    annulled: ['dispatcher', { reason }],
    'blue-signal-up': ['inspector', {}],
    'blue-signal-down': ['inspector', {}],
    note: ['conductor', { note: `Zürich → "quoted" \u2028 \u{1f686}` }],
    agreed: ['conductor', { target: done.id }],
    disagreed: ['conductor', { target: done.id, reason }],
    ruled: ['dispatcher', { target: done.id, considered: [done.id] }],
    'correction-approved': ['supervisor', { target: asked.id }],
    'correction-declined': ['supervisor', { target: askedAgain.id, reason }],
    defect: ['conductor', { car: null, cause: 'brakes', note: 'pad worn' }],
    'tied-up': ['conductor', { handbrakes: { count: 2, cars: ['5512'] }, checks: ['lights'], offAir: true }],
  };
  const dispatcher = await railroad.as('dispatcher');
  for (const kind of ENTRY_KINDS) {
    const [role, fields] = of[kind];
    railroad.clock.advance(3);
    await record(await railroad.as(role), turn.id, { ...anEntryRequest(kind, 90), ...fields });
  }
  await record(dispatcher, turn.id, askedAgain);
}

describe('GET /api/records/log', () => {
  test('gives every entry of every kind, whole and canonical, as newline-delimited JSON', async () => {
    await oneOfEachKind();
    const auditor = await railroad.as('auditor');
    const answer = await auditor.agent.get('/api/records/log').buffer(true).expect(200);
    expect(answer.headers['content-type']).toBe('application/x-ndjson; charset=utf-8');
    expect(answer.headers['content-disposition']).toBe('attachment; filename="stubpost-log.ndjson"');
    const text = await exportFor('auditor');
    expect(text.endsWith('\n')).toBe(true);
    expect(verdictOf(text)).toMatchObject({ isWhole: true, entries: ENTRY_KINDS.length + 1 });
    const kinds = linesOf(text).map((line) => (JSON.parse(line) as LogLine).body?.['kind']);
    expect(new Set(kinds)).toEqual(new Set(ENTRY_KINDS));
  });

  test('can be worked out again by other means: sorted members and the sha256sum of the machine', async () => {
    await oneOfEachKind();
    const lines = linesOf(await exportFor('auditor')).map((line) => JSON.parse(line) as LogLine);
    const bodyHashes = sha256sums(lines.map(({ body }) => sorted(body)));
    const hashes = sha256sums(
      lines.map(({ sequence, id, receivedAt, previousHash }, index) =>
        sorted({ sequence, id, receivedAt, previousHash, bodyHash: bodyHashes[index] }),
      ),
    );
    expect(lines.map(({ bodyHash }) => bodyHash)).toEqual(bodyHashes);
    expect(lines.map(({ hash }) => hash)).toEqual(hashes);
    expect(lines.map(({ previousHash }) => previousHash)).toEqual(['0'.repeat(64), ...hashes.slice(0, -1)]);
  });

  test('shows a change of any field of any kind of entry, in its line', async () => {
    await oneOfEachKind();
    const lines = linesOf(await exportFor('auditor'));
    for (const [index, line] of lines.entries()) {
      const changed = changesOf(JSON.parse(line) as Json);
      expect(changed.length).toBeGreaterThan(12);
      for (const { path: field, value } of changed) {
        const tampered = lines
          .slice(0, index + 2)
          .toSpliced(index, 1, sorted(value))
          .join('\n');
        const { faults } = verdictOf(tampered);
        expect([field, faults[0]?.line]).toEqual([field, index + 1]);
      }
    }
  });

  test('gives whole days, from the head before them to their own, so that a part can be checked', async () => {
    await notesOn('2026-03-03', 3);
    await notesOn('2026-03-04', 2);
    await notesOn('2026-03-06', 4);
    await notesOn('2026-03-07', 1);
    await publish();
    const heads = await headsFor('auditor');
    const part = await exportFor('auditor', { from: '2026-03-04', to: '2026-03-06' });
    expect(numbersIn(part)).toEqual([4, 5, 6, 7, 8, 9]);
    const known = heads.filter(({ date }) => date <= '2026-03-06');
    expect(verdictOf(part, known)).toMatchObject({ isWhole: true, metHeads: 3 });
    expect(verdictOf(part.slice(part.indexOf('\n') + 1), known).isWhole).toBe(false);
    expect(numbersIn(await exportFor('auditor', { from: '2026-03-05' }))).toEqual([6, 7, 8, 9, 10]);
    expect(numbersIn(await exportFor('auditor', { to: '2026-03-05' }))).toEqual([1, 2, 3, 4, 5]);
    expect(await exportFor('auditor', { from: '2026-03-05', to: '2026-03-05' })).toBe('');
  });

  test('refuses days that do not exist or run backwards', async () => {
    const { agent } = await signedIn('auditor');
    for (const query of [
      { from: '2026-02-30' },
      { from: '2026-03-04', to: '2026-03-03' },
      { terminal: 'HBR' },
    ]) {
      const { body } = await agent.get('/api/records/log').query(query).expect(400);
      expect((body as ErrorBody).code).toBe('request.invalid');
    }
  });

  test('leaves out what was said at terminals outside the right, and the chain still checks', async () => {
    await railroad.app.get(TerminalsService).add({ code: 'CAM', name: 'Camden', zone: 'America/New_York' });
    await notesOn('2026-03-03', 2);
    const elsewhere = await exportOf(await signInAs(railroad.app, 'auditor', 'CAM'));
    expect(elsewhere).not.toContain('note 0');
    expect(verdictOf(elsewhere)).toMatchObject({
      isWhole: true,
      notes: [{}, { kind: 'without-body', count: 2 }],
    });
  });
});

describe('daily heads', () => {
  test('are published when the day is over, also after days of silence, and never change', async () => {
    await notesOn('2026-03-03', 2);
    await publish();
    expect(await headsFor('auditor')).toMatchObject([{ date: '2026-03-03', sequence: 2, publishedAt: null }]);
    await notesOn('2026-03-05', 3);
    railroad.clock.set(Date.parse('2026-03-06T00:04:59Z'));
    await publish();
    await publish();
    expect(await headsFor('auditor')).toMatchObject([
      { date: '2026-03-03', sequence: 2, entries: 2, publishedAt: '2026-03-06T00:04:59.000Z' },
      { date: '2026-03-05', sequence: 5, entries: 3, publishedAt: null },
    ]);
    railroad.clock.advance(1);
    await publish();
    const all = await headsFor('auditor');
    expect(all.map(({ publishedAt }) => publishedAt)).toEqual([
      '2026-03-06T00:04:59.000Z',
      '2026-03-06T00:05:00.000Z',
    ]);
    expect(await headsFor('auditor', { from: '2026-03-04' })).toEqual(all.slice(1));
    expect(await headsFor('auditor', { to: '2026-03-04' })).toEqual(all.slice(0, 1));
    const run = (sql: string) => railroad.app.get(UnitOfWork).run((transaction) => transaction.execute(sql));
    await expect(run('UPDATE daily_head SET sequence = 1')).rejects.toThrow('never changed');
    await expect(run('DELETE FROM daily_head')).rejects.toThrow('never deleted');
  });

  test('catch up after the service was down', async () => {
    const days = ['2026-03-03', '2026-03-04', '2026-03-08'];
    for (const day of days) await notesOn(day, 2);
    await railroad.app.close();
    const later = await aRailroad({ dataDir: railroad.dataDir, at: Date.parse('2026-03-09T07:00:00Z') });
    try {
      await later.app.get(RecordsJob).publish();
      await later.app.get(RecordsJob).publish();
      const { body } = await (
        await signInAs(later.app, 'supervisor')
      ).agent
        .get('/api/records/heads')
        .expect(200);
      expect(body).toMatchObject(days.map((date, index) => ({ date, sequence: 2 * index + 2, entries: 2 })));
      expect((body as WireDailyHead[]).every(({ publishedAt }) => publishedAt !== null)).toBe(true);
    } finally {
      await later.close();
    }
  });

  test('stand for the entries of their day: an entry that comes in late belongs to the next', async () => {
    await notesOn('2026-03-03', 1);
    noon('2026-03-04');
    await publish();
    await publish();
    await notesOn('2026-03-03', 1);
    expect(await headsFor('auditor')).toMatchObject([
      { date: '2026-03-03', sequence: 1 },
      { date: '2026-03-04', sequence: 2, entries: 1 },
    ]);
  });
});

describe('GET /api/records/state', () => {
  test('says how far the chain was checked, when, what came of it, and the newest head', async () => {
    await notesOn('2026-03-03', 3);
    await checkChain();
    const state = await stateFor('supervisor');
    expect(state).toMatchObject({
      chain: {
        state: 'whole',
        checkedTo: 3,
        checkedAt: '2026-03-03T12:00:00.000Z',
        faults: [],
        faultCount: 0,
      },
      entries: 3,
      head: { sequence: 3, receivedAt: '2026-03-03T12:00:00.000Z' },
    });
    expect(state.head?.hash).toBe((await headsFor('supervisor')).at(-1)?.hash);
    noon('2026-03-04');
    await stateFor('supervisor', { again: 'true' });
    await checkChain();
    expect((await stateFor('supervisor')).chain.checkedAt).toBe('2026-03-04T12:00:00.000Z');
  });

  test('checks what comes in as it comes, and everything again once something was wrong', async () => {
    await notesOn('2026-03-03', 2);
    await checkChain();
    await notesOn('2026-03-04', 3);
    const follow = () => railroad.app.get(ChainCheck).follow();
    expect(await follow()).toMatchObject({
      state: 'whole',
      checkedTo: 5,
      checkedAt: Date.parse('2026-03-04T12:00:00Z'),
    });
    await withoutTriggers('entry_not_changed');
    const before = await kept('kind');
    await tamper(`UPDATE entry SET kind = 'hold' WHERE sequence = 2`);
    expect(await follow()).toMatchObject({ state: 'whole' });
    expect(await checkChain()).toMatchObject({ state: 'broken' });
    await tamper('UPDATE entry SET kind = ? WHERE sequence = 2', before);
    expect(await follow()).toMatchObject({ state: 'whole', checkedTo: 5 });
  });

  const columns: [name: string, value: string | number][] = [
    ['id', 'another'],
    ['subject_kind', 'set'],
    ['subject_id', 'another'],
    ['kind', 'departure'],
    ['terminal_code', 'CAM'],
    ['service_date', '2026-03-04'],
    ['observed_at', 1],
    ['received_at', 1],
    ['body', '{"kind":"note"}'],
    ['body_hash', 'f'.repeat(64)],
    ['previous_hash', 'f'.repeat(64)],
    ['hash', 'f'.repeat(64)],
  ];

  test('names an entry of which any column was changed behind the service’s back', async () => {
    await notesOn('2026-03-03', 4);
    await withoutTriggers('entry_not_changed');
    for (const [name, value] of columns) {
      const before = await kept(name);
      await tamper(`UPDATE entry SET ${name} = ? WHERE sequence = 2`, value);
      await checkChain();
      const { chain } = await stateFor('auditor');
      expect([name, chain.state, chain.faults[0]?.sequence]).toEqual([name, 'broken', 2]);
      await tamper(`UPDATE entry SET ${name} = ? WHERE sequence = 2`, before);
    }
    expect((await checkChain()).state).toBe('whole');
  });

  test.each([
    ['in the middle', 'DELETE FROM entry WHERE sequence = 2', 'No. 2 is missing.'],
    ['at the end', 'DELETE FROM entry WHERE sequence = 4', 'tail is cut off'],
  ])('sees that an entry is gone %s', async (_, sql, words) => {
    await notesOn('2026-03-03', 4);
    await withoutTriggers('entry_not_deleted');
    await tamper(sql);
    expect(await checkChain()).toMatchObject({
      state: 'broken',
      faults: [{ words: expect.stringContaining(words) as string }],
    });
  });

  test('holds the chain against the published heads', async () => {
    await notesOn('2026-03-03', 2);
    await notesOn('2026-03-04', 2);
    await publish();
    await withoutTriggers('daily_head_not_changed');
    await tamper('UPDATE daily_head SET hash = ?', 'f'.repeat(64));
    expect(await checkChain()).toMatchObject({ state: 'broken', faults: [{ sequence: 2 }] });
  });
});

describe('an auditor', () => {
  test('reads the entries and the log, and writes nothing anywhere', async () => {
    await notesOn('2026-03-03', 1);
    const turn = await openTurn(await signedIn('dispatcher'));
    const { agent } = await signedIn('auditor');
    for (const address of [
      `/api/turns/${turn.id}/entries`,
      '/api/records/log',
      '/api/records/heads',
      '/api/records/state',
    ])
      await agent.get(address).expect(200);
    const writing = ROUTES.filter(
      ({ method, permission }) => method !== 'GET' && permission !== 'public' && permission !== 'session',
    );
    expect(writing.length).toBeGreaterThan(10);
    for (const { method, path: address } of writing) {
      const url = address.replace(':code', 'HBR').replace(/:\w+/, turn.id);
      const send = { POST: agent.post, PUT: agent.put, DELETE: agent.delete, GET: agent.get }[method].bind(
        agent,
      );
      const answer = await send(url).send({ terminal: 'HBR', ...anEntryRequest('note', 0, { note: 'x' }) });
      expect([method, address, answer.status]).toEqual([method, address, 403]);
    }
  });
});

async function withoutTriggers(...names: string[]): Promise<void> {
  for (const name of names) await tamper(`DROP TRIGGER ${name}`);
}

async function tamper(sql: string, ...parameters: unknown[]): Promise<void> {
  await railroad.app.get(UnitOfWork).run((transaction) => transaction.execute(sql, parameters));
}

function kept(column: string): Promise<unknown> {
  return railroad.app.get(UnitOfWork).run(async (transaction) => {
    const rows = await transaction.query<Record<string, unknown>[]>('SELECT * FROM entry WHERE sequence = 2');
    return rows[0]?.[column];
  });
}

/** What the machine's own sha256sum says of some texts. */
function sha256sums(texts: readonly string[]): string[] {
  const folder = mkdtempSync(path.join(os.tmpdir(), 'stubpost-test-'));
  try {
    const files = texts.map((text, index) => {
      const file = path.join(folder, String(index).padStart(6, '0'));
      writeFileSync(file, text);
      return file;
    });
    const output = execFileSync('sha256sum', files, { encoding: 'utf8' });
    return output
      .trim()
      .split('\n')
      .map((line) => line.slice(0, 64));
  } finally {
    rmSync(folder, { recursive: true, force: true });
  }
}

type Json = null | boolean | number | string | Json[] | { [name: string]: Json };

/** JSON with sorted members, written apart from the code under test. */
function sorted(value: unknown): string {
  return JSON.stringify(value, (_, each: unknown) =>
    typeof each === 'object' && each !== null && !Array.isArray(each)
      ? Object.fromEntries(Object.entries(each).sort(([a], [b]) => (a < b ? -1 : 1)))
      : each,
  );
}

/** A line with each of its values changed, one at a time. */
function changesOf(value: Json, at = ''): { path: string; value: Json }[] {
  if (typeof value !== 'object' || value === null) {
    const other =
      typeof value === 'number'
        ? value + 1
        : value === true
          ? false
          : typeof value === 'string'
            ? swapEnd(value)
            : 'x';
    return [{ path: at, value: other }];
  }
  const members = Array.isArray(value) ? [...value.entries()] : Object.entries(value);
  return members.flatMap(([name, member]) =>
    changesOf(member, `${at}.${name}`).map((changed) => ({
      path: changed.path,
      value: Array.isArray(value)
        ? value.map((each, index) => (index === name ? changed.value : each))
        : { ...value, [name]: changed.value },
    })),
  );
}

/** The last letter or digit of a text swapped for another, so that a hash stays a hash and a time a time. */
function swapEnd(text: string): string {
  const end = text.search(/[0-9a-zA-Z](?=[^0-9a-zA-Z]*Z?$)/);
  const place = text.endsWith('Z') ? text.length - 2 : end < 0 ? text.length - 1 : end;
  return `${text.slice(0, place)}${text[place] === '1' ? '2' : '1'}${text.slice(place + 1)}`;
}
