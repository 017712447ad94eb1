/** Shortest and longest PIN, in digits. Our choice. */
export const pinShortest = 4;
export const pinLongest = 8;

/** A PIN as it is typed: digits only, neither too few nor too many. */
export const pinPattern = new RegExp(`^\\d{${pinShortest},${pinLongest}}$`);

/** Verdict about a PIN; the other words are codes of the wire contract. */
export type PinVerdict = 'good' | 'pin.too_simple';

const digit = (text: string, at: number): number => text.charCodeAt(at) - '0'.charCodeAt(0);

/**
 * Judges a PIN of digits. Too simple is what people try first: one digit repeated, or a run up or down. Source: our choice,
 * after the advice of NIST SP 800-63B (2017), 5.1.1.2, to refuse repetitive and sequential secrets.
 *
 * `judgePin('4471')` is `'good'`; `judgePin('4444')`, `judgePin('3456')` and `judgePin('9876')` are `'pin.too_simple'`.
 */
export function judgePin(pin: string): PinVerdict {
  const strides = new Set<number>();
  for (let at = 1; at < pin.length; at += 1) strides.add(digit(pin, at) - digit(pin, at - 1));
  const [stride] = strides;
  const isRun = strides.size <= 1 && (stride === undefined || Math.abs(stride) <= 1);
  return isRun ? 'pin.too_simple' : 'good';
}
