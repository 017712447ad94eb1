import { existsSync, readFileSync, realpathSync } from 'node:fs';
import { homedir } from 'node:os';
import { dirname, join } from 'node:path';
import { run } from './child.mjs';
import { npmEnvironment } from './child-environment.mjs';
import { candidateVersion, installPackages, mayInstallPackages } from './debian.mjs';
import { callNpm } from './npm.mjs';
import { Failure } from './say.mjs';

const IS_MAC = process.platform === 'darwin';
const PURPOSE = 'to build the database driver from source';

/** What node-gyp calls, and the Debian package that brings it. Any one of the commands will do. */
const TOOLS = [
  { commands: ['python3', 'python'], package: 'python3' },
  { commands: ['make'], package: 'make' },
  { commands: [process.env.CXX, IS_MAC ? 'clang++' : 'g++'].filter(Boolean), package: 'g++' },
];

async function works(command) {
  const [program, ...args] = command.split(' ');
  return (await run(program, [...args, '--version'])).code === 0;
}

async function missingTools() {
  const missing = [];
  for (const tool of TOOLS) {
    const answers = await Promise.all(tool.commands.map(works));
    if (!answers.includes(true)) missing.push(tool.package);
  }
  return missing;
}

async function ensureCompiler() {
  const missing = await missingTools();
  if (missing.length === 0) return;
  if (mayInstallPackages()) {
    await installPackages(missing, PURPOSE);
    const still = await missingTools();
    if (still.length === 0) return;
  }
  const how = IS_MAC
    ? 'They come with "xcode-select --install".'
    : `On Debian: apt-get install ${missing.join(' ')}`;
  throw new Failure(`Missing ${PURPOSE}: ${missing.join(', ')}. ${how}`);
}

/** Whether `folder`/include/node holds the headers of a Node that takes the same compiled modules as this one. */
export function hasHeaders(folder, modules = process.versions.modules) {
  const file = join(folder, 'include/node/node_version.h');
  if (!existsSync(file)) return false;
  return new RegExp(`#define NODE_MODULE_VERSION ${modules}\\b`).test(readFileSync(file, 'utf8'));
}

async function configuredFolder() {
  const { code, output } = await callNpm(['config', 'get', 'nodedir'], { env: npmEnvironment(process.env) });
  const folder = output.trim().split('\n').at(-1);
  return code === 0 && folder !== 'undefined' && folder !== '' ? folder : undefined;
}

function cachedByNodeGyp() {
  const folder = IS_MAC ? 'Library/Caches/node-gyp' : '.cache/node-gyp';
  return join(homedir(), folder, process.versions.node);
}

async function localHeaders() {
  const besideNode = dirname(dirname(realpathSync(process.execPath)));
  const folders = [await configuredFolder(), besideNode, '/usr', '/usr/local', cachedByNodeGyp()];
  return folders.find((folder) => folder !== undefined && hasHeaders(folder));
}

async function canDownloadHeaders() {
  const url = process.release.headersUrl;
  if (url === undefined) return false;
  try {
    return (await fetch(url, { method: 'HEAD', signal: AbortSignal.timeout(15_000) })).ok;
  } catch {
    return false;
  }
}

/**
 * The folder to name to node-gyp as `nodedir`, or undefined when it can fetch the headers itself. Looks where people
 * and packages put them before it asks the network, since a machine behind a wall often has them at hand.
 */
async function findHeaders() {
  const found = await localHeaders();
  if (found !== undefined) return found;
  if (mayInstallPackages() && (await candidateVersion('libnode-dev'))?.startsWith(process.versions.node)) {
    await installPackages(['libnode-dev'], PURPOSE);
    const installed = await localHeaders();
    if (installed !== undefined) return installed;
  }
  if (await canDownloadHeaders()) return undefined;
  throw new Failure(
    `Missing ${PURPOSE}: the header files of Node ${process.version}. They come with the package of Node itself, on ` +
      'Debian with the package libnode-dev. Or unpack the headers archive of this version and name its folder: ' +
      'npm config set nodedir FOLDER',
  );
}

/** Makes sure that a native module can be compiled. Answers what npm must be told for it. */
export async function ensureToolchain() {
  await ensureCompiler();
  const nodedir = await findHeaders();
  return nodedir === undefined ? {} : { npm_config_nodedir: nodedir };
}
