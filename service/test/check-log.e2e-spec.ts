import { execFileSync, spawnSync } from 'node:child_process';
import { copyFileSync, readFileSync, writeFileSync } from 'node:fs';
import path from 'node:path';
import { aSealedLog } from '@stubpost/shared/testing';
import { sha256 } from '../src/records/sha256';
import { type Railroad, aRailroad } from './support/railroad';
import { signInAs } from './support/sign-in';
import { temporaryFolder } from './support/temporary-folder';

const builtChecker = path.join(__dirname, '../dist/check-log.mjs');
const bodies = Array.from({ length: 9 }, (_, index) => ({ kind: 'note', note: `Zürich ${index}` }));
const log = aSealedLog({ bodies, sha256 });
const whole = log.lines.map((line) => `${line}\n`).join('');
const days = ['2026-03-02', '2026-03-03', '2026-03-04'];
const heads = [3, 6, 9].map((sequence, index) => ({ ...log.heads[sequence - 1], date: days[index] }));
const newest = `${log.heads[8]?.hash}@9`;

let temporary: ReturnType<typeof temporaryFolder>;
beforeAll(() => {
  temporary = temporaryFolder();
  // As somebody takes it along: the one file alone, in a folder where nothing of ours can be found.
  copyFileSync(builtChecker, path.join(temporary.folder, 'check-log.mjs'));
  writeFileSync(path.join(temporary.folder, 'heads.json'), JSON.stringify(heads));
});
afterAll(() => temporary.remove());

/** Runs the checker in a folder of its own, without any variable of ours, on a file with this content. */
function check(content: string | Buffer, ...options: string[]) {
  writeFileSync(path.join(temporary.folder, 'log.ndjson'), content);
  return run('log.ndjson', ...options);
}

function run(...args: string[]) {
  const { status, stdout, stderr } = spawnSync(process.execPath, ['check-log.mjs', ...args], {
    cwd: temporary.folder,
    env: { PATH: process.env.PATH },
    encoding: 'utf8',
  });
  return { status, stdout, stderr };
}

describe('the checker, one file on a machine with nothing but Node', () => {
  test('says that a log is whole, what it met, and what it could not see', () => {
    const met = check(whole, '--heads', 'heads.json');
    expect(met).toMatchObject({ status: 0, stderr: '' });
    expect(met.stdout).toContain('WHOLE.');
    expect(met.stdout).toContain('Published heads met: 3; the newest is the one of 2026-03-04 at no. 9.');
    expect(met.stdout).not.toContain('Not checked');
    const alone = check(whole);
    expect(alone.status).toBe(0);
    expect(alone.stdout).toContain('Not checked:\n- No published head was given. A tail that was cut off');
  });

  test('names the first changed entry with its line, number and id', () => {
    const changed = check(whole.replace('Zürich 4', 'Zürich 5'));
    expect(changed.status).toBe(1);
    expect(changed.stdout).toContain(
      'BROKEN. The first thing that is wrong:\n' +
        '- Line 5, no. 5 (00000000-0000-4000-8000-000000000005): what the entry says was changed after it was sealed.',
    );
  });

  test.each([
    ['a missing line', log.lines.toSpliced(4, 1), 'Line 5: no. 5 is missing before it.'],
    ['an added line', log.lines.toSpliced(4, 0, log.lines[4] ?? ''), 'Line 6, no. 5'],
    ['two lines swapped', log.lines.toSpliced(4, 2, log.lines[5] ?? '', log.lines[4] ?? ''), 'Line 5, no. 6'],
    ['a line that is none', log.lines.toSpliced(4, 1, 'x'), 'Line 5 cannot be read: it is not JSON.'],
  ])('finds %s', (_, lines, words) => {
    const found = check(lines.map((line) => `${line}\n`).join(''));
    expect(found.status).toBe(1);
    expect(found.stdout).toContain(words);
  });

  test('finds a cut tail against a published head, given by hand or in a file', () => {
    const cut = `${log.lines.slice(0, 7).join('\n')}\n`;
    expect(check(cut).status).toBe(0);
    for (const options of [
      ['--head', newest],
      ['--heads', 'heads.json'],
    ]) {
      const found = check(cut, ...options);
      expect(found.status).toBe(1);
      expect(found.stdout).toContain('the log ends at no. 7, but');
      expect(found.stdout).toContain('no. 9');
    }
    expect(check(cut, '--heads', 'heads.json', '--to', '2026-03-03').status).toBe(0);
    expect(check(whole.slice(0, -1)).stdout).toContain('the file stops in the middle');
  });

  test('checks a part from the head before it', () => {
    const part = `${log.lines.slice(3).join('\n')}\n`;
    const met = check(part, '--heads', 'heads.json');
    expect(met.status).toBe(0);
    expect(met.stdout).toContain('no. 1 to 3: not in the file. It begins right after a published head');
    expect(check(part).status).toBe(1);
  });

  test('finds bytes that are no text', () => {
    const bytes = Buffer.from(whole);
    bytes[whole.indexOf('note')] = 0xff;
    const found = check(bytes);
    expect(found.status).toBe(1);
    expect(found.stdout).toContain('Line 1 cannot be read: its bytes are no UTF-8 text.');
  });

  test.each([
    ['a file that is not there', ['gone.ndjson'], 'gone.ndjson cannot be read'],
    ['no file', [], 'No file was given.'],
    ['a head that is none', ['heads.json', '--head', 'abc'], '--head takes HASH@NUMBER'],
    ['heads that are none', ['heads.json', '--heads', 'check-log.mjs'], 'check-log.mjs cannot be read'],
    ['a word it does not know', ['heads.json', '--fast'], '--fast'],
  ])('ends with 2 for %s', (_, args, words) => {
    const found = run(...args);
    expect(found).toMatchObject({ status: 2, stdout: '' });
    expect(found.stderr).toContain(words);
    expect(found.stderr).toContain('NOT CHECKED.');
  });

  test('does not call an empty file whole', () => {
    expect(check('').status).toBe(2);
    expect(check('', '--head', newest).status).toBe(1);
  });

  test('is a single file: it imports nothing but parts of Node', () => {
    const imports = [...readFileSync(builtChecker, 'utf8').matchAll(/\bfrom ["']([^"']+)["']/g)];
    expect(imports.length).toBeGreaterThan(0);
    for (const [, name] of imports) expect(name).toMatch(/^node:/);
  });

  test('is what npm run check-log runs', () => {
    check(whole);
    const script = path.join(__dirname, '../scripts/check-log.mjs');
    const env = { PATH: process.env.PATH, INIT_CWD: temporary.folder };
    const output = execFileSync(process.execPath, [script, 'log.ndjson'], { env, encoding: 'utf8' });
    expect(output).toContain('WHOLE.');
  });
});

describe('GET /api/records/checker', () => {
  let railroad: Railroad;
  beforeAll(async () => {
    railroad = await aRailroad();
  });
  afterAll(() => railroad.close());

  test('gives the very file', async () => {
    const { agent } = await signInAs(railroad.app, 'auditor');
    const answer = await agent.get('/api/records/checker').buffer(true).expect(200);
    expect(answer.headers['content-disposition']).toBe('attachment; filename="check-log.mjs"');
    expect(answer.headers['content-type']).toContain('text/javascript');
    expect(answer.text).toBe(readFileSync(builtChecker, 'utf8'));
  });
});
