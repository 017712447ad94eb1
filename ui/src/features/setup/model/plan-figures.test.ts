import { defaultStepPlanSteps } from '@stubpost/shared';
import { planFigures } from './plan-figures';

describe('the figures of a plan', () => {
  it('are those of the default plan', () => {
    const { shortestSeconds, latestFinishes } = planFigures(defaultStepPlanSteps, false);
    expect(shortestSeconds).toBe(520);
    expect(
      Object.fromEntries(latestFinishes?.map((each) => [each.key, each.secondsFromDeparture]) ?? []),
    ).toEqual({
      'leaving-end-test': 0,
      'brakes-released': -45,
      'handbrake-released': -105,
      'engineer-in-cab': -155,
      'ends-changed': -175,
      'cab-brake-check': -385,
      'handbrake-set': -445,
      'running-test': 300,
    });
  });

  it('grow with a typical duration', () => {
    const slower = defaultStepPlanSteps.map((step) =>
      step.key === 'ends-changed' ? { ...step, typicalSeconds: 240 } : step,
    );
    expect(planFigures(slower, false).shortestSeconds).toBe(550);
  });

  it('leave the latest finishes out while the plan does not hold together', () => {
    expect(planFigures(defaultStepPlanSteps, true).latestFinishes).toBeNull();
  });
});
