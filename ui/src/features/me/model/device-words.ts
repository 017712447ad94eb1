const BROWSERS: readonly (readonly [RegExp, string])[] = [
  [/\bEdg(?:e|A|iOS)?\//, 'Edge'],
  [/\b(?:OPR|Opera)\//, 'Opera'],
  [/\b(?:Firefox|FxiOS)\//, 'Firefox'],
  [/\bSamsungBrowser\//, 'Samsung browser'],
  [/\b(?:Headless)?(?:Chrome|CriOS)\//, 'Chrome'],
  [/\bVersion\/[\d.]+.*\bSafari\//, 'Safari'],
];

const SYSTEMS: readonly (readonly [RegExp, string])[] = [
  [/\biPhone\b/, 'iPhone'],
  [/\biPad\b/, 'iPad'],
  [/\bAndroid\b/, 'Android'],
  [/\bWindows\b/, 'Windows'],
  [/\bMac OS X\b|\bMacintosh\b/, 'Mac'],
  [/\bLinux\b|\bX11\b/, 'Linux'],
];

const first = (known: readonly (readonly [RegExp, string])[], text: string): string | undefined =>
  known.find(([sign]) => sign.test(text))?.[1];

/** What a browser calls itself, in words: "Chrome on Linux". Anything else is shown as it came, cut short. */
export function deviceWords(userAgent: string): string {
  const browser = first(BROWSERS, userAgent);
  const system = first(SYSTEMS, userAgent);
  if (browser !== undefined) return system === undefined ? browser : `${browser} on ${system}`;
  if (userAgent === '') return 'Unknown device';
  return userAgent.length > 40 ? `${userAgent.slice(0, 39)}…` : userAgent;
}
