import type { OutboxState } from '../lib/outbox/outbox';
import { entryFor, type NewEntry, type OutboxEntry } from '../lib/outbox/outbox-entry';
import { clockAt } from './wire-turn';
import { formatInstant } from '@stubpost/shared';

const touchedAt = clockAt('17:22:41');

/** A touch on the phone: a note of p-ortiz on turn t, made at 17:22:41 by a clock that is right. */
export function aTouch(change: Partial<NewEntry> = {}, id = 'a'): NewEntry {
  return {
    personId: 'p-ortiz',
    turn: 't',
    label: `Note ${id}`,
    about: 'Train 1742',
    payload: {
      id,
      kind: 'note',
      note: id,
      observedAt: formatInstant(touchedAt),
      source: 'by-hand',
      clockOffsetMilliseconds: 0,
    },
    deviceTime: touchedAt,
    clockOffset: 0,
    clockBasis: 'compared',
    tzOffset: 0,
    ...change,
  };
}

/** The entry of such a touch, first of its phone. */
export function anOutboxEntry(change: Partial<OutboxEntry> = {}, id = 'a'): OutboxEntry {
  return { ...entryFor(aTouch({}, id)), seq: 1, ...change };
}

/** An outbox in which nothing waits and nothing has left. */
export function anOutboxState(change: Partial<OutboxState> = {}): OutboxState {
  return {
    isLoaded: true,
    waiting: [],
    sent: [],
    lost: [],
    failingSince: null,
    nextTryAt: null,
    sentAt: null,
    storage: 'kept',
    needsSignIn: false,
    ...change,
  };
}
