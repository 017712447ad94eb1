import { createHash } from 'node:crypto';
import { existsSync, readFileSync } from 'node:fs';
import { run } from './child.mjs';
import { childEnvironment, npmEnvironment } from './child-environment.mjs';
import { digestOf } from './digest.mjs';
import { callNpm } from './npm.mjs';
import { ROOT, STAMP_FOLDER, inRoot, packageCommand } from './paths.mjs';
import { Failure, stage } from './say.mjs';
import { Stamp } from './stamp.mjs';
import { ensureToolchain } from './toolchain.mjs';

const WORKSPACES = ['shared', 'service', 'seed', 'ui'];
const stamp = new Stamp(STAMP_FOLDER, 'install');

/** The parts of a package.json that npm reads when it installs; a changed script is no reason to install anew. */
const INSTALL_FIELDS = [
  'dependencies',
  'devDependencies',
  'optionalDependencies',
  'overrides',
  'workspaces',
  'allowScripts',
];

function manifestFacts(folder) {
  const manifest = JSON.parse(readFileSync(inRoot(folder, 'package.json'), 'utf8'));
  return INSTALL_FIELDS.map((field) => manifest[field]);
}

/** Compiled modules fit one line of Node on one kind of machine; packages fit the lock file. */
function wantedStamp() {
  const manifests = JSON.stringify(['.', ...WORKSPACES].map(manifestFacts));
  return {
    runtime: `${process.platform}-${process.arch}-${process.versions.modules}`,
    lock: digestOf(ROOT, ['package-lock.json', '.npmrc']),
    manifests: createHash('sha256').update(manifests).digest('hex'),
  };
}

const isThere = () =>
  existsSync(inRoot('node_modules/.package-lock.json')) && existsSync(packageCommand('tsc'));

/**
 * After a finished install for this Node a changed lock file needs the difference only. In every other case - first
 * time, another Node, an install broken off - start from nothing. Neither writes to the lock file.
 */
function npmArguments(wanted) {
  if (!existsSync(inRoot('package-lock.json'))) return ['install'];
  const hasGoodBase = isThere() && stamp.read().runtime === wanted.runtime;
  return hasGoodBase ? ['install', '--no-save'] : ['ci'];
}

/** Opens a database in memory, since a driver built for another Node only fails when it is loaded. */
async function driverLoads() {
  const script = "new (require('better-sqlite3'))(':memory:').close()";
  const cwd = inRoot('service');
  return (
    (await run(process.execPath, ['-e', script], { cwd, env: childEnvironment(process.env) })).code === 0
  );
}

async function npmOrFail(args, env) {
  const { code, output } = await callNpm(args, { env });
  if (code !== 0) throw new Failure(`npm ${args.join(' ')} failed (exit code ${code}).`, { output });
}

/** Installs the packages when the lock file, a package.json or Node has changed since, or when they are not there. */
export async function ensureInstalled() {
  const wanted = wantedStamp();
  if (isThere() && stamp.matches(wanted)) return;
  const toolchain = await ensureToolchain();
  const args = npmArguments(wanted);
  stamp.clear();
  const patience = args[0] === 'ci' ? '; this takes a few minutes' : '';
  await stage(`Installing packages (npm ${args.join(' ')}${patience})`, async () => {
    const env = npmEnvironment(process.env, toolchain);
    await npmOrFail(args, env);
    if (!(await driverLoads())) await npmOrFail(['rebuild', 'better-sqlite3'], env);
  });
  stamp.write(wantedStamp());
}
