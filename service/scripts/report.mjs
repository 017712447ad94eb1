const NOTHING = { passed: 0, failed: 0, skipped: 0 };

export function addCounts(first, second) {
  return {
    passed: first.passed + second.passed,
    failed: first.failed + second.failed,
    skipped: first.skipped + second.skipped,
  };
}

export const sumCounts = (list) => list.reduce(addCounts, NOTHING);

export const formatCounts = ({ passed, failed, skipped }) =>
  `${passed} passed, ${failed} failed, ${skipped} skipped`;

function countFile({ status, assertionResults }) {
  const counts = { ...NOTHING };
  for (const { status: verdict } of assertionResults) {
    counts[verdict === 'passed' || verdict === 'failed' ? verdict : 'skipped'] += 1;
  }
  // A file that does not load, or falls over outside its tests, has failed although none of its tests has.
  if (status === 'failed' && counts.failed === 0) counts.failed = 1;
  return counts;
}

/** Counts of a JSON report; jest and vitest write the same shape. */
export const countReport = (report) => sumCounts(report.testResults.map(countFile));

/** Counts of the closing lines that Node's own test runner writes as TAP. */
export function countTap(text) {
  const figure = (name) => Number(new RegExp(`^# ${name} (\\d+)$`, 'm').exec(text)?.[1] ?? 0);
  return {
    passed: figure('pass'),
    failed: figure('fail') + figure('cancelled'),
    skipped: figure('skipped') + figure('todo'),
  };
}

/**
 * The verdict on one run of a test runner: its counts, and a reason where the counts alone would not tell that
 * something is wrong. `counts` is undefined when the runner left no report.
 */
export function judgeRun({ code, timedOut, counts }) {
  const fail = (reason) => ({ counts: addCounts(counts ?? NOTHING, { ...NOTHING, failed: 1 }), reason });
  if (timedOut) return fail('did not end in time and was stopped');
  if (counts === undefined) return fail(`left no report (exit code ${code})`);
  if (counts.passed + counts.failed + counts.skipped === 0) return fail('found no test');
  if (code !== 0 && counts.failed === 0) return fail(`ended with exit code ${code} although no test failed`);
  return { counts, reason: undefined };
}
