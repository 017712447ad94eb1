import { aFeed, seededRandom, type FeedTexts } from '@stubpost/shared/testing';
import { zipOf } from './feed-zips';

/** A zip that somebody's machine, line or hand has spoiled, and how. */
export interface BrokenZip {
  title: string;
  bytes: Buffer;
}

type Random = () => number;
const below = (random: Random, limit: number): number => Math.floor(random() * limit);

/** Ways to spoil the bytes of a zip. */
const byteFaults: Record<string, (zip: Buffer, random: Random) => Buffer> = {
  'cut off': (zip, random) => zip.subarray(0, below(random, zip.length)),
  'one bit': (zip, random) => {
    const at = below(random, zip.length);
    return Buffer.concat([
      zip.subarray(0, at),
      Buffer.from([(zip[at] ?? 0) ^ (1 << below(random, 8))]),
      zip.subarray(at + 1),
    ]);
  },
  noise: (zip, random) => {
    const at = below(random, zip.length);
    const noise = Buffer.from(Array.from({ length: 1 + below(random, 40) }, () => below(random, 256)));
    return Buffer.concat([zip.subarray(0, at), noise, zip.subarray(at + noise.length)]);
  },
  'a piece twice': (zip, random) => {
    const at = below(random, zip.length);
    return Buffer.concat([zip.subarray(0, at), zip.subarray(Math.max(0, at - below(random, 200)))]);
  },
  'another checksum': (zip, random) => {
    // Each entry of the table of contents begins with these four bytes; its checksum follows after twelve more.
    const entries = [...zip.keys()].filter(
      (at) => zip.readUIntBE(at, Math.min(4, zip.length - at)) === 0x504b0102,
    );
    const spoiled = Buffer.from(zip);
    spoiled.writeUInt32LE(below(random, 0xffffffff), (entries[below(random, entries.length)] ?? 0) + 16);
    return spoiled;
  },
};

/** Ways to spoil the tables inside. */
const textFaults: Record<string, (texts: FeedTexts, random: Random) => FeedTexts> = {
  'a file left out': (texts, random) => {
    const names = Object.keys(texts);
    const { [names[below(random, names.length)] ?? '']: _, ...rest } = texts;
    return rest;
  },
  'a cell with something else': (texts, random) => {
    const names = Object.keys(texts);
    const name = names[below(random, names.length)] ?? '';
    const odd = [
      '',
      '"',
      '25:61:00',
      '\u0000',
      '-1',
      '99999999999',
      '20269999',
      'é',
      ',,,',
      '\n',
      "'; DROP TABLE turn;",
    ];
    const cells = (texts[name] ?? '').split(/([,\n])/);
    cells[below(random, cells.length)] = odd[below(random, odd.length)] ?? '';
    return { ...texts, [name]: cells.join('') };
  },
  'lines in disorder': (texts, random) =>
    Object.fromEntries(
      Object.entries(texts).map(([name, text]) => [
        name,
        text
          .split('\n')
          .sort(() => random() - 0.5)
          .join('\n'),
      ]),
    ),
};

/** So many broken zips, the same ones for the same seed. */
export function brokenZips(count: number, seed: number): BrokenZip[] {
  const random = seededRandom(seed);
  const whole = zipOf(aFeed());
  const faults: [string, () => Buffer][] = [
    ...Object.entries(byteFaults).map(
      ([title, spoil]) => [title, () => spoil(whole, random)] as [string, () => Buffer],
    ),
    ...Object.entries(textFaults).map(
      ([title, spoil]) => [title, () => zipOf(spoil(aFeed(), random))] as [string, () => Buffer],
    ),
  ];
  return Array.from({ length: count }, (_, index) => {
    const [title, make] = faults[index % faults.length] ?? ['whole', () => whole];
    return { title: `${title} (seed ${seed}, no. ${index})`, bytes: make() };
  });
}
