import type { Entry } from '@stubpost/shared';
import { aWireTurn, clockAt, entryAt, fixedSettings, wirePlan } from '../../../testing/wire-turn';
import { turnAt } from '../../../lib/turn/turn-at';
import { groupRows } from './group-rows';
import { rowHead } from './head-lines';

const now = clockAt('17:10');
const tracks = [{ label: '3', cars: 10, markers: [{ cars: 5, label: 'E' }] }];
const turn = (
  id: string,
  from: string,
  to: string,
  entries: Entry[] = [],
  cars = ['1', '2', '3', '4', '5'],
) =>
  turnAt(
    aWireTurn(
      {
        planned: {
          id,
          outboundTrain: id,
          scheduledArrivalAt: clockAt(from),
          scheduledDepartureAt: clockAt(to),
        },
        entries,
        cars,
      },
      now,
    ),
    { plan: wirePlan, settings: fixedSettings },
    now,
  );
const head = (...turns: ReturnType<typeof turn>[]) => {
  const row = groupRows(turns, 'track', tracks, now)[0];
  if (row === undefined) throw new Error('no row');
  return rowHead(row, {
    now,
    zone: 'America/New_York',
    windowTo: clockAt('18:50'),
    tracks,
    trainOf: (id) => id,
  });
};
const left = [entryAt('arrival', '16:40'), entryAt('departure', '17:00')];
const arrived = [entryAt('arrival', '17:05'), entryAt('step-done', '17:06', { step: 'handbrake-set' })];

describe('the head of a row', () => {
  it('names this turn, the next, and where the train stands', () => {
    const { lines, about } = head(turn('a', '17:00', '17:25', arrived), turn('b', '17:40', '18:00'));
    expect(lines.map((line) => [line.id, line.look, line.state])).toEqual([
      ['a', 'now', 'Secured'],
      ['b', 'later', 'Inbound'],
    ]);
    expect(about).toEqual({ text: '5 cars at marker E (10 fit)', flag: null });
  });

  it('gives the third line to a third turn, and of more keeps the two that matter now', () => {
    const three = head(
      turn('a', '16:40', '17:00', left),
      turn('b', '17:20', '17:40'),
      turn('c', '17:50', '18:10'),
    );
    expect([three.lines.length, three.about]).toEqual([3, null]);
    const four = head(
      turn('a', '16:40', '17:00', left),
      turn('b', '17:20', '17:40'),
      turn('c', '17:50', '18:10'),
      turn('d', '18:20', '18:40'),
    );
    expect(four.lines.map((line) => line.id)).toEqual(['b', 'c']);
    expect(four.about?.text).toBe('and 2 more until 18:50');
  });

  it('says what matters more than where it stands', () => {
    const blue = entryAt('blue-signal-up', '17:06', { by: { personId: 'i', name: 'J. Abara' } });
    expect(head(turn('a', '17:00', '17:25', [...arrived, blue])).about).toEqual({
      text: 'Blue signal up since 17:06, Abara',
      flag: 'blue-signal',
    });
    const hold = entryAt('hold', '17:06', { until: clockAt('17:35'), reason: 'connection' });
    expect(head(turn('a', '17:00', '17:25', [...arrived, hold])).about?.text).toBe(
      'Held to 17:35: connection',
    );
    const clash = head(turn('a', '17:00', '17:25', [...arrived, hold]), turn('b', '17:30', '17:50'));
    expect(clash.about?.text).toBe('a and b both here 17:30 to 17:35');
  });

  it('of an empty track says so, and of a track without a known train how long it is', () => {
    expect(head().about?.text).toBe('no turns until 18:50');
    expect(head(turn('a', '17:20', '17:40', [], [])).about?.text).toBe('fits 10 cars');
  });

  it('has no clash with a train that was tied up and closed hours ago', () => {
    const tiedUp = turnAt(
      aWireTurn(
        {
          planned: {
            id: 'old',
            kind: 'tie-up',
            outboundTrain: null,
            scheduledDepartureAt: null,
            scheduledArrivalAt: clockAt('15:00'),
          },
          entries: [entryAt('arrival', '15:01'), entryAt('step-done', '15:03', { step: 'handbrake-set' })],
        },
        now,
      ),
      { plan: wirePlan, settings: fixedSettings },
      now,
    );
    expect(tiedUp.state).toBe('closed');
    const row = groupRows([tiedUp, turn('a', '17:00', '17:25', arrived)], 'track', tracks, now)[0];
    expect(row?.clashes).toEqual([]);
  });
});
