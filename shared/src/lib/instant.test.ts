import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { addSeconds, formatInstant, parseInstant, secondsBetween } from './instant';

const evening = Date.UTC(2026, 2, 3, 22, 20, 45);

describe('reading an instant', () => {
  it.each([
    ['2026-03-03T22:20:45.000Z', evening],
    ['2026-03-03T22:20:45Z', evening],
    ['2026-03-03T17:20:45-05:00', evening],
    ['2026-03-04T03:50:45+05:30', evening],
    ['2026-03-03T22:20Z', evening - 45_000],
    ['2024-02-29T00:00:00Z', Date.UTC(2024, 1, 29)],
  ])('%s is read', (text, instant) => {
    expect(parseInstant(text)).toBe(instant);
  });

  it.each([
    '2026-03-03T22:20:45',
    '2026-03-03',
    '2026-02-29T00:00:00Z',
    '2026-02-30T00:00:00Z',
    '2026-04-31T00:00:00Z',
    '2026-13-01T00:00:00Z',
    '2026-03-03T25:00:00Z',
    '2026-03-03T22:60:00Z',
    '2026-03-03T22:20:45+99:00',
    ' 2026-03-03T22:20:45Z',
    'yesterday',
    '',
  ])('"%s" is none', (text) => {
    expect(parseInstant(text)).toBeNull();
  });

  it('gives back what was written, to the millisecond', () => {
    fc.assert(
      fc.property(fc.integer({ min: 0, max: Date.UTC(2100, 0, 1) }), (instant) => {
        expect(parseInstant(formatInstant(instant))).toBe(instant);
      }),
      { seed: 8601, numRuns: 300 },
    );
  });
});

describe('seconds', () => {
  it('are added and counted forwards and backwards', () => {
    expect(addSeconds(evening, 90)).toBe(evening + 90_000);
    expect(addSeconds(evening, -0.5)).toBe(evening - 500);
    expect(secondsBetween(evening, evening + 1500)).toBe(1.5);
    expect(secondsBetween(evening, evening - 1000)).toBe(-1);
  });
});
