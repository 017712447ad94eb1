import {
  formatInstant,
  type EntrySource,
  type Instant,
  type PlanStep,
  type RecordEntryRequest,
  type WireReading,
} from '@stubpost/shared';
import { nearestInstantOfTime, readTimeOfDay } from '../../../lib/time-entry';
import type { ActTarget, EntryAct } from './entry-acts';
import { reasonText, type Why } from './why';
import { readAhead, readWhen } from './when';

/** Fields of the forms, as typed. Each form shows some of them. No time in it comes from the plan. */
export interface EntryDraft {
  act: EntryAct;
  step: string;
  /** The step cannot be done, instead of that it was. */
  cannot: boolean;
  source: EntrySource;
  saidBy: string;
  when: string;
  /** Expected arrival, or the end of a hold. */
  ahead: string;
  count: string;
  cars: readonly string[];
  brakePipePsi: string;
  p0: string;
  p1: string;
  seconds: string;
  reason: string;
  track: string;
  set: string;
  person: string;
  as: 'conductor' | 'engineer';
  out: string;
  faceToFace: boolean;
  note: string;
  /** Why an entry is taken back or corrected; `reason` holds further words. */
  why: Why | '';
  /** A correction takes the entry back, instead of saying what it should have said. */
  takesBack: boolean;
  /** The time that should have been recorded. */
  newTime: string;
}

export type DraftField = keyof EntryDraft;

/** What is missing or wrong in a form, in words. */
export interface DraftFault {
  field: DraftField;
  words: string;
}

export interface DraftContext {
  zone: string;
  now: Instant;
  /** Steps of the turn's plan, for what they ask to be read off. */
  steps: readonly PlanStep[];
  target: ActTarget;
}

/** The fields of an entry beside its id. */
export type EntryBody = DistributiveOmit<RecordEntryRequest, 'id'>;
type DistributiveOmit<Union, Key extends PropertyKey> = Union extends unknown ? Omit<Union, Key> : never;

export type DraftResult = { ok: true; body: EntryBody } | { ok: false; faults: DraftFault[] };

/** A form as it opens: nothing in it but what is chosen for the person, never a time. */
export function emptyDraft(target: ActTarget, source: EntrySource, saidBy: string): EntryDraft {
  return {
    act: target.act,
    step: target.step ?? '',
    cannot: false,
    source,
    saidBy,
    when: '',
    ahead: '',
    count: '',
    cars: [],
    brakePipePsi: '',
    p0: '',
    p1: '',
    seconds: '',
    reason: '',
    track: '',
    set: '',
    person: '',
    as: target.as ?? 'conductor',
    out: '',
    faceToFace: false,
    note: '',
    why: '',
    takesBack: false,
    newTime: '',
  };
}

/** Reads a form into an entry, or says what keeps it from being one. */
export function readDraft(draft: EntryDraft, context: DraftContext): DraftResult {
  const faults: DraftFault[] = [];
  const when = readWhen(draft.when, context.zone, context.now);
  if (!when.ok) faults.push({ field: 'when', words: when.words });
  const content = contentOf(draft, context, faults);
  if (faults.length > 0 || content === null || !when.ok) return { ok: false, faults };
  const saidBy = draft.saidBy.trim();
  const base = {
    source: draft.source,
    ...(draft.source === 'by-radio' && saidBy !== '' ? { saidBy } : {}),
  };
  const at = formatInstant(when.at);
  if (content.kind === 'corrected') return { ok: true, body: { ...base, madeAt: at, ...content } };
  return { ok: true, body: { ...base, observedAt: at, ...content } };
}

type Common = 'source' | 'saidBy' | 'clockOffsetMilliseconds';
type Correction = Extract<EntryBody, { kind: 'corrected' }>;
type Content =
  | DistributiveOmit<Exclude<EntryBody, Correction>, Common | 'observedAt'>
  | Omit<Correction, Common | 'madeAt'>;

function contentOf(draft: EntryDraft, context: DraftContext, faults: DraftFault[]): Content | null {
  const asked = (field: DraftField, text: string, words: string): string => {
    if (text.trim() === '') faults.push({ field, words });
    return text.trim();
  };
  const ahead = (): string => {
    const read = readAhead(draft.ahead, context.zone, context.now);
    if (!read.ok) faults.push({ field: 'ahead', words: read.words });
    return read.ok ? formatInstant(read.at) : '';
  };
  const reason = (): string => asked('reason', draft.reason, 'Give the reason');
  switch (draft.act) {
    case 'step':
      return stepContent(draft, context, faults);
    case 'arrival':
    case 'departure':
    case 'blue-signal-up':
    case 'blue-signal-down':
      return { kind: draft.act };
    case 'expected-arrival':
      return { kind: 'expected-arrival', expectedAt: ahead() };
    case 'hold':
      return { kind: 'hold', until: ahead(), reason: reason() };
    case 'track':
      return { kind: 'track', track: asked('track', draft.track, 'Which track?') };
    case 'set':
      return { kind: 'set', set: asked('set', draft.set, 'Which set?') };
    case 'annulled':
      return { kind: 'annulled', reason: reason() };
    case 'withdrawn':
      return { kind: 'withdrawn', target: context.target.entryId ?? '', reason: whyOf(draft, faults) };
    case 'corrected':
      return correctionContent(draft, context, faults);
    case 'note':
      return { kind: 'note', note: asked('note', draft.note, 'Write the note') };
    case 'crew':
      return { kind: 'crew', person: asked('person', draft.person, 'Who?'), as: draft.as };
    case 'relief':
      return {
        kind: 'relief',
        out: asked('out', draft.out, 'Who goes?'),
        in: draft.person.trim() === '' ? null : draft.person.trim(),
        as: draft.as,
        faceToFace: draft.person.trim() !== '' && draft.faceToFace,
      };
  }
}

