import { at, aWireTurn, pushPullPlan, withDone } from '../testing/a-wire-turn';
import {
  emptyTieUp,
  leftHandbrakes,
  leftWords,
  recordedHandbrakes,
  securementGaps,
  tieUpWaitsFor,
  turnsToTieUp,
} from './tie-up';

const { steps } = pushPullPlan;
const reading = { count: 2, cars: ['1408', '1412'] };
const secured = withDone(aWireTurn(), { 'handbrake-set': '17:19:52' }, { reading });
const said = { ...emptyTieUp, cars: ['1408', '1412'], offAir: true };

describe('handbrakes on record', () => {
  it('are those of the set step', () => {
    expect(recordedHandbrakes(secured, steps)).toEqual(reading);
    expect(recordedHandbrakes(aWireTurn(), steps)).toBeNull();
  });

  it('are fewer by those released, and none when all are off', () => {
    const released = (count: number, carsStillSet: string[]) => ({
      ...secured,
      securement: { set: 2, released: count, carsStillSet, unsecuredSince: null },
    });
    expect(recordedHandbrakes(released(1, ['1412']), steps)).toEqual({ count: 1, cars: ['1412'] });
    expect(recordedHandbrakes(released(2, []), steps)).toBeNull();
  });
});

describe('a tie-up', () => {
  it('starts with nothing said', () => {
    expect(leftHandbrakes(emptyTieUp)).toBeNull();
    expect(tieUpWaitsFor(emptyTieUp, [], '')).toBe('waits for the handbrakes');
    expect(tieUpWaitsFor({ ...emptyTieUp, cars: ['1408'] }, [], '')).toBe('waits for the air');
  });

  it('goes through without a reason when the securement is recorded', () => {
    expect(securementGaps(secured, steps, said)).toEqual([]);
    expect(tieUpWaitsFor(said, [], '')).toBeNull();
  });

  it('asks for a reason while a securement step is open or no handbrake stands set', () => {
    const gaps = securementGaps(aWireTurn(), steps, said);
    expect(gaps).toEqual(['Handbrake set: not recorded.']);
    expect(tieUpWaitsFor(said, gaps, '')).toBe('waits for the reason');
    expect(tieUpWaitsFor(said, gaps, 'Mechanical has the set')).toBeNull();
    expect(securementGaps(secured, steps, { ...said, cars: [] })).toEqual(['No handbrake stands set.']);
  });

  it('says what is left in words', () => {
    expect(leftWords(reading)).toBe('2 handbrakes, cars 1408 and 1412');
    expect(leftWords({ count: 0, cars: [] })).toBe('no handbrake');
  });
});

it('sets that stand here are offered, tie-ups first, and none that has left or has not come', () => {
  const tieUp = { ...secured, id: 'b', kind: 'tie-up' as const, outbound: null };
  const gone = {
    ...secured,
    id: 'c',
    outbound: secured.outbound && { ...secured.outbound, actualDepartureAt: at('17:40') },
  };
  const coming = {
    ...secured,
    id: 'd',
    inbound: secured.inbound && { ...secured.inbound, actualArrivalAt: null },
  };
  expect(turnsToTieUp([secured, gone, coming, tieUp]).map(({ id }) => id)).toEqual(['b', secured.id]);
});
