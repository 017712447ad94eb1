/*
 * Sums with colours for the check of our tokens. Nothing of it runs in the product.
 */
export type Rgb = readonly [number, number, number];
type Lab = readonly [number, number, number];

/** Channels 0–1 of `#rgb` or `#rrggbb`. */
export function parseHex(text: string): Rgb {
  const digits = /^#([0-9a-f]{3}|[0-9a-f]{6})$/i.exec(text.trim())?.[1];
  if (digits === undefined) throw new RangeError(`Not a colour: ${text}`);
  const long = digits.length === 3 ? [...digits].map((digit) => digit + digit).join('') : digits;
  const channel = (at: number): number => parseInt(long.slice(at, at + 2), 16) / 255;
  return [channel(0), channel(2), channel(4)];
}

const toLinear = (channel: number): number =>
  channel <= 0.04045 ? channel / 12.92 : ((channel + 0.055) / 1.055) ** 2.4;
const fromLinear = (light: number): number =>
  light <= 0.0031308 ? light * 12.92 : 1.055 * light ** (1 / 2.4) - 0.055;
const mapRgb = (rgb: Rgb, change: (channel: number) => number): Rgb => [
  change(rgb[0]),
  change(rgb[1]),
  change(rgb[2]),
];

/** Contrast of two colours, 1 to 21. Source: WCAG 2.2, "contrast ratio" and "relative luminance". */
export function contrast(one: Rgb, other: Rgb): number {
  const luminance = (rgb: Rgb): number => {
    const [red, green, blue] = mapRgb(rgb, toLinear);
    return 0.2126 * red + 0.7152 * green + 0.0722 * blue;
  };
  const [low, high] = [luminance(one), luminance(other)].sort((a, b) => a - b) as [number, number];
  return (high + 0.05) / (low + 0.05);
}

const identity = [1, 0, 0, 0, 1, 0, 0, 0, 1] as const;

/**
 * How the three kinds of dichromat see a colour: matrices on linear light at full severity. Source: Machado, Oliveira and
 * Fernandes, "A Physiologically-based Model for Simulation of Color Vision Deficiency", IEEE TVCG 15(6), 2009, table of
 * severity 1.0.
 */
export const VISIONS = {
  usual: identity,
  protan: [0.152286, 1.052583, -0.204868, 0.114503, 0.786281, 0.099216, -0.003882, -0.048116, 1.051998],
  deutan: [0.367322, 0.860646, -0.227968, 0.280085, 0.672501, 0.047413, -0.01182, 0.04294, 0.968881],
  tritan: [1.255528, -0.076749, -0.178779, -0.078411, 0.930809, 0.147602, 0.004733, 0.691367, 0.3039],
} as const;
export type Vision = keyof typeof VISIONS;

/** A colour as somebody with this kind of vision sees it. */
export function seenBy(vision: Vision, rgb: Rgb): Rgb {
  const [red, green, blue] = mapRgb(rgb, toLinear);
  const [a, b, c, d, e, f, g, h, i] = VISIONS[vision];
  const shown = (light: number): number => fromLinear(Math.min(1, Math.max(0, light)));
  return [
    shown(a * red + b * green + c * blue),
    shown(d * red + e * green + f * blue),
    shown(g * red + h * green + i * blue),
  ];
}

/** CIE L*a*b* under D65, from sRGB. */
export function toLab(rgb: Rgb): Lab {
  const [red, green, blue] = mapRgb(rgb, toLinear);
  const x = (0.4124564 * red + 0.3575761 * green + 0.1804375 * blue) / 0.95047;
  const y = 0.2126729 * red + 0.7151522 * green + 0.072175 * blue;
  const z = (0.0193339 * red + 0.119192 * green + 0.9503041 * blue) / 1.08883;
  const f = (t: number): number => (t > 216 / 24389 ? Math.cbrt(t) : ((24389 / 27) * t + 16) / 116);
  return [116 * f(y) - 16, 500 * (f(x) - f(y)), 200 * (f(y) - f(z))];
}

