import assert from 'node:assert/strict';
import { test } from 'node:test';
import { countReport, countTap, formatCounts, judgeRun, sumCounts } from './report.mjs';

const file = (status, ...verdicts) => ({
  status,
  assertionResults: verdicts.map((verdict) => ({ status: verdict })),
});

test('every verdict of a report is counted once, and one that is neither passed nor failed is skipped', () => {
  const report = {
    testResults: [file('failed', 'passed', 'failed', 'pending'), file('passed', 'passed', 'todo', 'skipped')],
  };
  assert.deepEqual(countReport(report), { passed: 2, failed: 1, skipped: 3 });
});

test('a file that does not load counts as one failed test', () => {
  assert.deepEqual(countReport({ testResults: [file('failed'), file('passed', 'passed')] }), {
    passed: 1,
    failed: 1,
    skipped: 0,
  });
});

test('a file that falls over after its tests have passed counts as one failed test', () => {
  assert.deepEqual(countReport({ testResults: [file('failed', 'passed')] }), {
    passed: 1,
    failed: 1,
    skipped: 0,
  });
});

test('a cancelled test of the TAP report has failed and an open one is skipped', () => {
  const tap = '# tests 12\n# pass 6\n# fail 2\n# cancelled 1\n# skipped 1\n# todo 2\n';
  assert.deepEqual(countTap(tap), { passed: 6, failed: 3, skipped: 3 });
});

const good = { code: 0, timedOut: false, counts: { passed: 3, failed: 0, skipped: 0 } };
const verdicts = [
  { name: 'a clean run keeps its counts', run: good, passed: 3, failed: 0 },
  { name: 'a run that left no report has failed', run: { ...good, counts: undefined }, passed: 0, failed: 1 },
  {
    name: 'a run that found no test has failed',
    run: { ...good, counts: { passed: 0, failed: 0, skipped: 0 } },
    passed: 0,
    failed: 1,
  },
  {
    name: 'a bad exit code without a failed test is a failure',
    run: { ...good, code: 1 },
    passed: 3,
    failed: 1,
  },
  {
    name: 'a run that was stopped has failed',
    run: { ...good, code: 137, timedOut: true },
    passed: 3,
    failed: 1,
  },
  {
    name: 'a bad exit code that its failed tests explain adds nothing',
    run: { ...good, code: 1, counts: { passed: 2, failed: 1, skipped: 0 } },
    passed: 2,
    failed: 1,
  },
];

for (const { name, run, passed, failed } of verdicts) {
  test(name, () => {
    const { counts, reason } = judgeRun(run);
    assert.deepEqual(counts, { passed, failed, skipped: 0 });
    assert.equal(reason === undefined, failed === run.counts?.failed);
  });
}

test('the last line names the sums in the agreed words', () => {
  const sum = sumCounts([
    { passed: 1, failed: 2, skipped: 3 },
    { passed: 10, failed: 20, skipped: 30 },
  ]);
  assert.equal(formatCounts(sum), '11 passed, 22 failed, 33 skipped');
});
