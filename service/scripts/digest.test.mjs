import assert from 'node:assert/strict';
import { mkdirSync, mkdtempSync, renameSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterEach, beforeEach, test } from 'node:test';
import { digestOf } from './digest.mjs';
import { Stamp } from './stamp.mjs';

let root;
const write = (path, text) => writeFileSync(join(root, path), text);
const digest = () => digestOf(root, ['src', 'lock.json']);

beforeEach(() => {
  root = mkdtempSync(join(tmpdir(), 'stubpost-digest-'));
  mkdirSync(join(root, 'src/deep'), { recursive: true });
  write('src/deep/a.ts', 'one');
  write('src/b.ts', 'two');
});
afterEach(() => rmSync(root, { recursive: true }));

test('the same files give the same digest, in whatever order they are named', () => {
  assert.equal(digestOf(root, ['src/b.ts', 'src/deep']), digestOf(root, ['src/deep', 'src', 'src/b.ts']));
});

const changes = {
  'a changed file': () => write('src/deep/a.ts', 'One'),
  'a new file': () => write('src/deep/c.ts', ''),
  'a renamed file': () => renameSync(join(root, 'src/b.ts'), join(root, 'src/c.ts')),
  'a removed file': () => rmSync(join(root, 'src/b.ts')),
  'a named file that was not there before': () => write('lock.json', '{}'),
  'text that moves from one file to the next': () => {
    write('src/b.ts', 'twoo');
    write('src/deep/a.ts', 'ne');
  },
};

for (const [name, change] of Object.entries(changes)) {
  test(`${name} gives another digest`, () => {
    const before = digest();
    change();
    assert.notEqual(digest(), before);
  });
}

test('a changed test gives the same digest, since nothing is built from it', () => {
  const before = digest();
  for (const name of ['a.test.ts', 'a.test.tsx', 'a.spec.ts', 'a.e2e-spec.ts']) write(`src/${name}`, 'it()');
  assert.equal(digest(), before);
});

test('a stamp matches what was written until it is cleared, and any other wish never', () => {
  const stamp = new Stamp(join(root, 'stamps'), 'build');
  assert.equal(stamp.matches({ sources: 'x' }), false);
  stamp.write({ sources: 'x', runtime: 'y' });
  assert.equal(stamp.matches({ sources: 'x' }), true);
  assert.equal(stamp.matches({ sources: 'z' }), false);
  stamp.clear();
  assert.equal(stamp.matches({ sources: 'x' }), false);
});

test('a stamp that cannot be read counts as none', () => {
  const stamp = new Stamp(root, 'build');
  write('build.json', '{"sources": "x');
  assert.equal(stamp.matches({ sources: 'x' }), false);
});
