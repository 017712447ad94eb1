/**
 * What an upload may hold at most. All our choice: the largest public feeds known to us stay well below, and a machine
 * that runs the service can take one import of this size without harm.
 */
export interface FeedLimits {
  /** Bytes of the zip. */
  zipBytes: number;
  /** Files in the zip. */
  entries: number;
  /** Bytes of all read files together, unpacked. */
  unpackedBytes: number;
  /** How many times larger than packed a file may become. Tables of a railroad come to 10 or 20. */
  ratio: number;
  /** Files up to this size may have any ratio: small ones pack well and do no harm. */
  ratioFreeBytes: number;
  /** Rows of all read files together. */
  rows: number;
  /** Characters of one row. */
  rowCharacters: number;
}

const mebibyte = 1024 * 1024;

export const feedLimits: FeedLimits = {
  zipBytes: 128 * mebibyte,
  entries: 500,
  unpackedBytes: 1024 * mebibyte,
  ratio: 200,
  ratioFreeBytes: 8 * mebibyte,
  rows: 6_000_000,
  rowCharacters: 64 * 1024,
};

/** Size in words: `128 MB`. */
export function megabytes(bytes: number): string {
  return `${Math.round(bytes / mebibyte)} MB`;
}
