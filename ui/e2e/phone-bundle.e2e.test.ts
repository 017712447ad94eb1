import { readFileSync } from 'node:fs';
import { fileURLToPath } from 'node:url';
import { gzipSync } from 'node:zlib';
import { describe, expect, it } from 'vitest';
import { phoneFiles, type BuildManifest } from '../bundle/phone-files.ts';

const dist = fileURLToPath(new URL('../dist/', import.meta.url));
const read = (file: string): string => readFileSync(dist + file, 'utf8');

/** Script of the phone's pages, packed, may weigh this much: a page over a weak signal. Our choice. */
const scriptLimitKilobytes = 250;
/** Parts of the desk that no phone needs; the timeline library alone is half as heavy as all of the phone. */
const DESK_PARTS = /timeline|board-page|history-page|setup-page|timetables-page|people-page|moment/;

describe('the phone’s part of the build', () => {
  const files = [...phoneFiles(JSON.parse(read('.vite/manifest.json')) as BuildManifest)];
  const scripts = files.filter((file) => file.endsWith('.js'));

  it('weighs no more than a weak signal can carry', () => {
    const weighed = scripts.map((file) => [file, gzipSync(readFileSync(dist + file)).length] as const);
    const kilobytes = weighed.reduce((sum, [, bytes]) => sum + bytes, 0) / 1000;
    const heaviest = weighed.sort(([, a], [, b]) => b - a).slice(0, 8);
    expect(kilobytes, JSON.stringify(heaviest)).toBeLessThanOrEqual(scriptLimitKilobytes);
  });

  it('holds nothing of the desk, least of all the timeline library', () => {
    expect(files.filter((file) => DESK_PARTS.test(file))).toEqual([]);
    expect(scripts.filter((file) => /vis-timeline|VisTimeline/.test(read(file)))).toEqual([]);
  });

  it('is what the worker keeps, with the page itself and its mark, and nothing else', () => {
    const kept = [...read('worker.js').matchAll(/\burl:"([^"]+)"/g)].map(([, url]) => url ?? '');
    expect(kept.filter((url) => url.startsWith('assets/')).sort()).toEqual([...files].sort());
    expect(kept.filter((url) => !url.startsWith('assets/')).sort()).toEqual([
      'app.webmanifest',
      'index.html',
      'mark.svg',
    ]);
  });
});
