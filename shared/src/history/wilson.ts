/** An interval for a share, both ends 0 to 1. */
export interface ShareInterval {
  low: number;
  high: number;
  /** How sure: 0.95. */
  confidence: number;
}

/** The 97.5 % point of the standard normal distribution, for 95 % intervals. */
const standardNormal975 = 1.959963984540054;

/**
 * Wilson's score interval at 95 %, without continuity correction: method 3 of Newcombe, Statistics in Medicine 17
 * (1998) 857–872. Null when nothing was counted.
 *
 * `wilsonInterval(81, 263)` is 0.2553 to 0.3662.
 */
export function wilsonInterval(successes: number, counted: number): ShareInterval | null {
  if (counted <= 0) return null;
  const share = successes / counted;
  const squared = standardNormal975 ** 2;
  const centre = share + squared / (2 * counted);
  const reach =
    standardNormal975 * Math.sqrt((share * (1 - share)) / counted + squared / (4 * counted * counted));
  const scale = 1 + squared / counted;
  return {
    low: successes === 0 ? 0 : Math.max(0, (centre - reach) / scale),
    high: successes === counted ? 1 : Math.min(1, (centre + reach) / scale),
    confidence: 0.95,
  };
}
