import type { OutboxState } from '../../../lib/outbox/outbox';

/** Where an entry of this phone is, in the words under the bar. */
export function whereIs(
  entryId: string,
  { waiting, failingSince }: Pick<OutboxState, 'waiting' | 'failingSince'>,
): string {
  const entry = waiting.find(({ id }) => id === entryId);
  if (entry === undefined) return 'sent';
  if (entry.refusal !== null) return 'on phone, not taken';
  return failingSince === null ? 'on phone, sending' : 'on phone, not sent';
}
