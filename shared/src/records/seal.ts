import { formatInstant, type Instant } from '../lib/instant';
import { canonicalJson } from './canonical-json';

/** What the first entry of a log is chained to: 64 zeros. */
export const noPreviousHash = '0'.repeat(64);

/** An entry with its place in the log. `body` is every field of the entry but the ones that stand here. */
export interface SealableEntry {
  /** Hash of the entry before, lower-case hexadecimal; `noPreviousHash` for the first. */
  previousHash: string;
  /** Running number in the log, from 1. */
  sequence: number;
  id: string;
  receivedAt: Instant;
  body: unknown;
}

/** What seals an entry. Hashes are SHA-256 in lower-case hexadecimal. */
export interface Seal {
  /** The body in its canonical form: the very text that was hashed. */
  body: string;
  bodyHash: string;
  /** What the next entry is chained to. */
  hash: string;
}

/**
 * Seals an entry: the body hash is SHA-256 over the RFC 8785 form of the body, the hash SHA-256 over the RFC 8785 form
 * of `{ bodyHash, id, previousHash, receivedAt, sequence }` with the receipt as ISO 8601 text in UTC. So a body can be
 * taken out later, and its envelope and the chain still check. `sha256` hashes the UTF-8 bytes of a text.
 */
export function sealEntry(entry: SealableEntry, sha256: (text: string) => string): Seal {
  const body = canonicalJson(entry.body);
  const bodyHash = sha256(body);
  const { previousHash, sequence, id, receivedAt } = entry;
  const envelope = { previousHash, sequence, id, receivedAt: formatInstant(receivedAt), bodyHash };
  return { body, bodyHash, hash: hashEnvelope(envelope, sha256) };
}

/** What stands round the body of an entry, as it is hashed. */
export interface Envelope {
  previousHash: string;
  sequence: number;
  id: string;
  /** ISO 8601 in UTC with milliseconds. */
  receivedAt: string;
  bodyHash: string;
}

/** The hash of an entry: SHA-256 over the RFC 8785 form of its envelope; members beside the five do not count. */
export function hashEnvelope(envelope: Envelope, sha256: (text: string) => string): string {
  const { previousHash, sequence, id, receivedAt, bodyHash } = envelope;
  return sha256(canonicalJson({ previousHash, sequence, id, receivedAt, bodyHash }));
}
