import { listCommand, movedIndex } from './list-keys';

const press = (key: string, held: Partial<{ ctrlKey: boolean; altKey: boolean; metaKey: boolean }> = {}) => ({
  key,
  ctrlKey: false,
  altKey: false,
  metaKey: false,
  ...held,
});

describe('keys of the list', () => {
  it.each([
    ['ArrowDown', { do: 'move', by: 1 }],
    ['End', { do: 'move', by: 'last' }],
    ['ArrowRight', { do: 'step', by: 1 }],
    ['Enter', { do: 'act', act: 'open' }],
    [' ', { do: 'act', act: 'tick' }],
    ['R', { do: 'act', act: 'relay' }],
    ['r', { do: 'act', act: 'relay' }],
    ['w', { do: 'act', act: 'set' }],
    ['[', { do: 'window', to: 'earlier' }],
    ['+', { do: 'window', to: 'shorter' }],
    ['0', { do: 'window', to: 'now' }],
  ])('%s', (key, command) => {
    expect(listCommand(press(key), true)).toEqual(command);
  });

  it('of one character are off when the person switched them off; the others still work', () => {
    expect(listCommand(press('r'), false)).toBeNull();
    expect(listCommand(press('0'), false)).toBeNull();
    expect(listCommand(press('ArrowDown'), false)).toEqual({ do: 'move', by: 1 });
  });

  it('belong to the browser with Ctrl, Alt or the system key', () => {
    expect(listCommand(press('r', { ctrlKey: true }), true)).toBeNull();
    expect(listCommand(press('ArrowLeft', { altKey: true }), true)).toBeNull();
    expect(listCommand(press('n', { metaKey: true }), true)).toBeNull();
  });

  it('stay inside the list', () => {
    expect([
      movedIndex(0, -1, 5),
      movedIndex(3, 10, 5),
      movedIndex(3, 'first', 5),
      movedIndex(0, 'last', 5),
    ]).toEqual([0, 4, 0, 4]);
  });
});
