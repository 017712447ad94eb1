/**
 * A value in the canonical form of RFC 8785 (JSON Canonicalization Scheme, June 2020): no blanks, the members of an
 * object sorted by the UTF-16 code units of their names, numbers and texts written as ECMAScript writes them. A member
 * that is undefined is left out, as `JSON.stringify` does. Throws for what JSON cannot hold: numbers that are not
 * finite, texts with half of a surrogate pair, functions and undefined items of a list.
 *
 * `canonicalJson({ b: 2, a: 1e21 })` is `{"a":1e+21,"b":2}`.
 */
export function canonicalJson(value: unknown): string {
  if (value === null || typeof value === 'boolean') return String(value);
  if (typeof value === 'string') return canonicalText(value);
  if (typeof value === 'number') return canonicalNumber(value);
  if (Array.isArray(value)) return `[${value.map((item) => canonicalJson(item)).join(',')}]`;
  if (typeof value === 'object') return canonicalObject(value);
  throw new TypeError(`A ${typeof value} has no canonical JSON form.`);
}

function canonicalObject(value: object): string {
  const members = Object.entries(value)
    .filter(([, member]) => member !== undefined)
    .sort(([a], [b]) => (a < b ? -1 : 1))
    .map(([name, member]) => `${canonicalText(name)}:${canonicalJson(member)}`);
  return `{${members.join(',')}}`;
}

const halfOfPair = /\p{Surrogate}/u;

function canonicalText(text: string): string {
  if (halfOfPair.test(text))
    throw new TypeError('A text with half of a surrogate pair has no canonical JSON form.');
  return JSON.stringify(text);
}

function canonicalNumber(value: number): string {
  if (!Number.isFinite(value)) throw new TypeError(`${value} has no canonical JSON form.`);
  return JSON.stringify(value);
}
