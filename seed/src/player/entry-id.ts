import { createHash } from 'node:crypto';

/** Namespace of the demo's ids: a random UUID chosen once. */
const namespace = Buffer.from('5b1f0c6e9a8d4e2b8f3a7c52d9e04b16', 'hex');

/**
 * A name-based UUID (version 5, RFC 9562 section 5.5): the same act of the same turn always has the same id, so that a
 * story that is told again after a restart adds nothing.
 */
export function entryIdOf(name: string): string {
  const bytes = createHash('sha1').update(namespace).update(name).digest().subarray(0, 16);
  bytes[6] = ((bytes[6] ?? 0) & 0x0f) | 0x50;
  bytes[8] = ((bytes[8] ?? 0) & 0x3f) | 0x80;
  const hex = bytes.toString('hex');
  return [hex.slice(0, 8), hex.slice(8, 12), hex.slice(12, 16), hex.slice(16, 20), hex.slice(20)].join('-');
}
