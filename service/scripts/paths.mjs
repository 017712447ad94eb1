import { join } from 'node:path';
import { fileURLToPath } from 'node:url';

/** The repository's top folder. */
export const ROOT = fileURLToPath(new URL('../..', import.meta.url));

/** What was installed and built last, and who is at it now. Ignored by git. */
export const STAMP_FOLDER = join(ROOT, '.stamp');

/** Full path of a file given relative to the repository's top folder. */
export const inRoot = (...parts) => join(ROOT, ...parts);

/** A command that one of the installed packages brings. */
export const packageCommand = (name) => inRoot('node_modules/.bin', name);
