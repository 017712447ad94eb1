import { existsSync } from 'node:fs';
import { runOrFail } from './child.mjs';
import { childEnvironment } from './child-environment.mjs';
import { digestOf } from './digest.mjs';
import { ROOT, STAMP_FOLDER, inRoot, packageCommand } from './paths.mjs';
import { stage } from './say.mjs';
import { Stamp } from './stamp.mjs';

const PROJECTS = ['shared', 'service', 'seed'];
const CHECKER_CONFIG = 'service/vite.checker.config.mjs';
const RESULTS = [
  'shared/dist/index.js',
  'service/dist/main.js',
  'service/dist/check-log.mjs',
  'seed/dist/index.js',
  'ui/dist/index.html',
];
const SOURCES = [
  'package-lock.json',
  'tsconfig.base.json',
  CHECKER_CONFIG,
  ...PROJECTS.flatMap((project) => [`${project}/src`, `${project}/package.json`, `${project}/tsconfig.json`]),
  ...['src', 'public', 'bundle', 'index.html', 'package.json', 'vite.config.ts'].map((path) => `ui/${path}`),
];

const stamp = new Stamp(STAMP_FOLDER, 'build');
const isThere = () => RESULTS.every((path) => existsSync(inRoot(path)));

/** `--force` where results are missing: the compiler only looks at its own notes and would write nothing. */
function compile() {
  const args = ['-b', ...PROJECTS, ...(isThere() ? [] : ['--force'])];
  const failure = 'The service does not compile.';
  return runOrFail(packageCommand('tsc'), args, { cwd: ROOT, env: childEnvironment(process.env), failure });
}

function bundle() {
  const failure = 'The screens cannot be built.';
  return runOrFail(packageCommand('vite'), ['build'], {
    cwd: inRoot('ui'),
    env: childEnvironment(process.env),
    failure,
  });
}

function bundleChecker() {
  const failure = 'The checker of the log cannot be built.';
  return runOrFail(packageCommand('vite'), ['build', '--config', CHECKER_CONFIG], {
    cwd: ROOT,
    env: childEnvironment(process.env),
    failure,
  });
}

/** Builds the service and the screens when a source has changed since the last build, or when a result is missing. */
export async function ensureBuilt() {
  const wanted = { sources: digestOf(ROOT, SOURCES) };
  if (isThere() && stamp.matches(wanted)) return;
  stamp.clear();
  await stage('Building the service and the screens', async () => {
    const results = await Promise.allSettled([compile(), bundle(), bundleChecker()]);
    const failed = results.find(({ status }) => status === 'rejected');
    if (failed !== undefined) throw failed.reason;
  });
  stamp.write(wanted);
}
