// Which files of the service an area opens to the others: read from its modules, which are the word that counts.
import { readFileSync, readdirSync } from 'node:fs';
import { posix } from 'node:path';

function moduleFiles(sourceFolder) {
  return readdirSync(sourceFolder, { recursive: true }).filter((name) => name.endsWith('.module.ts'));
}

/** Names in the list `exports: [...]` of a Nest module. */
function exportedNames(text) {
  const list = /\bexports:\s*\[([^\]]*)\]/.exec(text)?.[1] ?? '';
  return list.split(',').map((name) => name.trim());
}

/** Where each name that the module imports by a relative path comes from. */
function importedFrom(text) {
  const origins = new Map();
  for (const [, names, path] of text.matchAll(/import \{([^}]*)\} from '(\.[^']*)'/g)) {
    for (const name of names.split(',')) origins.set(name.trim(), path);
  }
  return origins;
}

/** Files, without ending and relative to `sourceFolder`, whose classes some module exports. */
export function openFiles(sourceFolder) {
  return moduleFiles(sourceFolder).flatMap((file) => {
    const text = readFileSync(`${sourceFolder}/${file}`, 'utf8');
    const origins = importedFrom(text);
    const paths = exportedNames(text).map((name) => origins.get(name));
    return paths.filter((path) => path !== undefined).map((path) => posix.join(posix.dirname(file), path));
  });
}
