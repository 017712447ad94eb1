import assert from 'node:assert/strict';
import { spawn } from 'node:child_process';
import { once } from 'node:events';
import { mkdtempSync, readFileSync, readdirSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterEach, beforeEach, test } from 'node:test';
import { BuildLock } from './build-lock.mjs';

const LOCK_FILE = new URL('build-lock.mjs', import.meta.url).href;
let folder;
let children = [];

beforeEach(() => {
  folder = mkdtempSync(join(tmpdir(), 'stubpost-lock-'));
});
afterEach(() => {
  for (const child of children) child.kill('SIGKILL');
  children = [];
  rmSync(folder, { recursive: true });
});

/** Another process that takes the lock, says so, runs `then`, and stays until it is killed. */
async function otherHolder(then = '') {
  const script = `
    import { spawn } from 'node:child_process';
    import { BuildLock } from ${JSON.stringify(LOCK_FILE)};
    const lock = new BuildLock(${JSON.stringify(folder)});
    await lock.take();
    ${then}
    console.log('taken');
    setInterval(() => undefined, 1000);`;
  const child = spawn(process.execPath, ['--input-type=module', '-e', script], {
    stdio: ['ignore', 'pipe', 'inherit'],
  });
  children.push(child);
  await once(child.stdout, 'data');
  return child;
}

async function killHard(child) {
  child.kill('SIGKILL');
  await once(child, 'exit');
}

const quickly = { pauseMilliseconds: 5 };

test('the second waits until the first lets go, and hears who has the lock', async () => {
  const first = new BuildLock(folder);
  const second = new BuildLock(folder);
  const order = [];
  await first.take();
  const waiting = second
    .take({ ...quickly, onWait: (pid) => order.push(`waits for ${pid}`) })
    .then(() => order.push('second'));
  while (order.length === 0) await new Promise((resolve) => setImmediate(resolve));
  order.push('first lets go');
  first.release();
  await waiting;
  assert.deepEqual(order, [`waits for ${process.pid}`, 'first lets go', 'second']);
});

test('a lock whose holder was killed is taken over, by one of many who wait', async () => {
  await killHard(await otherHolder());
  let inside = 0;
  let most = 0;
  await Promise.all(
    Array.from({ length: 8 }, async () => {
      const lock = new BuildLock(folder);
      await lock.take(quickly);
      inside += 1;
      most = Math.max(most, inside);
      await new Promise((resolve) => setTimeout(resolve, 2));
      inside -= 1;
      lock.release();
    }),
  );
  assert.equal(most, 1);
  assert.deepEqual(readdirSync(folder), []);
});

test('a lock still holds while a child of a killed holder is at work', async () => {
  const holder = await otherHolder(
    "lock.nameChildren([spawn('sleep', ['60'], { detached: true, stdio: 'ignore' }).pid]);",
  );
  await killHard(holder);
  const [, orphan] = JSON.parse(readFileSync(join(folder, 'lock'), 'utf8')).holders;
  const lock = new BuildLock(folder);
  let heard;
  const taken = lock.take({ ...quickly, onWait: (pid) => (heard = pid) });
  while (heard === undefined) await new Promise((resolve) => setImmediate(resolve));
  assert.equal(heard, orphan.pid);
  process.kill(orphan.pid, 'SIGKILL');
  await taken;
  lock.release();
});

test('a process that has the number of a dead holder does not keep the lock', async () => {
  const lock = new BuildLock(folder);
  writeFileSync(
    join(folder, 'lock'),
    JSON.stringify({ token: 'old', holders: [{ pid: process.pid, mark: 'long ago' }] }),
  );
  await lock.take(quickly);
  assert.notEqual(JSON.parse(readFileSync(join(folder, 'lock'), 'utf8')).token, 'old');
});

test('a lock file that a power cut left empty is taken over', async () => {
  writeFileSync(join(folder, 'lock'), '');
  const lock = new BuildLock(folder);
  await lock.take(quickly);
  lock.release();
  assert.deepEqual(readdirSync(folder), []);
});

test('letting go twice does not take the lock from the next', async () => {
  const first = new BuildLock(folder);
  const second = new BuildLock(folder);
  await first.take();
  first.release();
  await second.take(quickly);
  first.release();
  assert.deepEqual(readdirSync(folder), ['lock']);
});
