// `npm run soak`: the tests of durability and of orders of arrival in as many rounds as a night has room for. The same
// tests run in a few rounds in `npm test`. `npm run soak -- server phone` runs some parts, `--scale 0.1` fewer rounds.
import { existsSync, mkdtempSync, readFileSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { parseArgs } from 'node:util';
import { ensureBrowser } from './browser.mjs';
import { ensureBuilt } from './build.mjs';
import { childEnvironment } from './child-environment.mjs';
import { endChildrenOnSignal, run } from './child.mjs';
import { ensureInstalled } from './install.mjs';
import { inRoot, packageCommand } from './paths.mjs';
import { prepare } from './prepare.mjs';
import { Failure, formatDuration, say, sayFailure } from './say.mjs';
import { formatTable, hasHeld, mergeFigures, rowsOf } from './soak-table.mjs';

const LIMIT_MILLISECONDS = 3 * 60 * 60_000;
const PROGRESS_MILLISECONDS = 2 * 60_000;

const jest = (file) => ({ command: 'jest', folder: 'service', args: ['--ci', file] });
const offlineTests = {
  command: 'vitest',
  folder: 'ui',
  args: ['run', '--config', 'e2e/vitest.config.ts', 'offline'],
};

/** Each part with its runner and how often which variable makes its tests go round. */
const PARTS = {
  server: { ...jest('test/durability/server-crash'), rounds: { KILL_ROUNDS: 200, POWER_CUT_ROUNDS: 50 } },
  store: { ...jest('test/durability/crash.e2e'), rounds: { CRASH_ROUNDS: 50 } },
  orders: { ...jest('test/interleavings'), rounds: { INTERLEAVED_STORIES: 40, INTERLEAVED_ORDERS: 8 } },
  phone: { ...offlineTests, rounds: { SOAK_ROUNDS: 20 }, needsBrowser: true },
};

function askedFor() {
  const { values, positionals } = parseArgs({
    allowPositionals: true,
    options: { scale: { type: 'string' } },
  });
  const unknown = positionals.find((name) => !Object.hasOwn(PARTS, name));
  if (unknown !== undefined)
    throw new Failure(`There is no part "${unknown}", only ${Object.keys(PARTS).join(', ')}.`);
  const scale = Number(values.scale ?? 1);
  if (!(scale > 0)) throw new Failure('--scale takes a number above 0, such as 0.1.');
  return { names: positionals.length > 0 ? positionals : Object.keys(PARTS), scale };
}

function scaled(rounds, scale) {
  return Object.fromEntries(
    Object.entries(rounds).map(([name, value]) => [name, String(Math.max(1, Math.round(value * scale)))]),
  );
}

function figuresIn(report) {
  if (!existsSync(report)) return [];
  const lines = readFileSync(report, 'utf8').split('\n').slice(0, -1);
  return mergeFigures(lines.map((line) => JSON.parse(line)));
}

/** Says every few minutes how far a part has come, where its tests leave figures on the way. */
function sayProgress(report) {
  const timer = setInterval(() => {
    for (const { part, rounds, acknowledged, lost } of figuresIn(report))
      say(`  ${part}: ${rounds} rounds so far, ${acknowledged} receipts, ${lost} lost`);
  }, PROGRESS_MILLISECONDS);
  return () => clearInterval(timer);
}

async function runPart(name, { scale, browser, folder }) {
  const { command, args, rounds, folder: where } = PARTS[name];
  const report = join(folder, `${name}.ndjson`);
  const variables = scaled(rounds, scale);
  say(
    `${name}: ${Object.entries(variables)
      .map((each) => each.join('='))
      .join(', ')} ...`,
  );
  const began = performance.now();
  const env = childEnvironment(process.env, {
    NO_COLOR: '1',
    SOAK_REPORT: report,
    ...variables,
    ...(browser === undefined ? {} : { CHROMIUM_PATH: browser }),
  });
  const stopSaying = sayProgress(report);
  const { code, output } = await run(packageCommand(command), args, {
    cwd: inRoot(where),
    env,
    limitMilliseconds: LIMIT_MILLISECONDS,
  });
  stopSaying();
  if (code !== 0) say(`\n----- ${name}: output -----\n${output.trimEnd()}\n----- ${name}: end -----\n`);
  const total = Object.values(variables).reduce((sum, value) => sum + Number(value), 0);
  const milliseconds = performance.now() - began;
  say(`${name}: ${code === 0 ? 'held' : 'FAILED'} in ${formatDuration(milliseconds)}`);
  return { name, rounds: total, code, milliseconds, figures: figuresIn(report) };
}

async function soak() {
  const { names, scale } = askedFor();
  let browser;
  await prepare(async () => {
    await ensureInstalled();
    browser = await ensureBrowser();
    await ensureBuilt();
  });
  if (browser === undefined && names.some((name) => PARTS[name].needsBrowser))
    throw new Failure('The rounds on the phone need Chromium: install it or set CHROMIUM_PATH.');
  endChildrenOnSignal();
  const folder = mkdtempSync(join(tmpdir(), 'stubpost-soak-'));
  try {
    const parts = [];
    for (const name of names) parts.push(await runPart(name, { scale, browser, folder }));
    say(`\n${formatTable(parts.flatMap(rowsOf))}\n`);
    return hasHeld(parts);
  } finally {
    rmSync(folder, { recursive: true, force: true });
  }
}

try {
  const held = await soak();
  say(held ? 'Everything held.' : 'Something did not hold.');
  process.exitCode = held ? 0 : 1;
} catch (error) {
  sayFailure(error);
  process.exitCode = 1;
}
