import {
  actTimeOf,
  parseInstant,
  type DefectCause,
  type Entry,
  type EntryAuthor,
  type Instant,
  type LeftHandbrakes,
  type RecordEntryRequest,
  type TieUpCheck,
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
 * The entries that say what was done on a turn and what people say to one another's entries. The others (desk orders,
 * crew, reliefs) already stand in the turn itself and are left out.
 */
export function toEntries(turnId: string, entries: readonly WireEntry[]): Entry[] {
  return entries.flatMap((entry) => {
    const facts: Facts = {
      id: entry.id,
      subject: { kind: 'turn', id: turnId },
      // A correction that does not say when it was made was made when it came in.
      observedAt: instantOf(actTimeOf(entry) ?? entry.receivedAt),
      receivedAt: instantOf(entry.receivedAt),
      source: entry.source,
      by: authorOf(entry.by),
      ...(entry.saidBy === undefined ? {} : { saidBy: entry.saidBy }),
    };
    return withContent(facts, entry);
  });
}

function withContent(facts: Facts, entry: WireEntry): Entry[] {
  const { kind, step, target, reason = '', reading, note } = entry;
  switch (kind) {
    case 'arrival':
    case 'departure':
    case 'briefing':
      return [{ ...facts, kind }];
    case 'note':
      return note === undefined ? [] : [{ ...facts, kind, note }];
    case 'step-done':
      return step === undefined ? [] : [{ ...facts, kind, step, reading }];
    case 'cannot-do':
      return step === undefined ? [] : [{ ...facts, kind, step, reason }];
    case 'defect':
      return [{ ...facts, kind, ...defectOf(entry) }];
    case 'tied-up':
      return [{ ...facts, kind, ...tieUpOf(entry) }];
    default:
      return target === undefined ? [] : answerTo(facts, entry, target);
  }
}

/** Entries about another entry. */
function answerTo(
  facts: Facts,
  { kind, reason = '', reading, observedAt, considered }: WireEntry,
  target: string,
): Entry[] {
  switch (kind) {
    case 'withdrawn':
    case 'disagreed':
    case 'correction-declined':
      return [{ ...facts, kind, target, reason }];
    case 'agreed':
    case 'correction-approved':
      return [{ ...facts, kind, target }];
    case 'ruled':
      return [
        { ...facts, kind, target, considered: Array.isArray(considered) ? considered.map(String) : [] },
      ];
    case 'corrected': {
      const time = observedAt === undefined ? {} : { correctedObservedAt: instantOf(observedAt) };
      return [{ ...facts, kind, target, reason, reading, ...time }];
    }
    default:
      return [];
  }
}

/*
 * Fields that the contract names for a request and leaves open for an entry: what this service wrote was parsed by it.
 */
function defectOf(entry: WireEntry) {
  const { car, cause, note } = entry as WireEntry & { car: string | null; cause: DefectCause };
  return { car, cause, note };
}

function tieUpOf(entry: WireEntry) {
  const { handbrakes, checks, offAir, reason } = entry as WireEntry & {
    handbrakes: LeftHandbrakes;
    checks: TieUpCheck[];
    offAir?: boolean;
  };
  return { handbrakes, checks, offAir, reason };
}

/** An entry of this phone in the form in which the service will give it, before there is a receipt. */
export function asWireEntry(request: RecordEntryRequest, writer: Writer): WireEntry {
  const { expectedAt: _expectedAt, ...rest } = request as RecordEntryRequest & { expectedAt?: string };
  return {
    ...rest,
    sequence: 0,
    hash: '',
    receivedAt: actTimeOf(request) ?? '',
    by: { id: writer.id, name: writer.name },
  };
}
