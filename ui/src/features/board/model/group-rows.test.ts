import { aWireTurn, clockAt, entryAt, fixedSettings, wirePlan } from '../../../testing/wire-turn';
import { turnAt } from '../../../lib/turn/turn-at';
import { clashPartners, groupRows } from './group-rows';
import type { Entry } from '@stubpost/shared';

const now = clockAt('17:10');
const turn = (id: string, track: string | null, from: string, to: string, entries: Entry[] = [], set = id) =>
  turnAt(
    aWireTurn(
      {
        planned: {
          id,
          outboundTrain: id,
          track,
          set,
          scheduledArrivalAt: clockAt(from),
          scheduledDepartureAt: clockAt(to),
        },
        entries,
      },
      now,
    ),
    { plan: wirePlan, settings: fixedSettings },
    now,
  );
const shape = (rows: ReturnType<typeof groupRows>) =>
  rows.map((row) => [row.id, ...row.turns.map((one) => one.id)]);

describe('rows by track', () => {
  it('come in the order of the terminal, empty ones too, then tracks only turns name', () => {
    const rows = groupRows(
      [turn('a', '2', '17:00', '17:20'), turn('b', '10', '17:00', '17:20'), turn('c', '9', '17:00', '17:20')],
      'track',
      [{ label: '1' }, { label: '2' }],
      now,
    );
    expect(shape(rows)).toEqual([['track-1'], ['track-2', 'a'], ['track-9', 'c'], ['track-10', 'b']]);
  });

  it('pack turns without a track into as few rows as needed, last', () => {
    const rows = groupRows(
      [
        turn('a', null, '17:00', '17:20'),
        turn('b', null, '17:10', '17:30'),
        turn('c', null, '17:20', '17:40'),
        turn('d', '1', '17:00', '17:20'),
      ],
      'track',
      [{ label: '1' }],
      now,
    );
    expect(shape(rows)).toEqual([
      ['track-1', 'd'],
      ['track-none', 'a', 'c'],
      ['track-none-1', 'b'],
    ]);
    expect(rows.slice(1).every((row) => row.label === null && row.clashes.length === 0)).toBe(true);
  });

  it('show two trains planned on one track in rows of their own, and name the clash', () => {
    const rows = groupRows(
      [turn('a', '1', '17:20', '17:40'), turn('b', '1', '17:30', '17:50')],
      'track',
      [],
      now,
    );
    expect(shape(rows)).toEqual([
      ['track-1', 'a'],
      ['track-1-1', 'b'],
    ]);
    expect(rows[0]?.clashes).toEqual([
      { first: 'a', second: 'b', from: clockAt('17:30'), to: clockAt('17:40') },
    ]);
    expect([...(clashPartners(rows).get('b') ?? [])]).toEqual(['a']);
  });

  it('name a clash that only lateness brings, without moving the rows', () => {
    const entries = [entryAt('arrival', '17:00'), entryAt('hold', '17:05', { until: clockAt('17:35') })];
    const rows = groupRows(
      [turn('a', '1', '17:00', '17:20', entries), turn('b', '1', '17:25', '17:50')],
      'track',
      [],
      now,
    );
    expect(shape(rows)).toEqual([['track-1', 'a', 'b']]);
    expect(rows[0]?.clashes).toMatchObject([{ first: 'a', second: 'b', from: clockAt('17:25') }]);
  });

  it('have no clash with a turn that was annulled', () => {
    const annulled = [entryAt('annulled', '16:00')];
    const rows = groupRows(
      [turn('a', '1', '17:20', '17:40', annulled), turn('b', '1', '17:30', '17:50')],
      'track',
      [],
      now,
    );
    expect(rows.flatMap((row) => row.clashes)).toEqual([]);
  });
});

describe('rows by set', () => {
  it('show the day of each set that is in view', () => {
    const rows = groupRows(
      [
        turn('a', '1', '17:00', '17:20', [], '41'),
        turn('b', '2', '17:40', '18:00', [], '41'),
        turn('c', '1', '17:30', '17:50', [], '9'),
      ],
      'set',
      [{ label: '1' }],
      now,
    );
    expect(shape(rows)).toEqual([
      ['set-9', 'c'],
      ['set-41', 'a', 'b'],
    ]);
  });
});
