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

// The server runs inside this process, not below it: a signal or a kill then meets the server itself, and there is
// never one left behind.
cleanOwnEnvironment();
say('Starting Stubpost ...');
await import(pathToFileURL(inRoot('service/dist/main.js')).href);
