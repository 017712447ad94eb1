import assert from 'node:assert/strict';
import { test } from 'node:test';
import { run, runOrFail } from './child.mjs';

const node = (script, options) => run(process.execPath, ['-e', script], options);

test('what a command prints on either output is collected, and its code is told', async () => {
  const { code, output } = await node("console.log('out'); console.error('err'); process.exitCode = 3");
  assert.equal(code, 3);
  assert.deepEqual(output.trim().split('\n').sort(), ['err', 'out']);
});

test('a command that does not exist has code 127', async () => {
  assert.equal((await run('stubpost-no-such-command', [])).code, 127);
});

test('a command that hangs is ended at its limit, with its own children', async () => {
  const hangs =
    "require('child_process').spawn('sleep', ['600'], { stdio: 'inherit' }); setInterval(() => 0, 1000)";
  const { code, timedOut } = await node(hangs, { limitMilliseconds: 400 });
  assert.equal(timedOut, true);
  assert.equal(code, 137);
});

test('a command that must succeed and does not is a failure with its output', async () => {
  await assert.rejects(
    runOrFail(process.execPath, ['-e', "console.log('why'); process.exit(2)"], { failure: 'It broke.' }),
    {
      message: 'It broke. (exit code 2)',
      output: 'why\n',
    },
  );
});
