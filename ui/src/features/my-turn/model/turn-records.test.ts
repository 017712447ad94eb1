import type { WireEntry } from '@stubpost/shared';
import { at, aWireTurn, withDone } from '../testing/a-wire-turn';
import { recordOf, recordsOf, wayBack, type TurnRecord } from './turn-records';

const ortiz = { id: 'p-ortiz', name: 'Ortiz' };
const anEntry = (id: string, kind: string, clock: string, fields: Partial<WireEntry> = {}): WireEntry => ({
  sequence: 1,
  hash: 'h',
  id,
  kind,
  observedAt: at(clock),
  receivedAt: at(clock),
  source: 'by-hand',
  by: ortiz,
  ...fields,
});

const turn = withDone(aWireTurn(), { 'handbrake-set': '17:19:52' });
const left = {
  ...turn,
  outbound: turn.outbound && { ...turn.outbound, actualDepartureAt: at('17:40:20') },
};

describe('records of a turn', () => {
  it('are the arrival, the steps and the departure in the order of time, with who wrote them', () => {
    const entries = [
      anEntry('a', 'arrival', '17:18:20'),
      anEntry('entry-handbrake-set', 'step-done', '17:19:52', { step: 'handbrake-set' }),
      anEntry('d', 'departure', '17:40:20', { by: null, source: 'by-feed' }),
    ];
    expect(recordsOf(left, entries).map(({ key, entryId, by }) => [key, entryId, by])).toEqual([
      ['arrival', 'a', ortiz],
      ['handbrake-set', 'entry-handbrake-set', ortiz],
      ['departure', 'd', null],
    ]);
  });

  it('find a movement under the entry whose time was corrected, and not under one that was taken back', () => {
    const entries = [
      anEntry('wrong', 'arrival', '17:18:20'),
      anEntry('w', 'withdrawn', '17:19', { target: 'wrong' }),
      anEntry('a', 'arrival', '17:17'),
      anEntry('c', 'corrected', '17:18:20', { target: 'a' }),
    ];
    expect(recordOf(turn, entries, 'arrival')?.entryId).toBe('a');
  });
});

describe('the way back from a record', () => {
  const record: TurnRecord = {
    key: 'handbrake-set',
    entryId: 'x',
    label: 'Handbrake set',
    at: at('17:19:52'),
    source: 'by-hand',
    by: ortiz,
    saidBy: null,
    reading: null,
  };

  it.each([
    ['its writer takes it back until the departure', record, turn, 'p-ortiz', 'withdraw'],
    ['its writer asks for a correction afterwards', record, left, 'p-ortiz', 'ask'],
    [
      'a departure can be taken back although the train has left',
      { ...record, key: 'departure' },
      left,
      'p-ortiz',
      'withdraw',
    ],
    ['somebody else does neither', record, turn, 'p-lind', null],
  ] as const)('%s', (_rule, each, of, person, way) => {
    expect(wayBack(each, of, person)).toBe(way);
  });
});
