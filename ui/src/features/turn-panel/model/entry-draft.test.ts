import { recordEntrySchema } from '@stubpost/shared';
import { clockAt, madeUuid, wirePlan } from '../../../testing/wire-turn';
import { ENTRY_ACTS, type ActTarget } from './entry-acts';
import { emptyDraft, readDraft, type EntryDraft } from './entry-draft';

const now = clockAt('17:26:40');
const context = (target: ActTarget) => ({ zone: 'America/New_York', now, steps: wirePlan.steps, target });
const read = (act: ActTarget['act'], change: Partial<EntryDraft> = {}, rest: Partial<ActTarget> = {}) => {
  const target = { act, turnId: 't', ...rest };
  return readDraft({ ...emptyDraft(target, 'by-radio', 'P. Varga'), ...change }, context(target));
};
const iso = (clock: string): string => new Date(clockAt(clock)).toISOString();

const good: [ActTarget['act'], Partial<EntryDraft>, object][] = [
  [
    'step',
    { step: 'cab-brake-check', when: '2' },
    { kind: 'step-done', step: 'cab-brake-check', observedAt: iso('17:24:40') },
  ],
  ['step', { step: 'handbrake-set', count: '2' }, { reading: { count: 2 } }],
  [
    'step',
    { step: 'handbrake-released', cars: ['2235', '4107'] },
    { reading: { count: 2, cars: ['2235', '4107'] } },
  ],
  ['step', { step: 'brakes-released', brakePipePsi: '110' }, { reading: { brakePipePsi: 110 } }],
  [
    'step',
    { step: 'ends-changed', cannot: true, reason: 'cab locked' },
    { kind: 'cannot-do', reason: 'cab locked' },
  ],
  ['arrival', { when: '17:19:10' }, { kind: 'arrival', observedAt: iso('17:19:10'), saidBy: 'P. Varga' }],
  ['departure', {}, { kind: 'departure', observedAt: iso('17:26:40') }],
  ['expected-arrival', { ahead: '17:44' }, { expectedAt: iso('17:44') }],
  ['hold', { ahead: '+5', reason: 'connection' }, { until: iso('17:31:40'), reason: 'connection' }],
  ['track', { track: ' 4 ' }, { track: '4' }],
  ['set', { set: '44' }, { set: '44' }],
  ['annulled', { reason: 'no crew' }, { kind: 'annulled', reason: 'no crew' }],
  ['crew', { person: 'p-1', as: 'engineer' }, { person: 'p-1', as: 'engineer' }],
  ['relief', { out: 'p-1', person: 'p-2', faceToFace: true }, { out: 'p-1', in: 'p-2', faceToFace: true }],
  ['relief', { out: 'p-1', faceToFace: true }, { in: null, faceToFace: false }],
  ['blue-signal-up', {}, { kind: 'blue-signal-up' }],
  ['blue-signal-down', {}, { kind: 'blue-signal-down' }],
  ['note', { note: 'door 3 slow' }, { note: 'door 3 slow' }],
  ['withdrawn', { why: 'wrong train' }, { kind: 'withdrawn', reason: 'wrong train' }],
  ['withdrawn', { why: 'other', reason: 'not ours' }, { reason: 'not ours' }],
  [
    'corrected',
    { newTime: '17:22:10', why: 'wrong time', reason: 'misread' },
    {
      kind: 'corrected',
      observedAt: iso('17:22:10'),
      madeAt: iso('17:26:40'),
      reason: 'wrong time: misread',
    },
  ],
  ['corrected', { count: '2', why: 'other', reason: 'counted again' }, { reading: { count: 2 } }],
  ['corrected', { takesBack: true, why: 'wrong step' }, { kind: 'withdrawn', reason: 'wrong step' }],
];

describe('a form read into an entry', () => {
  it.each(good)('%s %j', (act, change, expected) => {
    const result = read(act, change, { entryId: madeUuid() });
    expect(result).toMatchObject({ ok: true, body: expected });
    if (result.ok) expect(recordEntrySchema.safeParse({ id: madeUuid(), ...result.body }).success).toBe(true);
  });

  it('covers every form', () => {
    expect(new Set(good.map(([act]) => act))).toEqual(new Set(ENTRY_ACTS));
  });

  it('names the speaker only for what was said over the radio', () => {
    const byHand = read('arrival', { source: 'by-hand' });
    expect(byHand.ok && 'saidBy' in byHand.body).toBe(false);
  });

  it.each<[ActTarget['act'], Partial<EntryDraft>, string[]]>([
    ['step', {}, ['step']],
    ['step', { step: 'handbrake-released' }, ['count']],
    ['step', { step: 'handbrake-set', count: '1.5' }, ['count']],
    ['step', { step: 'ends-changed', cannot: true }, ['reason']],
    ['step', { step: 'cab-brake-check', when: '17:40' }, ['when']],
    ['hold', {}, ['ahead', 'reason']],
    ['expected-arrival', { ahead: 'soon' }, ['ahead']],
    ['annulled', { reason: '  ' }, ['reason']],
    ['relief', {}, ['out']],
    ['note', {}, ['note']],
    ['withdrawn', {}, ['why']],
    ['withdrawn', { why: 'other' }, ['reason']],
    ['corrected', { why: 'wrong time' }, ['newTime']],
    ['corrected', { why: 'wrong time', newTime: 'soon' }, ['newTime']],
    ['corrected', { why: 'wrong time', newTime: '17:40' }, ['newTime']],
  ])('of %s %j asks for %j', (act, change, fields) => {
    const result = read(act, change);
    expect(result.ok ? [] : result.faults.map((fault) => fault.field)).toEqual(fields);
  });

  it('opens with no time in it', () => {
    const draft = emptyDraft({ act: 'arrival', turnId: 't' }, 'by-radio', '');
    expect([draft.when, draft.ahead, draft.newTime]).toEqual(['', '', '']);
  });
});
