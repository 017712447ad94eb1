import {
  type CalendarDate,
  type Entry,
  type EntryAuthor,
  type EntryContent,
  type EntrySource,
  type Instant,
  type RecordEntryRequest,
  assertNever,
  formatInstant,
  parseInstant,
} from '@stubpost/shared';

/** A person as they stand in the log: the id, and the name of that day. */
export interface PersonInBody {
  id: string;
  name: string;
}

/**
 * Everything an entry says, as it is sealed: the request's own fields with instants in one form, names beside ids,
 * and what the entry is about. Id, running number and time of receipt stand outside it.
 */
export type EntryBody = Record<string, unknown> & {
  subject: { kind: 'turn'; id: string };
  terminal: string;
  serviceDate: CalendarDate;
  kind: RecordEntryRequest['kind'];
  observedAt: string;
  source: EntrySource;
  by: PersonInBody | null;
};

/** What the body of an entry is made from. */
export interface EntryBodyParts {
  request: RecordEntryRequest;
  turn: { id: string; terminalCode: string; serviceDate: CalendarDate };
  by: PersonInBody | null;
  /** The name of the day of each person that the request names. */
  nameOf: (personId: string) => string;
}

/** Builds the body of an entry. */
export function entryBodyFrom({ request, turn, by, nameOf }: EntryBodyParts): EntryBody {
  return {
    subject: { kind: 'turn', id: turn.id },
    terminal: turn.terminalCode,
    serviceDate: turn.serviceDate,
    kind: request.kind,
    observedAt: inOneForm(request.observedAt),
    source: request.source,
    by,
    ...given('saidBy', request.saidBy),
    ...given('clockOffsetMilliseconds', request.clockOffsetMilliseconds),
    ...contentOf(request, (id) => ({ id, name: nameOf(id) })),
  };
}

function contentOf(
  request: RecordEntryRequest,
  personOf: (id: string) => PersonInBody,
): Record<string, unknown> {
  switch (request.kind) {
    case 'arrival':
    case 'departure':
    case 'briefing':
    case 'blue-signal-up':
    case 'blue-signal-down':
      return {};
    case 'expected-arrival':
      return { expectedAt: inOneForm(request.expectedAt) };
    case 'step-done':
      return { step: request.step, ...given('reading', request.reading) };
    case 'withdrawn':
      return { target: request.target, reason: request.reason };
    case 'corrected':
      return {
        target: request.target,
        reason: request.reason,
        ...given(
          'correctedObservedAt',
          request.correctedObservedAt && inOneForm(request.correctedObservedAt),
        ),
        ...given('reading', request.reading),
      };
    case 'cannot-do':
      return { step: request.step, reason: request.reason };
    case 'crew':
      return { person: personOf(request.person), as: request.as };
    case 'relief':
      return {
        out: personOf(request.out),
        in: request.in ? personOf(request.in) : null,
        as: request.as,
        faceToFace: request.faceToFace,
      };
    case 'track':
      return { track: request.track };
    case 'set':
      return { set: request.set };
    case 'hold':
      return { until: inOneForm(request.until), reason: request.reason };
    case 'annulled':
      return { reason: request.reason };
    case 'note':
      return { note: request.note };
    default:
      return assertNever(request);
  }
}

/** Ids of the people that a request names, beside its writer. */
export function peopleNamedIn(request: RecordEntryRequest): string[] {
  if (request.kind === 'crew') return [request.person];
  if (request.kind === 'relief') return [request.out, ...(request.in ? [request.in] : [])];
  return [];
}

/** Whether two bodies say the same: names may have changed between two tries of one act, people have not. */
export function saysTheSame(a: EntryBody, b: EntryBody): boolean {
  return JSON.stringify(comparable(a)) === JSON.stringify(comparable(b));
}

function comparable(value: unknown): unknown {
  if (Array.isArray(value)) return value.map(comparable);
  if (typeof value !== 'object' || value === null) return value;
  const keys = Object.keys(value).sort();
  const isPerson = keys.length === 2 && keys[0] === 'id' && keys[1] === 'name';
  const kept = isPerson ? ['id'] : keys;
  return kept.map((key) => [key, comparable((value as Record<string, unknown>)[key])]);
}

/** An entry of the log as the core works on it. */
export function entryFrom(stored: { id: string; receivedAt: Instant; body: EntryBody }): Entry {
  const { body } = stored;
  const facts = {
    id: stored.id,
    subject: body.subject,
    observedAt: instantOf(body.observedAt),
    receivedAt: stored.receivedAt,
    source: body.source,
    by: body.by === null ? null : authorOf(body.by),
    ...given('saidBy', body['saidBy'] as string | undefined),
    ...given('clockOffsetMilliseconds', body['clockOffsetMilliseconds'] as number | undefined),
  };
  return { ...facts, ...contentFrom(body) };
}

/** The content of each kind as its body holds it, before instants and people are read. */
type Content<Kind extends EntryContent['kind']> = Extract<EntryContent, { kind: Kind }>;

function contentFrom(body: EntryBody): EntryContent {
  const { kind } = body;
  const field = <Value>(name: string): Value => body[name] as Value;
  switch (kind) {
    case 'arrival':
    case 'departure':
    case 'briefing':
    case 'blue-signal-up':
    case 'blue-signal-down':
      return { kind };
    case 'expected-arrival':
      return { kind, expectedAt: instantOf(field('expectedAt')) };
    case 'step-done':
      return {
        kind,
        step: field('step'),
        ...given('reading', field<Content<'step-done'>['reading']>('reading')),
      };
    case 'withdrawn':
      return { kind, target: field('target'), reason: field('reason') };
    case 'corrected':
      return correctionFrom(body);
    case 'cannot-do':
      return { kind, step: field('step'), reason: field('reason') };
    case 'crew':
      return { kind, person: authorOf(field('person')), as: field('as') };
    case 'relief':
      return reliefFrom(body);
    case 'track':
      return { kind, track: field('track') };
    case 'set':
      return { kind, set: field('set') };
    case 'hold':
      return { kind, until: instantOf(field('until')), reason: field('reason') };
    case 'annulled':
      return { kind, reason: field('reason') };
    case 'note':
      return { kind, note: field('note') };
    default:
      return assertNever(kind);
  }
}

function correctionFrom(body: EntryBody): Content<'corrected'> {
  const corrected = body['correctedObservedAt'];
  return {
    kind: 'corrected',
    target: body['target'] as string,
    reason: body['reason'] as string,
    ...given('correctedObservedAt', corrected === undefined ? undefined : instantOf(corrected)),
    ...given('reading', body['reading'] as Content<'corrected'>['reading']),
  };
}

function reliefFrom(body: EntryBody): Content<'relief'> {
  const taker = body['in'] as PersonInBody | null;
  return {
    kind: 'relief',
    out: authorOf(body['out'] as PersonInBody),
    in: taker === null ? null : authorOf(taker),
    as: body['as'] as Content<'relief'>['as'],
    faceToFace: body['faceToFace'] === true,
  };
}

const authorOf = (person: PersonInBody): EntryAuthor => ({ personId: person.id, name: person.name });

function given<Key extends string, Value>(key: Key, value: Value | undefined): { [key in Key]?: Value } {
  return value === undefined ? {} : ({ [key]: value } as { [key in Key]?: Value });
}

function inOneForm(text: string): string {
  return formatInstant(instantOf(text));
}

function instantOf(value: unknown): Instant {
  const instant = parseInstant(String(value));
  if (instant === null) throw new Error(`${String(value)} got past the parser and is no instant`);
  return instant;
}
