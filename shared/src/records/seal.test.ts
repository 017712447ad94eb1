import { createHash } from 'node:crypto';
import { describe, expect, it } from 'vitest';
import { canonicalJson } from './canonical-json';
import { noPreviousHash, sealEntry, type SealableEntry } from './seal';

const sha256 = (text: string): string => createHash('sha256').update(text, 'utf8').digest('hex');

const first: SealableEntry = {
  previousHash: noPreviousHash,
  sequence: 1,
  id: '7a1d2c8e-0000-4000-8000-000000000001',
  receivedAt: Date.UTC(2026, 2, 3, 22, 20, 45),
  body: { kind: 'step-done', step: 'handbrake-set', observedAt: '2026-03-03T22:20:41.000Z', by: null },
};

describe('the seal of an entry', () => {
  it('hashes the canonical body, then the envelope that names that hash', () => {
    const seal = sealEntry(first, sha256);
    expect(seal.body).toBe(
      '{"by":null,"kind":"step-done","observedAt":"2026-03-03T22:20:41.000Z","step":"handbrake-set"}',
    );
    expect(seal.bodyHash).toBe(sha256(seal.body));
    expect(seal.hash).toBe(
      sha256(
        `{"bodyHash":"${seal.bodyHash}","id":"${first.id}","previousHash":"${noPreviousHash}",` +
          '"receivedAt":"2026-03-03T22:20:45.000Z","sequence":1}',
      ),
    );
  });

  it('does not depend on the order in which the body was put together', () => {
    const reversed = Object.fromEntries(Object.entries(first.body as object).reverse());
    expect(sealEntry({ ...first, body: reversed }, sha256)).toEqual(sealEntry(first, sha256));
  });

  it('changes with every field of the envelope and with the body', () => {
    const hashes = [
      first,
      { ...first, previousHash: sha256('another') },
      { ...first, sequence: 2 },
      { ...first, id: '7a1d2c8e-0000-4000-8000-000000000002' },
      { ...first, receivedAt: first.receivedAt + 1 },
      { ...first, body: { kind: 'note' } },
    ].map((entry) => sealEntry(entry, sha256).hash);
    expect(new Set(hashes).size).toBe(hashes.length);
  });

  it('still checks when the body is gone and only its hash is left', () => {
    const { bodyHash, hash } = sealEntry(first, sha256);
    const { previousHash, sequence, id } = first;
    const envelope = { previousHash, sequence, id, receivedAt: '2026-03-03T22:20:45.000Z', bodyHash };
    expect(sha256(canonicalJson(envelope))).toBe(hash);
  });
});
