import { findClashes, packRows } from './pack-rows';

const occupant = (id: string, from: number, to: number) => ({ id, from, to });

describe('packing into rows', () => {
  it('takes one row when nothing overlaps, also end to end', () => {
    const rows = packRows([occupant('b', 10, 20), occupant('a', 0, 10), occupant('c', 20, 30)]);
    expect(rows.map((row) => row.map((one) => one.id))).toEqual([['a', 'b', 'c']]);
  });

  it('takes as many rows as stand there at the busiest moment, and no more', () => {
    const rows = packRows([
      occupant('a', 0, 30),
      occupant('b', 10, 20),
      occupant('c', 15, 40),
      occupant('d', 20, 25),
      occupant('e', 40, 50),
    ]);
    expect(rows.map((row) => row.map((one) => one.id))).toEqual([['a', 'e'], ['b', 'd'], ['c']]);
  });

  it('gives the same rows whatever order the turns come in', () => {
    const turns = [occupant('a', 0, 9), occupant('b', 0, 9), occupant('c', 5, 12), occupant('d', 9, 11)];
    const once = packRows(turns);
    expect(packRows([...turns].reverse())).toEqual(once);
  });
});

describe('clashes', () => {
  it('names both and the time they share', () => {
    expect(
      findClashes([occupant('late', 0, 12), occupant('next', 10, 30), occupant('clear', 30, 40)]),
    ).toEqual([{ first: 'late', second: 'next', from: 10, to: 12 }]);
  });

  it('finds every pair when three meet', () => {
    const pairs = findClashes([occupant('a', 0, 10), occupant('b', 2, 8), occupant('c', 4, 6)]);
    expect(pairs.map((pair) => pair.first + pair.second)).toEqual(['ab', 'ac', 'bc']);
  });

  it('is none when one leaves as the next comes in', () => {
    expect(findClashes([occupant('a', 0, 10), occupant('b', 10, 20)])).toEqual([]);
  });
});
