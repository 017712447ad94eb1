import { formatLogLine } from '../records/log-line';
import type { LogHead } from '../records/log-verdict';
import { noPreviousHash, sealEntry } from '../records/seal';
import { addSeconds } from '../lib/instant';
import { fixedArrival } from './builders';

/** A sealed log for tests: its lines without their ends, and the head after each of them. */
export interface SealedLog {
  lines: string[];
  heads: LogHead[];
}

/** What a test log is made of. */
export interface SealedLogParts {
  bodies: readonly Record<string, unknown>[];
  sha256: (text: string) => string;
  /** What the first entry follows; the beginning of the log when absent. */
  after?: LogHead;
}

/** Seals bodies one after another, received ten seconds apart. */
export function aSealedLog({ bodies, sha256, after }: SealedLogParts): SealedLog {
  const log: SealedLog = { lines: [], heads: [] };
  let previousHash = after?.hash ?? noPreviousHash;
  for (const [index, body] of bodies.entries()) {
    const sequence = (after?.sequence ?? 0) + index + 1;
    const id = `00000000-0000-4000-8000-${String(sequence).padStart(12, '0')}`;
    const envelope = { previousHash, sequence, id, receivedAt: addSeconds(fixedArrival, 10 * sequence) };
    const seal = sealEntry({ ...envelope, body }, sha256);
    log.lines.push(formatLogLine({ ...envelope, ...seal }));
    log.heads.push({ sequence, hash: seal.hash });
    previousHash = seal.hash;
  }
  return log;
}
