import { existsSync, readdirSync, readFileSync, rmSync, statSync, writeFileSync } from 'node:fs';
import path from 'node:path';
import type { Plugin } from 'vite';

/** Days for which the files of an earlier build stay: a page left open over a holiday still finds its parts. Our choice. */
const keptDays = 30;
const millisecondsInDay = 24 * 3600 * 1000;

/** When each file of the assets folder was last part of the newest build; instants in milliseconds. */
export type LastUsed = Readonly<Record<string, number>>;

/** What stays and what goes: files of this build are in use now, others stay for 30 days after they last were. */
export function sortAssets(
  {
    present,
    current,
    lastUsed,
  }: { present: readonly string[]; current: ReadonlySet<string>; lastUsed: LastUsed },
  now: number,
): { kept: LastUsed; gone: string[] } {
  const kept: Record<string, number> = {};
  const gone: string[] = [];
  for (const file of present) {
    // One that nobody noted was put there by an earlier build; its days begin to count now.
    const usedAt = current.has(file) ? now : (lastUsed[file] ?? now);
    if (now - usedAt > keptDays * millisecondsInDay) gone.push(file);
    else kept[file] = usedAt;
  }
  return { kept, gone };
}

/**
 * Keeps the files of earlier builds beside the new ones for 30 days. Without them, a page that was opened before the new
 * version was put in place could not load its remaining parts. Files that carry no hash are written over as ever.
 */
export function keepOldAssets(): Plugin {
  let outDir = '';
  const current = new Set<string>();
  return {
    name: 'keep-old-assets',
    apply: 'build',
    configResolved: (config) => {
      outDir = path.resolve(config.root, config.build.outDir);
    },
    writeBundle: (_options, bundle) => {
      for (const file of Object.keys(bundle)) {
        if (file.startsWith('assets/')) current.add(path.basename(file));
      }
    },
    closeBundle: () => {
      const folder = path.join(outDir, 'assets');
      const notes = path.join(outDir, '.vite', 'last-used.json');
      if (!existsSync(folder)) return;
      const lastUsed = existsSync(notes) ? (JSON.parse(readFileSync(notes, 'utf8')) as LastUsed) : {};
      const present = readdirSync(folder);
      // The page is written anew with every build: its time is the time of this one.
      const now = statSync(path.join(outDir, 'index.html')).mtimeMs;
      const { kept, gone } = sortAssets({ present, current, lastUsed }, now);
      for (const file of gone) rmSync(path.join(folder, file));
      writeFileSync(notes, JSON.stringify(kept));
    },
  };
}