const degrees = (radians: number): number => (radians * 180) / Math.PI;
const radians = (angle: number): number => (angle * Math.PI) / 180;
const hueOf = (a: number, b: number): number =>
  a === 0 && b === 0 ? 0 : (degrees(Math.atan2(b, a)) + 360) % 360;

function hueDifference(h1: number, h2: number, isGrey: boolean): number {
  if (isGrey) return 0;
  const difference = h2 - h1;
  if (Math.abs(difference) <= 180) return difference;
  return difference > 180 ? difference - 360 : difference + 360;
}

function meanHue(h1: number, h2: number, isGrey: boolean): number {
  if (isGrey) return h1 + h2;
  if (Math.abs(h1 - h2) <= 180) return (h1 + h2) / 2;
  return h1 + h2 < 360 ? (h1 + h2 + 360) / 2 : (h1 + h2 - 360) / 2;
}

/**
 * CIEDE2000 distance of two L*a*b* colours, all weights 1. Source: Sharma, Wu and Dalal, "The CIEDE2000 Color-Difference
 * Formula: Implementation Notes, Supplementary Test Data, and Mathematical Observations", 2005.
 */
export function ciede2000([l1, a1, b1]: Lab, [l2, a2, b2]: Lab): number {
  const meanChroma = (Math.hypot(a1, b1) + Math.hypot(a2, b2)) / 2;
  const g = 0.5 * (1 - Math.sqrt(meanChroma ** 7 / (meanChroma ** 7 + 25 ** 7)));
  const [p1, p2] = [a1 * (1 + g), a2 * (1 + g)];
  const [c1, c2] = [Math.hypot(p1, b1), Math.hypot(p2, b2)];
  const [h1, h2] = [hueOf(p1, b1), hueOf(p2, b2)];
  const isGrey = c1 * c2 === 0;
  const deltaL = l2 - l1;
  const deltaC = c2 - c1;
  const deltaH = 2 * Math.sqrt(c1 * c2) * Math.sin(radians(hueDifference(h1, h2, isGrey) / 2));
  const [meanL, meanC, hue] = [(l1 + l2) / 2, (c1 + c2) / 2, meanHue(h1, h2, isGrey)];
  const t =
    1 -
    0.17 * Math.cos(radians(hue - 30)) +
    0.24 * Math.cos(radians(2 * hue)) +
    0.32 * Math.cos(radians(3 * hue + 6)) -
    0.2 * Math.cos(radians(4 * hue - 63));
  const rotation = 30 * Math.exp(-(((hue - 275) / 25) ** 2));
  const rc = 2 * Math.sqrt(meanC ** 7 / (meanC ** 7 + 25 ** 7));
  const sl = 1 + (0.015 * (meanL - 50) ** 2) / Math.sqrt(20 + (meanL - 50) ** 2);
  const sc = 1 + 0.045 * meanC;
  const sh = 1 + 0.015 * meanC * t;
  const [l, c, h] = [deltaL / sl, deltaC / sc, deltaH / sh];
  return Math.sqrt(l * l + c * c + h * h - Math.sin(radians(2 * rotation)) * rc * c * h);
}

/** Hue in degrees and saturation 0–1 of the HSL model. */
export function hueAndSaturation([red, green, blue]: Rgb): { hue: number; saturation: number } {
  const [most, least] = [Math.max(red, green, blue), Math.min(red, green, blue)];
  const spread = most - least;
  if (spread === 0) return { hue: 0, saturation: 0 };
  const sixths =
    most === red
      ? ((green - blue) / spread + 6) % 6
      : most === green
        ? (blue - red) / spread + 2
        : (red - green) / spread + 4;
  return { hue: sixths * 60, saturation: spread / (1 - Math.abs(most + least - 1)) };
}
