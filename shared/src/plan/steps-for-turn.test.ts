import { describe, expect, it } from 'vitest';
import { aStep } from '../testing/builders';
import { defaultStepPlanSteps } from './default-step-plan';
import { rolesOf } from './step-roles';
import { shortestTurnSeconds, stepsFor } from './steps-for-turn';

const keysOf = (steps: readonly { key: string }[]): string[] => steps.map((step) => step.key);

describe('the steps of a turn', () => {
  it('are all of the plan for a train that comes in and goes out', () => {
    expect(stepsFor(defaultStepPlanSteps, { kind: 'turn', reverses: true })).toEqual(defaultStepPlanSteps);
  });

  it('are all of the plan where it is not known whether the train reverses', () => {
    expect(stepsFor(defaultStepPlanSteps, { kind: 'turn', reverses: null })).toHaveLength(8);
  });

  it('are none for a pair that is known not to reverse', () => {
    expect(stepsFor(defaultStepPlanSteps, { kind: 'turn', reverses: false })).toEqual([]);
  });

  it('are those counted from the departure for a first train out, without predecessors that are gone', () => {
    const steps = stepsFor(defaultStepPlanSteps, { kind: 'first-out', reverses: null });
    expect(steps.map((step) => [step.key, step.after])).toEqual([
      ['engineer-in-cab', []],
      ['handbrake-released', ['engineer-in-cab']],
      ['brakes-released', ['handbrake-released']],
      ['leaving-end-test', ['brakes-released']],
      ['running-test', ['departure']],
    ]);
  });

  it('are the securement alone for a tie-up', () => {
    expect(keysOf(stepsFor(defaultStepPlanSteps, { kind: 'tie-up', reverses: null }))).toEqual([
      'handbrake-set',
    ]);
  });

  it('are the same list for the same question, so that work done on them once is not done again', () => {
    const question = { kind: 'first-out', reverses: true } as const;
    expect(stepsFor(defaultStepPlanSteps, question)).toBe(stepsFor(defaultStepPlanSteps, { ...question }));
  });

  it('stay the same when they are asked for again from themselves', () => {
    for (const kind of ['turn', 'first-out', 'tie-up'] as const) {
      const steps = stepsFor(defaultStepPlanSteps, { kind, reverses: true });
      expect(stepsFor(steps, { kind, reverses: true })).toEqual(steps);
    }
  });
});

describe('the shortest turn', () => {
  it('takes 520 s with the default plan: 75 + 60 + 210 + 20 + 50 + 60 + 45', () => {
    expect(shortestTurnSeconds(defaultStepPlanSteps)).toBe(520);
  });

  it('takes 175 s for a first train out: 20 + 50 + 60 + 45', () => {
    expect(shortestTurnSeconds(stepsFor(defaultStepPlanSteps, { kind: 'first-out', reverses: null }))).toBe(
      175,
    );
  });

  it('is the longer of two branches and leaves out what holds nothing', () => {
    const steps = [
      aStep({ key: 'a', typicalSeconds: 100 }),
      aStep({ key: 'b', typicalSeconds: 40 }),
      aStep({ key: 'c', typicalSeconds: 30, after: ['a', 'b'] }),
      aStep({ key: 'sweep', typicalSeconds: 900, holdsDeparture: false }),
    ];
    expect(shortestTurnSeconds(steps)).toBe(130);
  });

  it('is 0 without steps', () => {
    expect(shortestTurnSeconds([])).toBe(0);
  });
});

describe('the roles of the default plan', () => {
  it('come from kind and anchor of each step', () => {
    const roles = rolesOf(defaultStepPlanSteps);
    expect(keysOf(roles.secure)).toEqual(['handbrake-set']);
    expect(keysOf(roles.changeEnds)).toEqual(['ends-changed']);
    expect(keysOf(roles.manCab)).toEqual(['engineer-in-cab']);
    expect(keysOf(roles.release)).toEqual(['handbrake-released']);
    expect(keysOf(roles.runningTest)).toEqual(['running-test']);
    expect(keysOf(roles.hold)).toEqual([
      'handbrake-set',
      'cab-brake-check',
      'ends-changed',
      'engineer-in-cab',
      'handbrake-released',
      'brakes-released',
      'leaving-end-test',
    ]);
    expect([...roles.afterDeparture]).toEqual(['running-test']);
  });
});
