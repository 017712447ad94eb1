import { aWireTurn, pushPullPlan, withDone } from '../testing/a-wire-turn';
import { handbrakesLeft, handbrakeView, shortCountTitle } from './handbrake-view';

const { steps } = pushPullPlan;
const set = withDone(
  aWireTurn(),
  { 'handbrake-set': '17:20' },
  { reading: { count: 2, cars: ['1408', '1412'] } },
);
const counts = (released: number, carsStillSet: string[]) => ({ set: 2, released, carsStillSet, log: [] });

describe('the handbrakes of a step', () => {
  it('are set on any car of the train', () => {
    const view = handbrakeView(aWireTurn(), steps, null, 'handbrake-set');
    expect(view).toMatchObject({ hand: 'set', released: [], shortCount: null });
    expect(view.cars).toHaveLength(8);
  });

  it('are released on the cars that have one set', () => {
    expect(handbrakeView(set, steps, counts(0, []), 'handbrake-released')).toEqual({
      hand: 'released',
      cars: ['1408', '1412'],
      released: [],
      shortCount: null,
    });
  });

  it('say which car is left when the counts differ', () => {
    const view = handbrakeView(set, steps, counts(1, ['1412']), 'handbrake-released');
    expect(view).toEqual({
      hand: 'released',
      cars: ['1408', '1412'],
      released: ['1408'],
      shortCount: { released: 1, set: 2, carsStillSet: ['1412'] },
    });
    expect(shortCountTitle({ released: 1, set: 2 })).toBe('1 of 2 handbrakes released');
    expect(handbrakesLeft({ released: 1, set: 2, carsStillSet: ['1412'] })).toBe('Car 1412 still set.');
    expect(handbrakesLeft({ released: 1, set: 3, carsStillSet: [] })).toBe('2 still set.');
  });

  it('are only counted where the record named no cars', () => {
    const bare = withDone(aWireTurn(), { 'handbrake-set': '17:20' }, { reading: { count: 2 } });
    expect(handbrakeView(bare, steps, counts(0, []), 'handbrake-released').cars).toEqual([]);
  });

  it('do not concern the other steps', () => {
    expect(handbrakeView(set, steps, counts(0, []), 'cab-brake-check')).toEqual({
      hand: null,
      cars: [],
      released: [],
      shortCount: null,
    });
  });
});
