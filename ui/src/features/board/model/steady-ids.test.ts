import { heldIds } from './steady-ids';

describe('a list that is held', () => {
  it('keeps its order and counts what came and went', () => {
    expect(heldIds(['a', 'b', 'c'], ['b', 'c', 'd', 'e'])).toEqual({ ids: ['a', 'b', 'c'], waiting: 3 });
  });

  it('waits for nothing when nothing changed', () => {
    expect(heldIds(['a', 'b'], ['a', 'b'])).toEqual({ ids: ['a', 'b'], waiting: 0 });
  });

  it('counts another order as one change', () => {
    expect(heldIds(['a', 'b', 'c'], ['c', 'a', 'b']).waiting).toBe(1);
  });
});
