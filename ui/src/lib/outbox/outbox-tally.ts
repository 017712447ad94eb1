import type { Instant } from '@stubpost/shared';
import { saidAt, type OutboxEntry } from './outbox-entry';

/** Enough of an entry to name it when it is gone. */
export interface TalliedEntry {
  id: string;
  turn: string;
  label: string;
  about: string;
  observedAt: string;
}

/** An entry that was kept on this phone and is there no more, without ever having had a receipt. */
export interface LostEntry extends TalliedEntry {
  /** When it was missed. */
  missedAt: Instant;
}

/** What is written down about a person's entries, apart from the entries themselves. */
export interface Tally {
  /** Entries ever made on this phone. */
  made: number;
  open: TalliedEntry[];
  lost: LostEntry[];
}

/**
 * The count kept apart. It lives in another kind of storage than the outbox, so that what takes the one away leaves the
 * other; it is written after the outbox and cleared after it, so that a page that dies in between never cries loss.
 */
export interface TallyBook {
  read: (personId: string) => Tally;
  opened: (personId: string, entries: readonly OutboxEntry[]) => void;
  closed: (personId: string, ids: readonly string[]) => void;
  /** Moves entries from open to lost. */
  missed: (personId: string, ids: readonly string[], at: Instant) => void;
  /** The person has read which entries are lost. */
  forgetLost: (personId: string) => void;
}

const EMPTY: Tally = { made: 0, open: [], lost: [] };
const placeOf = (personId: string): string => `stubpost.outbox-count.${personId}`;

function isTally(value: unknown): value is Tally {
  return (
    typeof value === 'object' &&
    value !== null &&
    'made' in value &&
    typeof value.made === 'number' &&
    'open' in value &&
    Array.isArray(value.open) &&
    'lost' in value &&
    Array.isArray(value.lost)
  );
}

/** The count in `localStorage`. A browser that keeps nothing there has no count, and says nothing about losses. */
export function createTallyBook(storage: Pick<Storage, 'getItem' | 'setItem'>): TallyBook {
  const read = (personId: string): Tally => {
    try {
      const kept: unknown = JSON.parse(storage.getItem(placeOf(personId)) ?? 'null');
      return isTally(kept) ? kept : EMPTY;
    } catch {
      return EMPTY;
    }
  };
  const change = (personId: string, next: (tally: Tally) => Tally): void => {
    try {
      storage.setItem(placeOf(personId), JSON.stringify(next(read(personId))));
    } catch {
      // Full or forbidden: the entries themselves are what counts.
    }
  };
  return {
    read,
    opened: (personId, entries) =>
      change(personId, (tally) => {
        const known = new Set(tally.open.map(({ id }) => id));
        const fresh = entries.filter(({ id }) => !known.has(id)).map(tallied);
        return { ...tally, made: tally.made + fresh.length, open: [...tally.open, ...fresh] };
      }),
    closed: (personId, ids) =>
      change(personId, (tally) => ({ ...tally, open: tally.open.filter(({ id }) => !ids.includes(id)) })),
    missed: (personId, ids, at) =>
      change(personId, (tally) => ({
        ...tally,
        open: tally.open.filter(({ id }) => !ids.includes(id)),
        lost: [
          ...tally.lost,
          ...tally.open.filter(({ id }) => ids.includes(id)).map((entry) => ({ ...entry, missedAt: at })),
        ],
      })),
    forgetLost: (personId) => change(personId, (tally) => ({ ...tally, lost: [] })),
  };
}

function tallied(entry: OutboxEntry): TalliedEntry {
  const { id, turn, label, about } = entry;
  return { id, turn, label, about, observedAt: saidAt(entry) };
}

/** Entries that the count knows as unsent and that are neither waiting nor sent. */
export function missingFrom(
  tally: Tally,
  kept: { waiting: readonly { id: string }[]; sent: readonly { id: string }[] },
): TalliedEntry[] {
  const known = new Set([...kept.waiting, ...kept.sent].map(({ id }) => id));
  return tally.open.filter(({ id }) => !known.has(id));
}
