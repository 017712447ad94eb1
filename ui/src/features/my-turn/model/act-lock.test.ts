import { at, aWireStep, aWireTurn, ms, pushPullPlan, withDone } from '../testing/a-wire-turn';
import { lockOf } from './act-lock';

const { steps } = pushPullPlan;
const lock = (key: string, turn = aWireTurn(), clock = '17:22:41') =>
  lockOf({ turn, steps, act: { kind: 'step', step: aWireStep(key) }, now: ms(clock), asksBriefing: false });
const tillEnds = { 'handbrake-set': '17:20', 'cab-brake-check': '17:23', 'ends-changed': '17:27' };
const blue = { blueSignal: { since: at('17:30'), by: 'Marsh' } };

describe('the bar is shut', () => {
  it('while a step before it is not recorded, and names it', () => {
    expect(lock('ends-changed')).toEqual({ kind: 'missing', labels: ['Cab brake check'] });
    expect(lock('handbrake-set')).toBeNull();
  });

  it('for everything counted from the departure while a blue signal is up, not for securing the train', () => {
    const turn = withDone(aWireTurn(blue), tillEnds);
    expect(lock('engineer-in-cab', turn, '17:35')).toEqual({
      kind: 'blue-signal',
      since: at('17:30'),
      by: 'Marsh',
    });
    expect(
      lockOf({ turn, steps, act: { kind: 'departure' }, now: ms('17:40'), asksBriefing: false })?.kind,
    ).toBe('blue-signal');
    expect(lock('handbrake-set', aWireTurn(blue))).toBeNull();
  });

  it('before the not-before time, counted from the departure or the hold', () => {
    const turn = withDone(aWireTurn(), tillEnds);
    expect(lock('engineer-in-cab', turn, '17:33:59')).toEqual({ kind: 'too-early', notBefore: ms('17:34') });
    expect(lock('engineer-in-cab', turn, '17:34')).toBeNull();
    const held = withDone(
      aWireTurn({
        outbound: {
          train: '1742',
          scheduledDepartureAt: at('17:40'),
          heldUntil: at('17:50'),
          holdReason: 'Connection',
          expectedDepartureAt: null,
          actualDepartureAt: null,
        },
      }),
      tillEnds,
    );
    expect(lock('engineer-in-cab', held, '17:40')).toEqual({ kind: 'too-early', notBefore: ms('17:44') });
  });

  it('for a departure while a step the train waits for is open', () => {
    const turn = withDone(aWireTurn(), tillEnds);
    expect(
      lockOf({ turn, steps, act: { kind: 'departure' }, now: ms('17:40'), asksBriefing: false }),
    ).toEqual({
      kind: 'missing',
      labels: ['In leaving cab', 'Handbrake off', 'Air charged', 'Leaving-end test'],
    });
  });

  it('never once the train has left: what happened before is entered later', () => {
    const left = aWireTurn({
      ...blue,
      outbound: {
        train: '1742',
        scheduledDepartureAt: at('17:40'),
        heldUntil: null,
        holdReason: null,
        expectedDepartureAt: null,
        actualDepartureAt: at('17:40'),
      },
    });
    expect(lock('ends-changed', left, '17:45')).toBeNull();
  });
});
