import { describe, expect, test } from 'vitest';
import { listCommand } from '../features/board/model/list-keys';
import { TURN_LIST_KEYS } from '../features/help/model/key-sheet';

const NAMES: Record<string, string> = {
  '↑': 'ArrowUp',
  '↓': 'ArrowDown',
  '←': 'ArrowLeft',
  '→': 'ArrowRight',
  PgUp: 'PageUp',
  PgDn: 'PageDown',
  Space: ' ',
};
const press = (key: string) => ({ key: NAMES[key] ?? key, ctrlKey: false, altKey: false, metaKey: false });
const lines = TURN_LIST_KEYS.lines.flatMap(({ keys, isLetter }) =>
  keys.map((key) => ({ key, isLetter: isLetter === true })),
);

describe('the key sheet of the turn list', () => {
  test.each(lines)(
    '$key works, and can be switched off when it is a single sign: $isLetter',
    ({ key, isLetter }) => {
      expect(listCommand(press(key), true)).not.toBeNull();
      expect(listCommand(press(key), false) === null).toBe(isLetter);
    },
  );

  test('leaves no key of the list out', () => {
    const printable = Array.from({ length: 95 }, (_, at) => String.fromCharCode(32 + at));
    const named = [
      'ArrowUp',
      'ArrowDown',
      'ArrowLeft',
      'ArrowRight',
      'PageUp',
      'PageDown',
      'Home',
      'End',
      'Enter',
    ];
    const listed = new Set(lines.map(({ key }) => press(key).key.toLowerCase()));
    const working = [...printable, ...named].filter((key) => listCommand(press(key), true) !== null);
    const missing = working.filter((key) => !listed.has(key.toLowerCase()));
    // "=" is the plus key without Shift.
    expect(missing).toEqual(['=']);
  });
});
