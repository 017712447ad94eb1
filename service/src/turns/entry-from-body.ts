import { type Entry, type EntryAuthor, type EntryContent, type Instant, assertNever } from '@stubpost/shared';
import { type EntryBody, type PersonInBody, given, instantIn } from './entry-body';

/** An entry of the log as the core works on it. */
export function entryFrom(stored: { id: string; receivedAt: Instant; body: EntryBody }): Entry {
  const { body } = stored;
  const facts = {
    id: stored.id,
    subject: body.subject,
    observedAt: instantIn(body.observedAt),
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
      return { kind, expectedAt: instantIn(field('expectedAt')) };
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
      return { kind, until: instantIn(field('until')), reason: field('reason') };
    case 'annulled':
      return { kind, reason: field('reason') };
    case 'note':
      return { kind, note: field('note') };
    case 'agreed':
    case 'correction-approved':
      return { kind, target: field('target') };
    case 'disagreed':
    case 'correction-declined':
      return { kind, target: field('target'), reason: field('reason') };
    case 'ruled':
      return { kind, target: field('target'), considered: field('considered') };
    case 'defect':
      return {
        kind,
        car: field('car'),
        cause: field('cause'),
        ...given('note', field<string | undefined>('note')),
      };
    case 'tied-up':
      return {
        kind,
        handbrakes: field('handbrakes'),
        checks: field('checks'),
        ...given('offAir', field<boolean | undefined>('offAir')),
        ...given('reason', field<string | undefined>('reason')),
      };
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
    ...given('correctedObservedAt', corrected === undefined ? undefined : instantIn(corrected)),
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
