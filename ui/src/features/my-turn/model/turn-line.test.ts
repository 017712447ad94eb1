import { at, aWireTurn, withDone } from '../testing/a-wire-turn';
import { openWords, turnLine } from './turn-line';

const out = (changes: Partial<NonNullable<ReturnType<typeof aWireTurn>['outbound']>>) => ({
  train: '1742',
  scheduledDepartureAt: at('17:40'),
  heldUntil: null,
  holdReason: null,
  expectedDepartureAt: null,
  actualDepartureAt: null,
  ...changes,
});

describe('a turn in a list', () => {
  it('says when and where, the trains and the set, and how much is recorded', () => {
    expect(turnLine(withDone(aWireTurn(), { 'handbrake-set': '17:20' }))).toEqual({
      when: '17:18 to 17:40, Track 3',
      trains: '1741 in, 1742 out, set 41',
      progress: '1 of 8 done',
    });
  });

  it('has words for a first train out, a tie-up, a hold, and a train without a track', () => {
    expect(turnLine(aWireTurn({ inbound: null })).when).toBe('leaves 17:40, Track 3');
    expect(turnLine(aWireTurn({ inbound: null })).trains).toBe('first train out, 1742 out, set 41');
    expect(turnLine(aWireTurn({ outbound: null, track: null, set: null }))).toMatchObject({
      when: '17:18, no track yet',
      trains: '1741 in, stays, tie-up',
    });
    expect(turnLine(aWireTurn({ outbound: out({ heldUntil: at('17:50') }) })).when).toBe(
      '17:18 to 17:50, Track 3',
    );
  });

  it('says what is open once the train has left, and nothing about it before', () => {
    const left = aWireTurn({
      outbound: out({ actualDepartureAt: at('17:40:10') }),
      steps: aWireTurn().steps.slice(7),
    });
    expect(turnLine(left).when).toBe('17:40 left, Track 3');
    expect(openWords(left)).toBe('1 open');
    expect(openWords(withDone(left, { 'running-test': '17:44' }))).toBeNull();
    expect(openWords(aWireTurn())).toBeNull();
  });

  it('shows no progress before anything has happened', () => {
    const coming = aWireTurn({
      inbound: {
        train: '1741',
        scheduledArrivalAt: at('18:25'),
        expectedArrivalAt: null,
        actualArrivalAt: null,
      },
    });
    expect(turnLine(coming).progress).toBe('');
  });
});
