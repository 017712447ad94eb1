import {
  type CalendarDate,
  type EntrySource,
  type Instant,
  type RecordEntryRequest,
  actTimeOf,
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
  /** When it came in; a correction that does not say when it was made was made then. */
  receivedAt: Instant;
  /** The name of the day of each person that the request names. */
  nameOf: (personId: string) => string;
}

/** Builds the body of an entry. */
export function entryBodyFrom({ request, turn, by, receivedAt, nameOf }: EntryBodyParts): EntryBody {
  const madeAt = actTimeOf(request);
  return {
    subject: { kind: 'turn', id: turn.id },
    terminal: turn.terminalCode,
    serviceDate: turn.serviceDate,
    kind: request.kind,
    observedAt: madeAt === undefined ? formatInstant(receivedAt) : inOneForm(madeAt),
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
          request.observedAt === undefined ? undefined : inOneForm(request.observedAt),
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
    case 'agreed':
    case 'correction-approved':
      return { target: request.target };
    case 'disagreed':
    case 'correction-declined':
      return { target: request.target, reason: request.reason };
    case 'ruled':
      return { target: request.target, considered: request.considered };
    case 'defect':
      return { car: request.car, cause: request.cause, ...given('note', request.note) };
    case 'tied-up':
      return {
        handbrakes: request.handbrakes,
        checks: request.checks,
        ...given('offAir', request.offAir),
        ...given('reason', request.reason),
      };
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

/** A field that is there only when it has a value. */
export function given<Key extends string, Value>(
  key: Key,
  value: Value | undefined,
): { [key in Key]?: Value } {
  return value === undefined ? {} : ({ [key]: value } as { [key in Key]?: Value });
}

function inOneForm(text: string): string {
  return formatInstant(instantIn(text));
}

/** An instant that a parser has let through. */
export function instantIn(value: unknown): Instant {
  const instant = parseInstant(String(value));
  if (instant === null) throw new Error(`${String(value)} got past the parser and is no instant`);
  return instant;
}
