import { mkdtempSync, rmSync } from 'node:fs';
import os from 'node:os';
import path from 'node:path';

/** A folder for one test, and its removal. */
export function temporaryFolder(): { folder: string; remove(): void } {
  const folder = mkdtempSync(path.join(os.tmpdir(), 'stubpost-test-'));
  return { folder, remove: () => rmSync(folder, { recursive: true, force: true }) };
}
