/**
 * Blueprint writes its blue out in many places beside its variables, and its greys lean to blue. So every colour of
 * its stylesheet is turned when we build: blue becomes plum, green and red lose their hue, cool greys become warm, all at the
 * lightness they had, so that the contrasts of the library stay. The tokens then go over its variables in
 * blueprint-theme.css.
 */
const PLUM_HUE = 272;
const WARM_HUE = 45;

interface Hsl {
  hue: number;
  saturation: number;
  lightness: number;
}

const byte = (share: number): number => Math.round(share * 255);

function toHsl(red: number, green: number, blue: number): Hsl {
  const [r, g, b] = [red / 255, green / 255, blue / 255];
  const most = Math.max(r, g, b);
  const least = Math.min(r, g, b);
  const spread = most - least;
  const lightness = (most + least) / 2;
  if (spread === 0) return { hue: 0, saturation: 0, lightness };
  const saturation = spread / (1 - Math.abs(2 * lightness - 1));
  const turns =
    most === r ? ((g - b) / spread + 6) % 6 : most === g ? (b - r) / spread + 2 : (r - g) / spread + 4;
  return { hue: turns * 60, saturation, lightness };
}

function toRgb({ hue, saturation, lightness }: Hsl): [number, number, number] {
  const reach = saturation * Math.min(lightness, 1 - lightness);
  const channel = (offset: number): number => {
    const place = (offset + hue / 30) % 12;
    return byte(lightness - reach * Math.max(-1, Math.min(place - 3, 9 - place, 1)));
  };
  return [channel(0), channel(8), channel(4)];
}

/** Where a colour goes: by hue and strength, never by name. */
function turn(colour: Hsl): Hsl {
  const { hue, saturation, lightness } = colour;
  const isGrey = saturation < 0.2;
  if (isGrey) return { hue: WARM_HUE, saturation: saturation * 0.25, lightness };
  if (hue >= 65 && hue < 190) return { hue: WARM_HUE, saturation: 0.04, lightness };
  if (hue >= 190 && hue < 320) return { hue: PLUM_HUE, saturation: Math.min(saturation, 0.36), lightness };
  if (hue >= 320 || hue < 18) return { hue: WARM_HUE, saturation: 0.04, lightness };
  return colour;
}

const hex = (value: number): string => value.toString(16).padStart(2, '0');

function turnHex(text: string): string {
  const digits = text.slice(1);
  const long = digits.length <= 4 ? [...digits].map((digit) => digit + digit).join('') : digits;
  const channel = (at: number): number => parseInt(long.slice(at, at + 2), 16);
  const turned = toRgb(turn(toHsl(channel(0), channel(2), channel(4))));
  return `#${turned.map(hex).join('')}${long.slice(6)}`;
}

const hexColour = /#(?:[0-9a-f]{8}|[0-9a-f]{6}|[0-9a-f]{3,4})(?![0-9a-z_-])/gi;
const rgbColour = /\b(rgba?)\(\s*(\d+)\s*,\s*(\d+)\s*,\s*(\d+)\s*/g;

/**
 * Its rules for plain links and for the focus. They take the line away from links, so that one would be told by colour
 * alone, and in dark they outrank what our own sheets say.
 */
const outranking = [/^(?:\.bp6-dark )?a(?::hover)?\s*\{[^}]*\}/gm, /^(?:\.bp6-dark )?:focus\s*\{[^}]*\}/gm];

/** The stylesheet with every colour turned and without what outranks ours. Colours derived by `oklch(from …)` follow what they are derived from. */
export function recolorBlueprint(css: string): string {
  return outranking
    .reduce((rest, rule) => rest.replace(rule, ''), css)
    .replace(hexColour, turnHex)
    .replace(rgbColour, (_all, name: string, red: string, green: string, blue: string) => {
      const turned = toRgb(turn(toHsl(Number(red), Number(green), Number(blue))));
      return `${name}(${turned.join(', ')}`;
    });
}
