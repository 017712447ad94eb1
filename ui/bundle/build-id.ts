import { createHash } from 'node:crypto';
import { readdirSync, readFileSync } from 'node:fs';
import path from 'node:path';

/** Every file below a folder, in one order on every machine. */
function filesBelow(folder: string): string[] {
  return readdirSync(folder, { recursive: true, withFileTypes: true })
    .filter((entry) => entry.isFile())
    .map((entry) => path.join(entry.parentPath, entry.name))
    .sort();
}

/** Names a build by what it is made from: the same sources give the same id, so that a second build is no newer version. */
export function buildIdOf(places: readonly string[]): string {
  const digest = createHash('sha256');
  for (const place of places) {
    for (const file of filesBelow(place)) {
      digest.update(path.relative(place, file)).update('\0').update(readFileSync(file)).update('\0');
    }
  }
  return digest.digest('hex').slice(0, 10);
}
