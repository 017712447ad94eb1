import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { judgePassword, type PasswordVerdict } from './password';

describe('judgePassword', () => {
  test.each<[string, PasswordVerdict]>([
    ['seven77', 'password.too_short'],
    ['🚂🚂🚂🚂🚋🚋🚋', 'password.too_short'],
    ['a'.repeat(129), 'password.too_long'],
    ['password', 'password.common'],
    ['Password2024!', 'password.common'],
    ['P@ssw0rd', 'password.common'],
    ['!!welcome!!99', 'password.common'],
    ['passwordpassword', 'password.common'],
    ['12345678', 'password.common'],
    ['87654321', 'password.common'],
    ['abcdefghij', 'password.common'],
    ['aaaaaaaaaa', 'password.common'],
    ['abcabcabcabc', 'password.common'],
    ['567890123', 'password.common'],
    ['summer2026', 'password.common'],
    ['wren.hollis', 'password.common'],
    ['Wren Hollis 1', 'password.common'],
    ['seven tall lanterns', 'good'],
    ['x7!kQ-pm', 'good'],
    ['trains leave at noon', 'good'],
    ['ß'.repeat(4) + 'æøåñ', 'good'],
  ])('%s: %s', (password, verdict) => {
    expect(judgePassword(password, ['wren@example.org', 'Wren Hollis'])).toBe(verdict);
  });

  test('a common word stays common with digits behind and a capital in front', () => {
    fc.assert(
      fc.property(
        fc.constantFrom('password', 'football', 'sunshine'),
        fc.integer({ min: 0, max: 99_999 }),
        (word, n) => {
          const dressed = `${word.charAt(0).toUpperCase()}${word.slice(1)}${n}`;
          expect(judgePassword(dressed, [])).toBe('password.common');
        },
      ),
    );
  });

  test('never throws, whatever is typed', () => {
    fc.assert(
      fc.property(fc.string({ unit: 'grapheme' }), fc.string(), (password, personal) => {
        expect(judgePassword(password, [personal])).toMatch(/^good$|^password\./);
      }),
    );
  });
});
