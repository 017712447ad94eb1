/**
 * When the act of an entry itself was made, by the account of its writer: of a correction `madeAt`, of any other entry
 * `observedAt`. Undefined for a correction that does not say; it counts as made when it came in.
 */
export function actTimeOf(entry: {
  kind: string;
  observedAt?: string | undefined;
  madeAt?: string | undefined;
}): string | undefined {
  return entry.kind === 'corrected' ? entry.madeAt : entry.observedAt;
}
