import { createHash } from 'node:crypto';
import { readFileSync, readdirSync, statSync } from 'node:fs';
import { join } from 'node:path';

const TEST_FILE = /\.(test|spec|e2e-spec)\.tsx?$/;

function filesUnder(root, path) {
  const stat = statSync(join(root, path), { throwIfNoEntry: false });
  if (stat === undefined) return [];
  if (!stat.isDirectory()) return [path];
  return readdirSync(join(root, path)).flatMap((name) => filesUnder(root, `${path}/${name}`));
}

/**
 * One hash over names and contents of files and whole folders below `root`. Tests do not count: they change nothing
 * that is built. A path that does not exist adds nothing, so its coming is a change.
 */
export function digestOf(root, paths) {
  const hash = createHash('sha256');
  const files = paths.flatMap((path) => filesUnder(root, path)).filter((path) => !TEST_FILE.test(path));
  for (const path of [...new Set(files)].sort()) {
    const content = readFileSync(join(root, path));
    hash.update(`${path}\0${content.length}\0`).update(content);
  }
  return hash.digest('hex');
}
