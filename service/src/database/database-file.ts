import { closeSync, existsSync, fsyncSync, openSync, readFileSync, renameSync, writeFileSync } from 'node:fs';
import path from 'node:path';

const pointerName = 'current-database';
const firstName = 'stubpost.sqlite';

/** File that says which database of a data folder is in use; absent until somebody leaves the demo. */
export function pointerFile(dataDir: string): string {
  return path.join(dataDir, pointerName);
}

/** The SQLite file in use in a data folder. */
export function databaseFile(dataDir: string): string {
  const pointer = pointerFile(dataDir);
  if (!existsSync(pointer)) return path.join(dataDir, firstName);
  const name = readFileSync(pointer, 'utf8').trim();
  if (/^[a-z0-9-]+\.sqlite$/.test(name)) return path.join(dataDir, name);
  throw new Error(`${pointer} does not name a database`);
}

/**
 * Points a data folder at a new, empty database beside the one in use, which stays as it is. Takes effect at the
 * next start. Written aside, synced and renamed, so that a crash leaves the old choice or the new one.
 */
export function pointAtNewDatabase(dataDir: string): void {
  const number = [...Array(1000).keys()].find(
    (n) => !existsSync(path.join(dataDir, `railroad-${n + 1}.sqlite`)),
  );
  if (number === undefined) throw new Error(`${dataDir} is full of databases`);
  const aside = `${pointerFile(dataDir)}.new`;
  writeFileSync(aside, `railroad-${number + 1}.sqlite\n`);
  const handle = openSync(aside, 'r');
  fsyncSync(handle);
  closeSync(handle);
  renameSync(aside, pointerFile(dataDir));
}
