import { readdirSync, readFileSync } from 'node:fs';
import { createRequire } from 'node:module';
import { join } from 'node:path';
import { describe, expect, test } from 'vitest';
import {
  ciede2000,
  contrast,
  hueAndSaturation,
  parseHex,
  seenBy,
  toLab,
  VISIONS,
  type Rgb,
  type Vision,
} from '../testing/colour-math';
import { recolorBlueprint } from './recolor-blueprint';

const source = join(import.meta.dirname, '..');
const tokensText = readFileSync(join(source, 'styles/tokens.css'), 'utf8');

/** Custom properties of one rule of the token sheet. */
function block(selector: string): Map<string, string> {
  const start = tokensText.indexOf(`\n${selector} {`);
  if (start === -1) throw new Error(`tokens.css has no rule ${selector}`);
  const body = tokensText.slice(start, tokensText.indexOf('\n}', start));
  return new Map(
    [...body.matchAll(/(--[\w-]+):\s*([^;]+);/g)].map(([, name = '', value = '']) => [name, value.trim()]),
  );
}

const light = block(':root');
const THEMES = {
  light,
  dark: new Map([...light, ...block('.bp6-dark')]),
  daylight: new Map([...light, ...block('.daylight')]),
  'light, no colour': new Map([...light, ...block('.no-colour')]),
  'dark, no colour': new Map([
    ...light,
    ...block('.bp6-dark'),
    ...block('.no-colour'),
    ...block('.bp6-dark.no-colour'),
  ]),
};
type ThemeName = keyof typeof THEMES;
const themeNames = Object.keys(THEMES) as ThemeName[];

function token(theme: ThemeName, name: string): Rgb {
  const value = THEMES[theme].get(`--${name}`);
  if (value === undefined) throw new Error(`No token --${name}`);
  return parseHex(value);
}

const TEXT_PAIRS = [
  ['ink', 'page'],
  ['ink', 'panel'],
  ['ink', 'sunk'],
  ['ink', 'picked'],
  ['ink', 'past'],
  ['muted', 'page'],
  ['muted', 'panel'],
  ['muted', 'sunk'],
  ['muted', 'picked'],
  ['brand', 'page'],
  ['brand', 'panel'],
  ['late-text', 'panel'],
  ['on-risk', 'risk-fill'],
  ['on-late', 'late'],
  ['on-safety', 'safety'],
  ['on-brand', 'brand'],
  ['on-brand', 'brand-strong'],
  ['bar-on', 'bar-fill'],
] as const;

const GRAPHIC_PAIRS = [
  ['control', 'page'],
  ['control', 'panel'],
  ['plan', 'panel'],
  ['work', 'panel'],
  ['work', 'past'],
  ['on-work', 'work'],
  ['forecast-line', 'panel'],
  ['risk-line', 'panel'],
  ['late', 'panel'],
  ['safety', 'panel'],
  ['blue-signal', 'panel'],
  ['brand', 'panel'],
  ['bar-edge', 'page'],
] as const;

describe.each(themeNames)('in the theme %s', (theme) => {
  // The sun takes contrast away: Daylight asks for level AAA.
  const textContrast = theme === 'daylight' ? 7 : 4.5;

  test.each(TEXT_PAIRS)(`text %s on %s has a contrast of at least ${textContrast}`, (text, ground) => {
    expect(contrast(token(theme, text), token(theme, ground))).toBeGreaterThanOrEqual(textContrast);
  });

  test.each(GRAPHIC_PAIRS)('graphic %s on %s has a contrast of at least 3', (mark, ground) => {
    expect(contrast(token(theme, mark), token(theme, ground))).toBeGreaterThanOrEqual(3);
  });
});

const FILLS = ['work', 'forecast-fill', 'risk-fill', 'late', 'safety', 'blue-signal'] as const;
const leastDistance = 12;

function pairsOf<T>(items: readonly T[]): [T, T][] {
  return items.flatMap((one, at) => items.slice(at + 1).map((other): [T, T] => [one, other]));
}

function distance(theme: ThemeName, vision: Vision, one: string, other: string): number {
  const seen = (name: string) => toLab(seenBy(vision, token(theme, name)));
  return ciede2000(seen(one), seen(other));
}

describe.each(['light', 'dark', 'daylight'] as const)('the fills of states in the theme %s', (theme) => {
  test.each(Object.keys(VISIONS) as Vision[])('stay apart for %s eyes', (vision) => {
    const close = pairsOf([...FILLS, 'brand'])
      .map(([one, other]) => ({ one, other, apart: distance(theme, vision, one, other) }))
      .filter(({ apart }) => apart < leastDistance);
    expect(close).toEqual([]);
  });
});

/** Whether a colour is one we do not use: green at all, blue for anything but a blue signal. */
function isForbidden(rgb: Rgb): boolean {
  const { hue, saturation } = hueAndSaturation(rgb);
  return saturation > 0.2 && hue >= 65 && hue < 255;
}

const COLOUR = /#(?:[0-9a-f]{6}|[0-9a-f]{3})\b|rgba?\(\s*\d+[\s,]+\d+[\s,]+\d+/gi;
const NAMES =
  /:\s*(?:blue|green|navy|teal|lime|cyan|aqua|royalblue|dodgerblue|steelblue|seagreen|limegreen)\b/gi;

function parseColour(text: string): Rgb {
  if (text.startsWith('#')) return parseHex(text);
  const [red = 0, green = 0, blue = 0] = [...text.matchAll(/\d+/g)].map(([digits]) => Number(digits) / 255);
  return [red, green, blue];
}

const forbiddenIn = (text: string): string[] => [
  ...[...text.matchAll(COLOUR)]
    .map(([colour]) => colour)
    .filter((colour) => isForbidden(parseColour(colour))),
  ...[...text.matchAll(NAMES)].map(([name]) => name),
];

describe('nothing is blue but blue signals, and nothing is green', () => {
  test('the check sees blue and green where they are', () => {
    expect(forbiddenIn('a { color: #2d72d2; background: rgb(35, 133, 81); fill: green }')).toHaveLength(3);
    expect(forbiddenIn('a { color: #525a61; background: #ffd466; fill: #5b3a78 }')).toEqual([]);
  });

  test('among the tokens', () => {
    const withoutSignals = tokensText.replace(/--blue-signal:[^;]+;/g, '');
    expect(forbiddenIn(withoutSignals)).toEqual([]);
    expect(forbiddenIn(tokensText)).not.toEqual([]);
  });

  test('in any stylesheet or component', () => {
    const files = readdirSync(source, { recursive: true, encoding: 'utf8' }).filter(
      (file) => /\.(css|tsx)$/.test(file) && !/tokens\.css$|\.test\.tsx$/.test(file),
    );
    expect(files.length).toBeGreaterThan(20);
    const found = files.map((file) => ({
      file,
      colours: forbiddenIn(readFileSync(join(source, file), 'utf8')),
    }));
    expect(found.filter(({ colours }) => colours.length > 0)).toEqual([]);
  });

  test('in the component library, once its colours are turned', () => {
    const blueprint = createRequire(import.meta.url).resolve('@blueprintjs/core/lib/css/blueprint.css');
    const original = readFileSync(blueprint, 'utf8');
    expect(forbiddenIn(original).length).toBeGreaterThan(100);
    expect(forbiddenIn(recolorBlueprint(original))).toEqual([]);
  });
});
