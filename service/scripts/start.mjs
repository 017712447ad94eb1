// `npm start`: installs and builds what has changed, then becomes the server. Needs nothing but Node.
import { pathToFileURL } from 'node:url';
import { ensureBuilt } from './build.mjs';
import { cleanOwnEnvironment } from './child-environment.mjs';
import { ensureInstalled } from './install.mjs';
import { inRoot } from './paths.mjs';
import { prepare } from './prepare.mjs';
import { say, sayFailure } from './say.mjs';

try {
  await prepare(async () => {
    await ensureInstalled();
    await ensureBuilt();
  });
} catch (error) {
  sayFailure(error);
  process.exit(1);
}

/** npm killed hard cannot tell us; without this the server would go on unseen and keep its port. */
function endWithParent() {
  const parent = process.ppid;
  const timer = setInterval(() => {
    if (process.ppid === parent) return;
    clearInterval(timer);
    process.kill(process.pid, 'SIGTERM');
  }, 500);
  timer.unref();
}

// The server runs inside this process, not below it: a signal or a kill then meets the server itself, and there is
// never one left behind.
if (process.env.npm_lifecycle_event !== undefined) endWithParent();
cleanOwnEnvironment();
say('Starting Stubpost ...');
await import(pathToFileURL(inRoot('service/dist/main.js')).href);
