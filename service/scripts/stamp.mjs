import { mkdirSync, readFileSync, renameSync, rmSync, writeFileSync } from 'node:fs';
import { dirname, join } from 'node:path';

/** What is known of a finished piece of work: a small JSON object kept in one file of `folder`. */
export class Stamp {
  constructor(folder, name) {
    this.file = join(folder, `${name}.json`);
  }

  /** The object as it was written, or an empty one when there is none or it cannot be read. */
  read() {
    try {
      return JSON.parse(readFileSync(this.file, 'utf8'));
    } catch {
      return {};
    }
  }

  matches(wanted) {
    const found = this.read();
    return Object.entries(wanted).every(([name, value]) => found[name] === value);
  }

  /** Whole or not at all: a stamp is moved into place. */
  write(facts) {
    mkdirSync(dirname(this.file), { recursive: true });
    const half = `${this.file}.${process.pid}`;
    writeFileSync(half, `${JSON.stringify(facts, null, 2)}\n`);
    renameSync(half, this.file);
  }

  /** Taken away before the work begins, so that work broken off half-way is never taken for done. */
  clear() {
    rmSync(this.file, { force: true });
  }
}