/** The reason chosen, with the words that go with it; *other* says nothing without words. */
function whyOf({ why, reason }: EntryDraft, faults: DraftFault[]): string {
  if (why === '') faults.push({ field: 'why', words: 'Choose the reason' });
  else if (why === 'other' && reason.trim() === '') faults.push({ field: 'reason', words: 'Say why' });
  return why === '' ? '' : reasonText(why, reason);
}

/** What should have been recorded: another time, another count, or nothing at all. */
function correctionContent(draft: EntryDraft, context: DraftContext, faults: DraftFault[]): Content {
  const { entryId: target = '', entryAt, entryReading } = context.target;
  const reason = whyOf(draft, faults);
  if (draft.takesBack) return { kind: 'withdrawn', target, reason };
  const at = newTimeOf(draft, entryAt ?? context.now, context, faults);
  const count = numberIn(draft, 'count', faults, true);
  if (at === null && count === null && faults.length === 0) {
    faults.push({ field: 'newTime', words: 'Give what should have been recorded' });
  }
  return {
    kind: 'corrected',
    target,
    ...(at === null ? {} : { observedAt: formatInstant(at) }),
    ...(count === null ? {} : { reading: { ...entryReading, count } }),
    reason,
  };
}

function newTimeOf(
  { newTime }: EntryDraft,
  near: Instant,
  { zone, now }: DraftContext,
  faults: DraftFault[],
): Instant | null {
  if (newTime.trim() === '') return null;
  const seconds = readTimeOfDay(newTime);
  if (seconds === null) {
    faults.push({ field: 'newTime', words: 'Give a time as 17:24 or 17:24:05' });
    return null;
  }
  const at = nearestInstantOfTime(seconds, zone, near);
  if (at > now) faults.push({ field: 'newTime', words: 'That lies ahead' });
  return at;
}

function stepContent(draft: EntryDraft, { steps }: DraftContext, faults: DraftFault[]): Content | null {
  if (draft.step === '') {
    faults.push({ field: 'step', words: 'Which step?' });
    return null;
  }
  if (draft.cannot) {
    const reason = draft.reason.trim();
    if (reason === '') faults.push({ field: 'reason', words: 'Say why it cannot be done' });
    return { kind: 'cannot-do', step: draft.step, reason };
  }
  const plan = steps.find((step) => step.key === draft.step);
  const reading = readingOf(draft, plan, faults);
  return { kind: 'step-done', step: draft.step, ...(Object.keys(reading).length === 0 ? {} : { reading }) };
}

/** A release carries its count: without one nobody could say whether all handbrakes are off. */
export function asksForCount(plan: PlanStep | undefined): boolean {
  return plan?.kind === 'securement' && plan.reads.includes('count');
}

function readingOf(draft: EntryDraft, plan: PlanStep | undefined, faults: DraftFault[]): WireReading {
  const reading: WireReading = {};
  const count = numberIn(draft, 'count', faults, true);
  if (count !== null) reading.count = count;
  else if (asksForCount(plan) && draft.count.trim() === '' && draft.cars.length === 0) {
    faults.push({ field: 'count', words: 'How many handbrakes?' });
  }
  if (draft.cars.length > 0) {
    reading.cars = [...draft.cars];
    reading.count ??= draft.cars.length;
  }
  for (const field of ['brakePipePsi', 'p0', 'p1', 'seconds'] as const) {
    const value = numberIn(draft, field, faults, false);
    if (value !== null) reading[field] = value;
  }
  return reading;
}

function numberIn(
  draft: EntryDraft,
  field: 'count' | 'brakePipePsi' | 'p0' | 'p1' | 'seconds',
  faults: DraftFault[],
  isWhole: boolean,
): number | null {
  const text = draft[field].trim();
  if (text === '') return null;
  const value = Number(text);
  const largest = field === 'seconds' ? 3600 : 200;
  const isGood =
    Number.isFinite(value) && value >= 0 && value <= largest && (!isWhole || Number.isInteger(value));
  if (!isGood) faults.push({ field, words: `Give a ${isWhole ? 'whole ' : ''}number up to ${largest}` });
  return isGood ? value : null;
}
