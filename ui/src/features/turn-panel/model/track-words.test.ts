import { aWireTurn, clockAt, entryAt } from '../../../testing/wire-turn';
import { readTurn } from '../../../lib/turn/turn-now';
import { trackWords } from './track-words';

const now = clockAt('16:50');
const turn = readTurn(aWireTurn({ cars: ['1', '2', '3'] }, now));
const tracks = [
  { label: '3', cars: 4 },
  { label: '4', cars: 2 },
  { label: '5', cars: 4, markers: [{ cars: 3, label: 'C' }] },
];
const other = (track: string, from: string, to: string) =>
  aWireTurn(
    {
      planned: {
        id: 'o',
        outboundTrain: '1644',
        track,
        scheduledArrivalAt: clockAt(from),
        scheduledDepartureAt: clockAt(to),
      },
    },
    now,
  );

describe('a move to another track, before it is made', () => {
  it('says from where to where, and the stopping marker', () => {
    expect(trackWords(turn, '5', tracks, [])).toEqual([
      'Train 1742: track 3 to track 5.',
      'Stops at marker C.',
    ]);
  });

  it('says when the train is too long', () => {
    expect(trackWords(turn, '4', tracks, [])).toContain('Too long: 3 cars, track 4 fits 2.');
  });

  it('names the trains that are there meanwhile, and only those', () => {
    expect(trackWords(turn, '5', tracks, [other('5', '17:10', '17:30')])).toContain(
      'Train 1644 is there 17:10 to 17:30.',
    );
    expect(trackWords(turn, '5', tracks, [other('5', '17:20', '17:30')])).toHaveLength(2);
    expect(trackWords(turn, '5', tracks, [other('4', '17:10', '17:30')])).toHaveLength(2);
    const annulled = {
      ...other('5', '17:10', '17:30'),
      annulled: { at: entryAt('annulled', '16:40').id, reason: 'x' },
    };
    expect(trackWords(turn, '5', tracks, [annulled])).toHaveLength(2);
  });
});
