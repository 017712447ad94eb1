import { mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import os from 'node:os';
import path from 'node:path';
import { railRouteTypes } from '@stubpost/shared';
import { aFeed, type FeedTexts } from '@stubpost/shared/testing';
import { strToU8, zipSync } from 'fflate';
import { type FeedLimits, feedLimits } from './feed-limits';
import { type FeedProgress, type FeedReadAnswer, readFeed } from './feed-reader';

let folder: string;
beforeAll(() => {
  folder = mkdtempSync(path.join(os.tmpdir(), 'stubpost-test-'));
});
afterAll(() => rmSync(folder, { recursive: true, force: true }));

const zipped = (texts: FeedTexts): Buffer =>
  Buffer.from(
    zipSync(Object.fromEntries(Object.entries(texts).map(([name, text]) => [name, strToU8(text)]))),
  );

function read(
  zip: Buffer,
  limits: Partial<FeedLimits> = {},
  told: FeedProgress[] = [],
): Promise<FeedReadAnswer> {
  const file = path.join(folder, 'feed.zip');
  writeFileSync(file, zip);
  return readFeed(
    {
      path: file,
      routeTypes: railRouteTypes,
      limits: { ...feedLimits, ...limits },
      shortestTurnSeconds: 520,
    },
    (progress) => told.push(progress),
  );
}

const problemsOf = (answer: FeedReadAnswer): string[] =>
  answer.problems.map(({ severity, file, code }) => `${severity} ${file ?? ''} ${code}`);

/** Replaces bytes wherever they stand: names in a zip stand at each file and in its table of contents. */
function withBytes(zip: Buffer, from: string, to: string): Buffer {
  return Buffer.from(zip.toString('latin1').replaceAll(from, to), 'latin1');
}

describe('reading a zip', () => {
  test('tells how far it is, never backwards', async () => {
    const told: FeedProgress[] = [];
    const answer = await read(zipped(aFeed()), {}, told);
    expect(answer.ok).toBe(true);
    const shares = told.map(({ share }) => share);
    expect(shares).toEqual([...shares].sort((one, other) => one - other));
    expect(told[0]).toEqual({ stage: 'Reading agency.txt', share: 0 });
    expect(told.at(-1)?.stage).toBe('Summing up all days');
  });

  test('stops at the limit of rows', async () => {
    expect(problemsOf(await read(zipped(aFeed()), { rows: 13 }))).toEqual(['refused trips.txt limit.rows']);
  });

  test('stops at the limit of bytes, by what the zip says of itself', async () => {
    expect(problemsOf(await read(zipped(aFeed()), { unpackedBytes: 300 }))).toHaveLength(1);
    expect(problemsOf(await read(zipped(aFeed()), { unpackedBytes: 300 }))[0]).toMatch(
      /^refused \S+ limit.size$/,
    );
  });

  test('stops when more bytes come than the zip says', async () => {
    const text = aFeed()['stop_times.txt'] ?? '';
    const zip = zipped(aFeed());
    const lying = Buffer.from(zip);
    // An entry of the table of contents: the size unpacked stands 24 bytes into it, its name comes after 46.
    const [entry = 0] = [...Array(zip.length - 46).keys()].filter(
      (place) =>
        zip.readUInt32BE(place) === 0x504b0102 &&
        zip
          .subarray(place + 46)
          .toString('latin1')
          .startsWith('stop_times.txt'),
    );
    expect(entry).toBeGreaterThan(0);
    lying.writeUInt32LE(text.length - 100, entry + 24);
    expect(problemsOf(await read(lying))).toEqual(['refused stop_times.txt zip.damaged']);
  });

  test('refuses a zip that holds a file twice', async () => {
    const zip = withBytes(zipped({ ...aFeed(), 'xxxxxx.txt': 'x' }), 'xxxxxx.txt', 'agency.txt');
    expect(problemsOf(await read(zip))).toEqual(['refused agency.txt zip.file_twice']);
  });

  test('refuses a file that is locked with a password', async () => {
    const zip = zipped(aFeed());
    const entry = zip.indexOf(Buffer.from('504b0102', 'hex'));
    const locked = Buffer.from(zip);
    locked.writeUInt16LE(1, entry + 8);
    expect(problemsOf(await read(locked))[0]).toMatch(/^refused \S+ zip\.(locked|damaged)$/);
  });

  test('looks past files it does not know, whatever they hold', async () => {
    const zip = zipped({
      ...aFeed(),
      'shapes.txt': '"',
      '__MACOSX/._trips.txt': 'x',
      'notes/readme.txt': '',
    });
    expect(await read(zip)).toMatchObject({ ok: true, problems: [] });
  });
});
