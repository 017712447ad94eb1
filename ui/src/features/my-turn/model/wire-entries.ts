import {
  parseInstant,
  type Entry,
  type EntryAuthor,
  type Instant,
  type RecordEntryRequest,
  type WireEntry,
} from '@stubpost/shared';

const instantOf = (text: string): Instant => parseInstant(text) ?? 0;

/** Who writes on this phone. */
export interface Writer {
  id: string;
  name: string;
}

const authorOf = (person: { id: string; name: string } | null): EntryAuthor | null =>
  person === null ? null : { personId: person.id, name: person.name };

type Facts = Pick<Entry, 'id' | 'subject' | 'observedAt' | 'receivedAt' | 'source' | 'by'> & {
  saidBy?: string;
};

/**
 * The entries that say what was done on a turn: arrival, departure, steps, and what was taken back or corrected. The
 * others (desk orders, crew, notes) already stand in the turn itself and are left out.
 */
export function toEntries(turnId: string, entries: readonly WireEntry[]): Entry[] {
  return entries.flatMap((entry) => {
    const facts: Facts = {
      id: entry.id,
      subject: { kind: 'turn', id: turnId },
      observedAt: instantOf(entry.observedAt),
      receivedAt: instantOf(entry.receivedAt),
      source: entry.source,
      by: authorOf(entry.by),
      ...(entry.saidBy === undefined ? {} : { saidBy: entry.saidBy }),
    };
    return withContent(facts, entry);
  });
}

function withContent(facts: Facts, entry: WireEntry): Entry[] {
  const { kind, step, target, reason = '', reading } = entry;
  if (kind === 'arrival' || kind === 'departure') return [{ ...facts, kind }];
  if (kind === 'step-done' && step !== undefined) return [{ ...facts, kind, step, reading }];
  if (kind === 'cannot-do' && step !== undefined) return [{ ...facts, kind, step, reason }];
  if (kind === 'withdrawn' && target !== undefined) return [{ ...facts, kind, target, reason }];
  if (kind === 'corrected' && target !== undefined) {
    const claimed = entry['correctedObservedAt'];
    const time = typeof claimed === 'string' ? { correctedObservedAt: instantOf(claimed) } : {};
    return [{ ...facts, kind, target, reason, reading, ...time }];
  }
  return [];
}

/** An entry of this phone in the form in which the service will give it, before there is a receipt. */
export function asWireEntry(request: RecordEntryRequest, writer: Writer): WireEntry {
  const { expectedAt: _expectedAt, ...rest } = request as RecordEntryRequest & { expectedAt?: string };
  return {
    ...rest,
    sequence: 0,
    hash: '',
    receivedAt: request.observedAt,
    by: { id: writer.id, name: writer.name },
  };
}
