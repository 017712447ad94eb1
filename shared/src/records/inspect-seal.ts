import { canonicalJson } from './canonical-json';
import type { LogLine } from './log-line';
import type { ChangedPart } from './log-verdict';
import { hashEnvelope } from './seal';

/** What the neighbours of an entry say about it; undefined where they say nothing. */
export interface DueLink {
  sequence: number | undefined;
  /** Hash of the entry before. */
  hash: string | undefined;
}

/** What it takes to hold an entry against its seal. */
export interface SealQuestion {
  sha256: (text: string) => string;
  due: DueLink;
}

/** Whether an entry fits its own seal. */
export interface SealFinding {
  /** The part that does not fit; null when all does. */
  part: ChangedPart | null;
  /** The hash that its envelope and body really have. */
  computedHash: string;
}

/**
 * Holds an entry against its own seal and says which part was changed, as far as that can be told: the one whose
 * former value, worked out anew or known from the neighbours, makes the seal fit again.
 */
export function inspectSeal(entry: LogLine, question: SealQuestion): SealFinding {
  const { sha256 } = question;
  const bodyHash = entry.body === null ? entry.bodyHash : sha256(canonicalJson(entry.body));
  const computedHash = hashEnvelope({ ...entry, bodyHash }, sha256);
  if (bodyHash === entry.bodyHash) {
    const part = computedHash === entry.hash ? null : changedEnvelope(entry, question);
    return { part, computedHash };
  }
  if (hashEnvelope(entry, sha256) === entry.hash) return { part: 'body', computedHash };
  return { part: computedHash === entry.hash ? 'bodyHash' : 'several', computedHash };
}

function changedEnvelope(entry: LogLine, question: SealQuestion): ChangedPart {
  const { sha256, due } = question;
  const fits = (changed: Partial<LogLine>): boolean =>
    hashEnvelope({ ...entry, ...changed }, sha256) === entry.hash;
  if (due.sequence !== undefined && fits({ sequence: due.sequence })) return 'sequence';
  if (due.hash !== undefined && fits({ previousHash: due.hash })) return 'previousHash';
  return 'envelope';
}
