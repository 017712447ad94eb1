import { pushPullPlan } from '../testing/a-wire-turn';
import { barWords, doerLine } from './act-words';

const step = (key: string) => pushPullPlan.steps.find((each) => each.key === key) ?? pushPullPlan.steps[0]!;

describe('the words of an act', () => {
  it('say who makes a step and who records it', () => {
    expect(doerLine(step('handbrake-set'), 'conductor')).toBe('Yours to make and to record.');
    expect(doerLine(step('cab-brake-check'), 'conductor')).toBe('The engineer makes it, you record it.');
    expect(doerLine(step('handbrake-set'), 'engineer')).toBe('The conductor makes it, you record it.');
  });

  it('put what was touched and typed on the bar', () => {
    expect(barWords('Handbrake set', 'set', { count: 2, cars: ['1408', '1412'] })).toBe('Set: 1408 and 1412');
    expect(barWords('Handbrake off', 'released', { count: 2 })).toBe('Released: 2 handbrakes');
    expect(barWords('Air charged', null, { brakePipePsi: 110 })).toBe('Air charged: 110 psi');
    expect(barWords('Air charged', null, undefined)).toBe('Air charged');
  });
});
