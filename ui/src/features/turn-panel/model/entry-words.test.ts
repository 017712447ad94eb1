import type { WireEntry } from '@stubpost/shared';
import { entryWords, knownWords } from './entry-words';

const labels = new Map([
  ['handbrake-set', 'Handbrake set'],
  ['brakes-released', 'Air charged'],
]);
const entry = (fields: Partial<WireEntry> & Record<string, unknown>): WireEntry => ({
  sequence: 48211,
  hash: 'h',
  id: 'e-1',
  kind: 'note',
  observedAt: '2026-03-03T22:20:45.000Z',
  receivedAt: '2026-03-03T22:20:46.000Z',
  source: 'by-hand',
  by: { id: 'p', name: 'M. Tolland' },
  ...fields,
});
const words = (fields: Parameters<typeof entry>[0]) => entryWords(entry(fields), labels, 'America/New_York');

describe('an entry in words', () => {
  it.each([
    [
      { kind: 'step-done', step: 'handbrake-set', reading: { count: 2, cars: ['2235', '4107'] } },
      'Handbrake set, 2: 2235, 4107',
    ],
    [{ kind: 'step-done', step: 'brakes-released', reading: { brakePipePsi: 110 } }, 'Air charged, 110 psi'],
    [{ kind: 'step-done', step: 'lost' }, 'lost'],
    [
      { kind: 'cannot-do', step: 'handbrake-set', reason: 'wheel frozen' },
      'Handbrake set cannot be done: wheel frozen',
    ],
    [{ kind: 'expected-arrival', expectedAt: '2026-03-03T22:44:00.000Z' }, 'Expected 17:44'],
    [{ kind: 'hold', until: '2026-03-03T22:40:00.000Z', reason: 'connection' }, 'Held to 17:40: connection'],
    [{ kind: 'crew', person: { id: 'p', name: 'Q. Quist' }, as: 'engineer' }, 'Q. Quist as engineer'],
    [
      { kind: 'relief', out: { name: 'A' }, in: { name: 'B' }, as: 'engineer', faceToFace: true },
      'A relieved as engineer by B, face to face',
    ],
    [
      { kind: 'relief', out: { name: 'A' }, in: null, as: 'conductor' },
      'A relieved as conductor, nobody took over',
    ],
    [{ kind: 'annulled', reason: 'no crew' }, 'Annulled: no crew'],
    [{ kind: 'note', note: 'door 3 slow' }, 'Note: door 3 slow'],
  ])('%j', (fields, expected) => {
    expect(words(fields)).toBe(expected);
  });

  it('says how it is known, who said it and who wrote it', () => {
    expect(
      knownWords(entry({ source: 'by-radio', saidBy: 'P. Varga', by: { id: 'd', name: 'R. Hallam' } })),
    ).toBe('by radio, P. Varga (R. Hallam)');
    expect(knownWords(entry({ source: 'by-feed', by: null }))).toBe('by feed');
    expect(knownWords(entry({}))).toBe('by hand, M. Tolland');
  });
});
