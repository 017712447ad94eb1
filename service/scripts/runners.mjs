import { existsSync, mkdtempSync, readFileSync, readdirSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { run } from './child.mjs';
import { childEnvironment } from './child-environment.mjs';
import { ROOT, inRoot, packageCommand } from './paths.mjs';
import { countReport, countTap, judgeRun } from './report.mjs';

/** Ends a runner that hangs; far above what any needs, also on a machine that is busy with other things. */
const LIMIT_MILLISECONDS = 40 * 60_000;
const SCRIPTS = 'service/scripts';
const reports = mkdtempSync(join(tmpdir(), 'stubpost-reports-'));
process.on('exit', () => rmSync(reports, { recursive: true, force: true }));

function readCounts(file, count) {
  return existsSync(file) ? count(readFileSync(file, 'utf8')) : undefined;
}

async function runTests({ command, args, cwd, report, count, extraEnvironment }) {
  const env = childEnvironment(process.env, { NO_COLOR: '1', ...extraEnvironment });
  const { code, output, timedOut } = await run(command, args, {
    cwd,
    env,
    limitMilliseconds: LIMIT_MILLISECONDS,
  });
  return { output, ...judgeRun({ code, timedOut, counts: readCounts(report, count) }) };
}

const countJson = (text) => countReport(JSON.parse(text));

function vitest(name, folder, { args = [], extraEnvironment } = {}) {
  const report = join(reports, `${name.replaceAll(' ', '-')}.json`);
  const reporters = ['--reporter=default', '--reporter=json', `--outputFile.json=${report}`];
  return () =>
    runTests({
      command: packageCommand('vitest'),
      args: ['run', ...args, ...reporters],
      cwd: inRoot(folder),
      report,
      count: countJson,
      extraEnvironment,
    });
}

function jest() {
  const report = join(reports, 'service.json');
  return runTests({
    command: packageCommand('jest'),
    args: ['--ci', '--json', `--outputFile=${report}`],
    cwd: inRoot('service'),
    report,
    count: countJson,
  });
}

function nodeTests() {
  const report = join(reports, 'scripts.tap');
  const toScreen = ['--test-reporter=spec', '--test-reporter-destination=stdout'];
  const toFile = ['--test-reporter=tap', `--test-reporter-destination=${report}`];
  // Each file by its name: given the folder, Node would take test.mjs itself for a test and start all this anew.
  const files = readdirSync(inRoot(SCRIPTS)).filter((name) => name.endsWith('.test.mjs'));
  const args = ['--test', ...toScreen, ...toFile, ...files.map((name) => `${SCRIPTS}/${name}`)];
  return runTests({ command: process.execPath, args, cwd: ROOT, report, count: countTap });
}

const BROWSER_TEST = '.e2e.test.ts';
/** Browser tests that hold the product to its seconds; the others can bear a busy machine. */
const TO_THE_SECOND = ['turnaround', 'offline'];

const browserTestNames = () =>
  readdirSync(inRoot('ui/e2e'))
    .filter((file) => file.endsWith(BROWSER_TEST))
    .map((file) => file.slice(0, -BROWSER_TEST.length));

/** Without a browser its tests are skipped on a desk and failed where CI=true, since there nobody would see it. */
function withoutBrowser(names) {
  const reason = 'no Chromium found: install it (on Debian: apt-get install chromium) or set CHROMIUM_PATH';
  const isFailure = process.env.CI === 'true';
  return {
    counts: { passed: 0, failed: isFailure ? 1 : 0, skipped: isFailure ? 0 : Math.max(1, names.length) },
    output: '',
    reason,
  };
}

function browserTests(name, names, browser) {
  if (browser === undefined) return () => withoutBrowser(names);
  const files = names.map((each) => `${each}${BROWSER_TEST}`);
  const args = ['--config', 'e2e/vitest.config.ts', ...files];
  return vitest(name, 'ui', { args, extraEnvironment: { CHROMIUM_PATH: browser } });
}

/** Every test runner of the repository as a task, the longest first; `browser` is the path of Chromium, if there is one. */
export function runnerTasks(browser) {
  const names = browserTestNames();
  const pages = names.filter((name) => !TO_THE_SECOND.includes(name));
  const toTheSecond = names.filter((name) => TO_THE_SECOND.includes(name));
  return [
    { name: 'service (jest)', run: jest },
    { name: 'shared (vitest)', run: vitest('shared', 'shared') },
    { name: 'ui (vitest)', run: vitest('ui', 'ui') },
    { name: 'seed (vitest)', run: vitest('seed', 'seed') },
    { name: 'scripts (node)', run: nodeTests },
    { name: 'browser: pages', run: browserTests('browser-pages', pages, browser) },
    { name: 'browser: live', run: browserTests('browser-live', toTheSecond, browser), alone: true },
  ];
}
