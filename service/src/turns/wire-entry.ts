import { type WireEntry, formatInstant } from '@stubpost/shared';
import type { LoggedEntry } from '../records/entry-log';

/**
 * An entry of a turn as its route gives it. The log keeps when each entry was made under one name; a correction is
 * given as it was sent, with the time it claims as `observedAt`.
 */
export function wireEntryOf({ sequence, hash, id, receivedAt, body }: LoggedEntry): WireEntry {
  const seal = { sequence, hash, id, receivedAt: formatInstant(receivedAt) };
  if (body['kind'] !== 'corrected') return { ...seal, ...body } as WireEntry;
  const { observedAt: madeAt, correctedObservedAt: observedAt, ...rest } = body;
  return { ...seal, ...rest, ...(observedAt === undefined ? {} : { observedAt }), madeAt } as WireEntry;
}
