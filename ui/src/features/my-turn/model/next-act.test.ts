import { at, aWireTurn, pushPullPlan, withDone } from '../testing/a-wire-turn';
import { actKey, missingBefore, nextAct } from './next-act';

const beforeDeparture = {
  'handbrake-set': '17:19:52',
  'cab-brake-check': '17:23:08',
  'ends-changed': '17:27:31',
  'engineer-in-cab': '17:34:38',
  'handbrake-released': '17:35:30',
  'brakes-released': '17:37:20',
  'leaving-end-test': '17:38:30',
};
const notIn = {
  train: '1741',
  scheduledArrivalAt: at('17:18'),
  expectedArrivalAt: null,
  actualArrivalAt: null,
};
const left = {
  train: '1742',
  scheduledDepartureAt: at('17:40'),
  heldUntil: null,
  holdReason: null,
  expectedDepartureAt: null,
  actualDepartureAt: at('17:40:10'),
};
const key = (turn: ReturnType<typeof aWireTurn>): string => actKey(nextAct(turn, pushPullPlan.steps));

describe('the next act', () => {
  it('is the arrival while the train is not recorded as in', () => {
    expect(key(aWireTurn({ inbound: notIn }))).toBe('arrival');
  });

  it.each(
    Object.keys(beforeDeparture).map((_, index, keys) => ({ done: keys.slice(0, index), next: keys[index] })),
  )('follows the plan one step at a time: $next', ({ done, next }) => {
    const times = Object.fromEntries(done.map((each) => [each, '17:20']));
    expect(key(withDone(aWireTurn(), times))).toBe(`step:${next ?? ''}`);
  });

  it('is the departure when every step before it is recorded', () => {
    expect(key(withDone(aWireTurn(), beforeDeparture))).toBe('departure');
  });

  it('is the running test once the train has left, and nothing once that is recorded', () => {
    const gone = withDone(aWireTurn({ outbound: left }), beforeDeparture);
    expect(key(gone)).toBe('step:running-test');
    expect(nextAct(withDone(gone, { 'running-test': '17:44' }), pushPullPlan.steps)).toEqual({
      kind: 'nothing',
      why: 'all-recorded',
    });
  });

  it('puts a step that was left out behind the running test once the train has left', () => {
    const { 'cab-brake-check': _left, ...rest } = beforeDeparture;
    const gone = withDone(aWireTurn({ outbound: left }), rest);
    expect(key(gone)).toBe('step:running-test');
    expect(key(withDone(gone, { 'running-test': '17:44' }))).toBe('step:cab-brake-check');
  });

  it('does not ask for the arrival of a first-out nor for the departure of a tie-up', () => {
    const firstOut = aWireTurn({ kind: 'first-out', inbound: null, steps: aWireTurn().steps.slice(3) });
    expect(key(firstOut)).toBe('step:engineer-in-cab');
    const tieUp = withDone(
      aWireTurn({ kind: 'tie-up', outbound: null, steps: aWireTurn().steps.slice(0, 1) }),
      { 'handbrake-set': '17:20' },
    );
    expect(nextAct(tieUp, pushPullPlan.steps)).toEqual({ kind: 'nothing', why: 'tied-up' });
  });

  it('takes the open step with the earliest latest finish where two could be next', () => {
    const steps = pushPullPlan.steps.map((step) =>
      step.key === 'cab-brake-check' ? { ...step, after: ['arrival'] } : step,
    );
    const turn = aWireTurn();
    turn.steps = turn.steps.map((step) =>
      step.key === 'cab-brake-check' ? { ...step, latestFinishAt: at('17:21') } : step,
    );
    expect(actKey(nextAct(turn, steps))).toBe('step:cab-brake-check');
  });

  it('stays with a step whose count is short, and goes on past a step in question', () => {
    const done = withDone(aWireTurn(), { 'handbrake-set': '17:20', 'cab-brake-check': '17:23' });
    const inQuestion = {
      ...done,
      steps: done.steps.map((step) =>
        step.key === 'cab-brake-check' ? { ...step, state: 'in-question' as const } : step,
      ),
    };
    expect(key(inQuestion)).toBe('step:ends-changed');
    const short = {
      ...done,
      steps: done.steps.map((step) =>
        step.key === 'cab-brake-check' ? { ...step, state: 'overdue' as const } : step,
      ),
    };
    expect(key(short)).toBe('step:cab-brake-check');
  });

  it('names what is missing before a step picked out of order', () => {
    expect(missingBefore(aWireTurn(), pushPullPlan.steps, 'ends-changed')).toEqual(['Cab brake check']);
    expect(missingBefore(aWireTurn({ inbound: notIn }), pushPullPlan.steps, 'handbrake-set')).toEqual([
      'Stopped at marker',
    ]);
    expect(missingBefore(aWireTurn(), pushPullPlan.steps, 'running-test')).toEqual(['Departed']);
  });

  it('has nothing to record on an annulled turn', () => {
    expect(
      nextAct(aWireTurn({ annulled: { at: at('17:00'), reason: 'No set' } }), pushPullPlan.steps),
    ).toEqual({
      kind: 'nothing',
      why: 'annulled',
    });
  });
});
