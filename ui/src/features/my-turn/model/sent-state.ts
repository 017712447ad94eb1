import { parseInstant, type Instant, type WireEntry, type WireTurn } from '@stubpost/shared';
import type { OutboxState } from '../../../lib/outbox/outbox';

/** The states an entry passes through, as one strip shows them for all entries of this phone. */
export type SentState =
  | { kind: 'refused'; count: number }
  | { kind: 'on-phone'; count: number }
  | { kind: 'sent'; at: Instant }
  | { kind: 'seen'; at: Instant }
  | { kind: 'none' };

/** The one thing to say about the entries of this phone: what needs the person first, then what is not sent, then the newest. */
export function sentState(state: Pick<OutboxState, 'waiting' | 'sentAt'>, seenAt: Instant | null): SentState {
  const refused = state.waiting.filter((entry) => entry.refusal !== null).length;
  if (refused > 0) return { kind: 'refused', count: refused };
  if (state.waiting.length > 0) return { kind: 'on-phone', count: state.waiting.length };
  if (state.sentAt === null) return { kind: 'none' };
  return seenAt !== null && seenAt >= state.sentAt
    ? { kind: 'seen', at: seenAt }
    : { kind: 'sent', at: state.sentAt };
}

/**
 * When the desk last had a turn before it, as far as its own acts tell: an alert of it taken, or an entry of somebody
 * who is not on the turn. Null when nothing tells. An open board alone proves nothing, so it does not count.
 */
export function seenByDeskAt(turn: WireTurn, entries: readonly WireEntry[]): Instant | null {
  const crew = new Set(turn.crew.map((member) => member.personId));
  const times = [
    ...turn.alerts.map((alert) => alert.takenAt),
    ...entries.filter(({ by }) => by !== null && !crew.has(by.id)).map(({ receivedAt }) => receivedAt),
  ];
  const instants = times
    .map((text) => (text === null ? null : parseInstant(text)))
    .filter((at) => at !== null);
  return instants.length === 0 ? null : Math.max(...instants);
}
