import { expect, test } from 'vitest';
import { recolorBlueprint } from './recolor-blueprint';

test.each([
  ['color:#2d72d2;', /^color:#[0-9a-f]{6};$/],
  ['color:#2d72d20d;', /^color:#[0-9a-f]{6}0d;$/],
  ['background:rgba(45, 114, 210, 0.4);', /^background:rgba\(\d+, \d+, \d+, 0\.4\);$/],
])('a blue in "%s" is turned and keeps its transparency', (css, shape) => {
  expect(recolorBlueprint(css)).toMatch(shape);
  expect(recolorBlueprint(css)).not.toBe(css);
});

test('white, black and amber stay what they are', () => {
  const css = 'a:#ffffff; b:#000000; c:#fbb360';
  expect(recolorBlueprint(css)).toBe(css);
});

test('an id in an address is no colour', () => {
  const css = 'background:url("#abc-defs"); grid-area:#fact-sheet';
  expect(recolorBlueprint(css)).toBe(css);
});

test('rules that outrank ours are gone, their neighbours stay', () => {
  const css = [
    'a{\n  color:#215db0;\n}',
    '.bp6-dark a:hover{\n  color:red;\n}',
    ':focus{\n  outline:0;\n}',
    'a code{\n  color:inherit;\n}',
  ].join('\n');
  expect(recolorBlueprint(css).trim()).toBe('a code{\n  color:inherit;\n}');
});
