import { readFileSync } from 'node:fs';
import path from 'node:path';

const pointerName = 'current-database';
const firstName = 'stubpost.sqlite';

/** File that says which database of a data folder is in use; absent until somebody leaves the demo. */
export function pointerFile(dataDir: string): string {
  return path.join(dataDir, pointerName);
}

/** The SQLite file in use in a data folder. */
export function databaseFile(dataDir: string): string {
  try {
    const name = readFileSync(pointerFile(dataDir), 'utf8').trim();
    if (/^[a-z0-9-]+\.sqlite$/.test(name)) return path.join(dataDir, name);
  } catch (error) {
    if ((error as NodeJS.ErrnoException).code !== 'ENOENT') throw error;
  }
  return path.join(dataDir, firstName);
}
