import { BuildLock } from './build-lock.mjs';
import { endChildrenOnSignal, onChildrenChanged } from './child.mjs';
import { STAMP_FOLDER } from './paths.mjs';
import { Failure, say } from './say.mjs';

const WAITING = (pid) =>
  `Another start or test of this clone (process ${pid}) is installing or building; waiting for it ...`;

function requireNode(version = process.versions.node) {
  const [major, minor] = version.split('.').map(Number);
  const isOlder = major < 20 || (major === 20 && minor < 19);
  if (isOlder)
    throw new Failure(`Stubpost needs Node 20.19 or a later version of the 20 line; this is ${version}.`);
  if (major > 20) say(`Stubpost is made for Node 20; this is ${version}. It may not build.`);
}

/** Does `work` as the only one who installs or builds in this clone, and leaves no child behind when told to end. */
export async function prepare(work) {
  requireNode();
  const lock = new BuildLock(STAMP_FOLDER);
  const ignoreSignals = endChildrenOnSignal({ before: () => lock.release() });
  try {
    await lock.take({ onWait: (pid) => say(WAITING(pid)) });
    const stopNaming = onChildrenChanged((pids) => lock.nameChildren(pids));
    try {
      await work();
    } finally {
      stopNaming();
      lock.release();
    }
  } finally {
    ignoreSignals();
  }
}
