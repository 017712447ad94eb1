/**
 * Ends a switch over a closed set: the compiler complains when a member was left out, and a value that
 * got past the parsers anyway is reported instead of being passed over.
 */
export function assertNever(value: never): never {
  throw new Error(`Unexpected value: ${JSON.stringify(value)}`);
}
