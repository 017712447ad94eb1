import { defaultStepPlanSteps, type PlanStep } from '@stubpost/shared';
import { comparePlans, inForceOn } from './compare-plans';

const plan = (steps: PlanStep[]) => ({ steps });
const base = plan(defaultStepPlanSteps);
const changed = (key: string, change: Partial<PlanStep>) =>
  plan(defaultStepPlanSteps.map((step) => (step.key === key ? { ...step, ...change } : step)));

describe('two versions of a plan', () => {
  it('do not differ when nothing was changed', () => {
    expect(comparePlans(base, base)).toEqual([]);
  });

  it('show each changed field with both values', () => {
    expect(comparePlans(base, changed('ends-changed', { typicalSeconds: 240, offsetSeconds: 660 }))).toEqual([
      { step: 'Ends changed', what: 'Due', before: 'arrival + 10:00', after: 'arrival + 11:00' },
      {
        step: 'Ends changed',
        what: 'Short, typical, long',
        before: '2:00 – 3:30 – 7:00',
        after: '2:00 – 4:00 – 7:00',
      },
    ]);
  });

  it('show steps left out and new ones without calling the others moved', () => {
    const doors = { ...defaultStepPlanSteps[0]!, key: 'doors-closed', shortLabel: 'Doors closed' };
    const differences = comparePlans(base, plan([doors, ...defaultStepPlanSteps.slice(1)]));
    expect(differences).toEqual([
      { step: 'Handbrake set', what: 'Step', before: 'in the plan', after: 'left out' },
      { step: 'Doors closed', what: 'Step', before: 'not in the plan', after: 'new' },
    ]);
  });

  it('show a changed order', () => {
    const [first, second, ...rest] = defaultStepPlanSteps;
    expect(
      comparePlans(base, plan([second!, first!, ...rest])).map((each) => [
        each.step,
        each.what,
        each.before,
        each.after,
      ]),
    ).toEqual([
      ['Cab brake check', 'Place', '2', '1'],
      ['Handbrake set', 'Place', '1', '2'],
    ]);
  });
});

describe('the version in force', () => {
  const version = (effectiveFrom: string, number: number) => ({ effectiveFrom, version: number });
  const versions = [
    version('2000-01-01', 1),
    version('2026-03-01', 2),
    version('2026-03-01', 3),
    version('2026-06-01', 4),
  ];

  it.each([
    ['2026-02-28', 1],
    ['2026-03-01', 3],
    ['2026-05-31', 3],
    ['2026-06-01', 4],
  ])('on %s is version %i', (date, expected) => {
    expect(inForceOn(versions, date)?.version).toBe(expected);
  });

  it('is none before the first begins', () => {
    expect(inForceOn(versions, '1999-12-31')).toBeNull();
  });
});
