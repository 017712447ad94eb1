import { Transform, type Readable } from 'node:stream';
import { crc32 } from 'node:zlib';
import { FEED_FILES, isFeedFile, type FeedFile } from '@stubpost/shared';
import { openPromise, type Entry, type ZipFile } from 'yauzl';
import { type FeedLimits, megabytes } from './feed-limits';
import { FeedRefused } from './feed-refused';

/** Whether a file is a zip, as far as its table of contents can be found. Cheap: only the end of the file is read. */
export async function isZip(path: string): Promise<boolean> {
  try {
    (await openPromise(path, { lazyEntries: true, autoClose: false })).close();
    return true;
  } catch {
    return false;
  }
}

/** The files of a feed inside its zip, opened one after the other. Nothing is ever written to disk. */
export class FeedZip {
  private constructor(
    private readonly zip: ZipFile,
    private readonly entries: ReadonlyMap<FeedFile, Entry>,
    private readonly limits: FeedLimits,
  ) {}

  /** Opens a zip and finds the files in it, at its top or all in one folder. */
  static async open(path: string, limits: FeedLimits): Promise<FeedZip> {
    const zip = await openPromise(path, { lazyEntries: true, autoClose: false }).catch(damaged);
    try {
      const entries = await contentsOf(zip, limits);
      return new FeedZip(zip, entries, limits);
    } catch (error) {
      zip.close();
      throw error;
    }
  }

  /** Files that are there, in the order in which they must be read. */
  get files(): FeedFile[] {
    return FEED_FILES.filter((file) => this.entries.has(file));
  }

  /** Bytes of all of them, unpacked, as the zip says. */
  get unpackedBytes(): number {
    return [...this.entries.values()].reduce((sum, entry) => sum + entry.uncompressedSize, 0);
  }

  /**
   * The bytes of a file, and what checks them on their way against the size and the checksum that the zip gives.
   * `onBytes` is told how many have come.
   */
  async read(
    file: FeedFile,
    onBytes: (bytes: number) => void,
  ): Promise<{ source: Readable; check: Transform }> {
    const entry = this.entries.get(file);
    if (entry === undefined) throw new Error(`the zip holds no ${file}`);
    if (entry.isEncrypted()) {
      throw new FeedRefused({ file, code: 'zip.locked', message: `${file} is locked with a password.` });
    }
    const source = await this.zip.openReadStreamPromise(entry).catch(damaged);
    return { source, check: this.checking(file, entry, onBytes) };
  }

  close(): void {
    this.zip.close();
  }

  private checking(file: FeedFile, entry: Entry, onBytes: (bytes: number) => void): Transform {
    const { limits } = this;
    let bytes = 0;
    let checksum = 0;
    return new Transform({
      transform(chunk: Buffer, _encoding, done) {
        bytes += chunk.length;
        onBytes(chunk.length);
        checksum = crc32(chunk, checksum);
        if (bytes > limits.unpackedBytes) {
          const message = `${file} is larger than ${megabytes(limits.unpackedBytes)} when unpacked.`;
          done(new FeedRefused({ file, code: 'limit.size', message }));
          return;
        }
        done(null, chunk);
      },
      flush(done) {
        if (bytes === entry.uncompressedSize && checksum === entry.crc32) done();
        else
          done(new FeedRefused({ file, code: 'zip.damaged', message: `${file} is damaged inside the zip.` }));
      },
    });
  }
}

function damaged(error: unknown): never {
  if (error instanceof FeedRefused) throw error;
  const why = error instanceof Error ? ` (${error.message})` : '';
  throw new FeedRefused({ file: null, code: 'zip.damaged', message: `The zip is damaged${why}.` });
}

async function contentsOf(zip: ZipFile, limits: FeedLimits): Promise<Map<FeedFile, Entry>> {
  if (zip.entryCount > limits.entries) {
    const message = `The zip holds ${zip.entryCount} files. At most ${limits.entries} are looked at.`;
    throw new FeedRefused({ file: null, code: 'limit.files', message });
  }
  const found: { folder: string; file: FeedFile; entry: Entry }[] = [];
  try {
    for await (const entry of zip.eachEntry()) {
      const cut = entry.fileName.lastIndexOf('/') + 1;
      const file = entry.fileName.slice(cut);
      if (isFeedFile(file)) found.push({ folder: entry.fileName.slice(0, cut), file, entry });
    }
  } catch (error) {
    damaged(error);
  }
  const folder = found.some((item) => item.folder === '') ? '' : found[0]?.folder;
  const entries = new Map<FeedFile, Entry>();
  for (const item of found.filter((other) => other.folder === folder)) {
    if (entries.has(item.file)) {
      const message = `The zip holds ${item.file} twice.`;
      throw new FeedRefused({ file: item.file, code: 'zip.file_twice', message });
    }
    entries.set(item.file, item.entry);
  }
  refuseTooLarge(entries, limits);
  return entries;
}

/** By what the zip says of itself; the bytes that really come are counted again while they are read. */
function refuseTooLarge(entries: ReadonlyMap<FeedFile, Entry>, limits: FeedLimits): void {
  let total = 0;
  for (const [file, { compressedSize, uncompressedSize }] of entries) {
    total += uncompressedSize;
    if (uncompressedSize > limits.ratioFreeBytes && uncompressedSize > compressedSize * limits.ratio) {
      const message = `${file} becomes more than ${limits.ratio} times as large when unpacked. No timetable does.`;
      throw new FeedRefused({ file, code: 'limit.ratio', message });
    }
    if (total > limits.unpackedBytes) {
      const message = `The files are larger than ${megabytes(limits.unpackedBytes)} when unpacked.`;
      throw new FeedRefused({ file, code: 'limit.size', message });
    }
  }
}
