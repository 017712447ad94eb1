import { describe, expect, it } from 'vitest';
import { aStep } from '../testing/builders';
import { checkPlan } from './check-plan';
import { defaultStepPlanSteps } from './default-step-plan';
import type { PlanStep } from './step-plan';

const running = aStep({
  key: 'running',
  kind: 'brake-test',
  anchor: 'departure',
  after: ['departure'],
  holdsDeparture: false,
});

describe('a plan', () => {
  it('that is shipped has nothing wrong with it', () => {
    expect(checkPlan(defaultStepPlanSteps)).toEqual([]);
  });

  it.each<[name: string, steps: PlanStep[], problems: [code: string, step: string | null][]]>([
    ['has no steps', [], [['plan.no_steps', null]]],
    ['uses a key twice', [aStep(), aStep()], [['plan.duplicate_key', 'step']]],
    [
      'calls a step by the word for the arrival',
      [aStep({ key: 'arrival', after: [] })],
      [['plan.reserved_key', 'arrival']],
    ],
    [
      'waits for a step that is not there',
      [aStep({ after: ['lunch'] })],
      [['plan.unknown_predecessor', 'step']],
    ],
    ['has a step that waits for itself', [aStep({ after: ['step'] })], [['plan.cycle', 'step']]],
    [
      'goes in a circle beside a good step',
      [aStep({ key: 'good' }), aStep({ key: 'a', after: ['good', 'b'] }), aStep({ key: 'b', after: ['a'] })],
      [['plan.cycle', 'a']],
    ],
    ['has a typical time below the short one', [aStep({ shortSeconds: 61 })], [['plan.durations', 'step']]],
    ['has a long time below the typical one', [aStep({ longSeconds: 59 })], [['plan.durations', 'step']]],
    ['has a time below 0', [aStep({ shortSeconds: -1 })], [['plan.durations', 'step']]],
    ['has half seconds', [aStep({ typicalSeconds: 60.5 })], [['plan.durations', 'step']]],
    [
      'has a not-before time on a step counted from the arrival',
      [aStep({ notBeforeSeconds: -360 })],
      [['plan.not_before', 'step']],
    ],
    [
      'lets a step after the departure hold it',
      [{ ...running, holdsDeparture: true }],
      [['plan.after_departure_holds', 'running']],
    ],
    [
      'counts a step from the arrival that comes after the departure by way of another',
      [running, aStep({ key: 'later', after: ['running'], holdsDeparture: false })],
      [['plan.arrival_after_departure', 'later']],
    ],
  ])('that %s is told so', (_, steps, problems) => {
    expect(checkPlan(steps).map(({ code, step }) => [code, step])).toEqual(problems);
  });

  it('names every step of a circle', () => {
    const steps = [
      aStep({ key: 'a', label: 'Ask', after: ['b'] }),
      aStep({ key: 'b', label: 'Answer', after: ['a'] }),
    ];
    expect(checkPlan(steps)[0]?.message).toBe('Ask, Answer: these steps wait for one another.');
  });

  it('accepts equal durations and a step of no length', () => {
    expect(checkPlan([aStep({ shortSeconds: 0, typicalSeconds: 0, longSeconds: 0 })])).toEqual([]);
  });
});
