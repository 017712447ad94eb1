import type { EntrySource, Instant } from '@stubpost/shared';
import type { OutboxState } from '../../../lib/outbox/outbox';
import { saidAt } from '../../../lib/outbox/outbox-entry';

/** Where one entry is: three states, and two ways of having been refused. */
export type EntryPlace = 'on-phone' | 'sent' | 'seen' | 'refused' | 'refused-read';

/** One line of the list of entries. */
export interface OutboxLine {
  id: string;
  label: string;
  about: string;
  source: EntrySource;
  observedAt: string;
  place: EntryPlace;
  /** Number in the log, once there is one. */
  sequence: number | null;
  /** Why it was not taken. */
  refusal: string | null;
}

/** How many of those that have left are shown; the log itself has them all. Our choice. */
export const sentShown = 30;

/**
 * The lines of the outbox, newest act first: what waits, then what has left. `seenAt` answers when the desk last had a
 * turn before it.
 */
export function outboxLines(
  state: Pick<OutboxState, 'waiting' | 'sent'>,
  seenAt: (turnId: string) => Instant | null,
): OutboxLine[] {
  const waiting = [...state.waiting].reverse().map((entry): OutboxLine => ({
    ...named(entry),
    observedAt: saidAt(entry),
    place: entry.refusal === null ? 'on-phone' : 'refused',
    sequence: null,
    refusal: entry.refusal?.message ?? null,
  }));
  const left = state.sent.slice(0, sentShown).map((entry): OutboxLine => {
    const seen = seenAt(entry.turn);
    const place = seen !== null && seen >= entry.leftAt ? 'seen' : 'sent';
    return {
      ...named(entry),
      observedAt: entry.observedAt,
      place: entry.refusal === null ? place : 'refused-read',
      sequence: entry.sequence,
      refusal: entry.refusal?.message ?? null,
    };
  });
  return [...waiting, ...left];
}

const named = ({ id, label, about, source }: Pick<OutboxLine, 'id' | 'label' | 'about' | 'source'>) => ({
  id,
  label,
  about,
  source,
});

/** How the sending stands, in one sentence. */
export type OutboxStanding =
  | { kind: 'needs-sign-in' }
  | { kind: 'no-answer'; since: Instant; nextTrySeconds: number | null }
  | { kind: 'sending' }
  | { kind: 'refused' }
  | { kind: 'all-sent'; at: Instant }
  | { kind: 'nothing' };

/** The one thing to say above the list. */
export function outboxStanding(state: OutboxState, now: Instant): OutboxStanding {
  const unsent = state.waiting.filter(({ refusal }) => refusal === null).length;
  if (unsent > 0 && state.needsSignIn) return { kind: 'needs-sign-in' };
  if (unsent > 0 && state.failingSince !== null) {
    const left = state.nextTryAt === null ? null : Math.max(0, Math.ceil((state.nextTryAt - now) / 1000));
    return { kind: 'no-answer', since: state.failingSince, nextTrySeconds: left };
  }
  if (unsent > 0) return { kind: 'sending' };
  if (state.waiting.length > 0) return { kind: 'refused' };
  return state.sentAt === null ? { kind: 'nothing' } : { kind: 'all-sent', at: state.sentAt };
}
