import { accessSync, constants } from 'node:fs';
import { delimiter, join } from 'node:path';
import { installPackages, mayInstallPackages } from './debian.mjs';
import { say } from './say.mjs';

const NAMES = ['chromium', 'chromium-browser', 'google-chrome'];

function isExecutable(path) {
  try {
    accessSync(path, constants.X_OK);
    return true;
  } catch {
    return false;
  }
}

/** The browser for the tests: the one named by CHROMIUM_PATH, which is then the only one that counts, else one on the path. */
export function findBrowser(environment = process.env) {
  const named = environment.CHROMIUM_PATH;
  if (named) return isExecutable(named) ? named : undefined;
  const folders = ['/usr/bin', ...(environment.PATH ?? '').split(delimiter)];
  return folders.flatMap((folder) => NAMES.map((name) => join(folder, name))).find(isExecutable);
}

/** Finds the browser, installing it where we may; undefined when there is none to be had. */
export async function ensureBrowser() {
  const found = findBrowser();
  if (found !== undefined || process.env.CHROMIUM_PATH || !mayInstallPackages()) return found;
  try {
    await installPackages(['chromium'], 'for the browser tests');
  } catch (error) {
    say(error.message);
  }
  return findBrowser();
}
