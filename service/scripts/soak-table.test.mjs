import assert from 'node:assert/strict';
import { test } from 'node:test';
import { formatTable, hasHeld, mergeFigures, rowsOf } from './soak-table.mjs';

const figures = { part: 'server', rounds: 200, acknowledged: 12_345, lost: 0, doubled: 0, chain: 'whole' };
const part = { name: 'server', rounds: 200, code: 0, milliseconds: 61_500, figures: [figures] };

test('a part that held shows its figures in columns', () => {
  assert.equal(
    formatTable(rowsOf(part)),
    'part    rounds  with receipt  lost  doubled  chain  took    result\n' +
      'server     200        12,345     0        0  whole  61.5 s  held',
  );
});

test('figures of the same part are added up, and a chain once broken stays so', () => {
  const other = { ...figures, part: 'store' };
  const broken = { ...figures, rounds: 1, acknowledged: 5, chain: 'broken' };
  assert.deepEqual(mergeFigures([figures, other, broken, { ...figures, rounds: 2, acknowledged: 10 }]), [
    { ...figures, rounds: 203, acknowledged: 12_360, chain: 'broken' },
    other,
  ]);
});

test('a part without figures shows what was asked for', () => {
  assert.deepEqual(rowsOf({ ...part, name: 'phone', rounds: 20, figures: [] }), [
    ['phone', '20', '-', '-', '-', '-', '61.5 s', 'held'],
  ]);
});

test('a lost entry, a doubled one, a broken chain or a runner that failed is a failure', () => {
  assert.equal(hasHeld([part]), true);
  for (const bad of [{ lost: 1 }, { doubled: 1 }, { chain: 'broken' }]) {
    const broken = { ...part, figures: [{ ...figures, ...bad }] };
    assert.equal(hasHeld([part, broken]), false);
    assert.equal(rowsOf(broken)[0].at(-1), 'FAILED');
  }
  assert.equal(hasHeld([{ ...part, code: 1 }]), false);
  assert.equal(rowsOf({ ...part, code: 1 })[0].at(-1), 'FAILED');
});
