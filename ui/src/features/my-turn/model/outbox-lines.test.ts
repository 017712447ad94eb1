import { describe, expect, it } from 'vitest';
import type { SentEntry } from '../../../lib/outbox/outbox-entry';
import { anOutboxEntry, anOutboxState } from '../../../testing/an-outbox';
import { ms } from '../testing/a-wire-turn';
import { outboxLines, outboxStanding } from './outbox-lines';

const sent = (id: string, change: Partial<SentEntry> = {}): SentEntry => ({
  id,
  personId: 'p-ortiz',
  turn: 't',
  label: 'Handbrake set',
  about: 'Train 1742',
  source: 'by-hand',
  observedAt: '2026-03-03T22:19:52.000Z',
  leftAt: ms('17:20:00'),
  sequence: 48_361,
  refusal: null,
  ...change,
});
const no = { code: 'entry.not_yours', message: 'Somebody else made it.' };

describe('the list of entries', () => {
  it('shows what waits before what has left, newest act first, each with where it is', () => {
    const state = anOutboxState({
      waiting: [anOutboxEntry({ seq: 1 }, 'a'), anOutboxEntry({ seq: 2, refusal: no }, 'b')],
      sent: [sent('c'), sent('d', { leftAt: ms('17:30') }), sent('e', { sequence: null, refusal: no })],
    });
    const lines = outboxLines(state, () => ms('17:25'));
    expect(lines.map(({ id, place }) => [id, place])).toEqual([
      ['b', 'refused'],
      ['a', 'on-phone'],
      ['c', 'seen'],
      ['d', 'sent'],
      ['e', 'refused-read'],
    ]);
    expect(lines[0]?.refusal).toBe('Somebody else made it.');
  });
});

describe('how the sending stands', () => {
  const waiting = [anOutboxEntry()];
  const now = ms('17:34:12');
  it.each([
    ['nothing was recorded', {}, { kind: 'nothing' }],
    ['all is sent', { sentAt: ms('17:20') }, { kind: 'all-sent', at: ms('17:20') }],
    ['something is on its way', { waiting }, { kind: 'sending' }],
    [
      'there is no answer',
      { waiting, failingSince: ms('17:22:50'), nextTryAt: ms('17:34:21') },
      { kind: 'no-answer', since: ms('17:22:50'), nextTrySeconds: 9 },
    ],
    ['the session has ended', { waiting, needsSignIn: true }, { kind: 'needs-sign-in' }],
    ['only refused entries are left', { waiting: [anOutboxEntry({ refusal: no })] }, { kind: 'refused' }],
  ])('is said when %s', (_name, change, standing) => {
    expect(outboxStanding(anOutboxState(change), now)).toEqual(standing);
  });
});
