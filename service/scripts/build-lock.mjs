import { randomBytes } from 'node:crypto';
import { linkSync, mkdirSync, readFileSync, renameSync, rmSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { setTimeout as sleep } from 'node:timers/promises';
import { isRunning, startMark } from './process-table.mjs';

const describe = (pid) => ({ pid, mark: startMark(pid) });
const isAlive = ({ pid, mark }) => isRunning(pid) && startMark(pid) === mark;

/** The lock as written; undefined when there is none; one without holders when a power cut left it unreadable. */
function read(path) {
  try {
    return JSON.parse(readFileSync(path, 'utf8'));
  } catch (error) {
    return error.code === 'ENOENT' ? undefined : { token: 'unreadable', holders: [] };
  }
}

/**
 * Lets one process at a time install and build in a clone. The lock is a file that names its holder and the holder's
 * running children. It holds while any of them lives: after a `kill -9` of the holder alone a package install goes on
 * by itself, and a second one beside it would spoil both. When all are gone the lock is dead and is taken over.
 */
export class BuildLock {
  #path;
  #token = randomBytes(8).toString('hex');

  constructor(folder, name = 'lock') {
    mkdirSync(folder, { recursive: true });
    this.#path = join(folder, name);
  }

  /** Waits for the lock. `onWait` hears once, with the holder's process number, that somebody else has it. */
  async take({ onWait = () => undefined, pauseMilliseconds = 200 } = {}) {
    for (let told = false; ;) {
      if (this.#place(this.#path)) return;
      const found = read(this.#path);
      const alive = found?.holders.find(isAlive);
      if (alive !== undefined && !told) {
        onWait(alive.pid);
        told = true;
      }
      if (found !== undefined && alive === undefined) this.#buryDead(found);
      await sleep(alive === undefined ? 5 : pauseMilliseconds);
    }
  }

  /** Names the children that now work under the lock. */
  nameChildren(pids) {
    this.#write(`${this.#path}.${this.#token}`, pids);
    renameSync(`${this.#path}.${this.#token}`, this.#path);
  }

  release() {
    if (read(this.#path)?.token === this.#token) rmSync(this.#path, { force: true });
  }

  #write(path, children) {
    const holders = [process.pid, ...children].map(describe);
    writeFileSync(path, JSON.stringify({ token: this.#token, holders }));
  }

  /** Puts our file at `path`, in one step and only if nothing is there. */
  #place(path) {
    const own = `${path}.${this.#token}`;
    this.#write(own, []);
    try {
      linkSync(own, path);
      return true;
    } catch (error) {
      if (error.code === 'EEXIST') return false;
      throw error;
    } finally {
      rmSync(own, { force: true });
    }
  }

  /**
   * Removes a dead lock. Two who wait may see the same dead lock, and the slower must not remove the lock the quicker
   * has just taken. So each first claims the right to bury this very lock, then looks again.
   */
  #buryDead(dead) {
    const claim = `${this.#path}.bury-${dead.token}`;
    if (this.#place(claim) && read(this.#path)?.token === dead.token) rmSync(this.#path, { force: true });
    // The one who claimed it may have died as well; then the claim, too, is in the way.
    const claimant = read(claim);
    if (claimant?.token === this.#token || !claimant?.holders.some(isAlive)) rmSync(claim, { force: true });
  }
}
