import { defaultStepPlanSteps, planStepSchema } from '@stubpost/shared';
import {
  draftOfStep,
  keyFromName,
  newStepDraft,
  readPlan,
  withChanged,
  withMoved,
  withoutStep,
  type StepDraft,
} from './plan-draft';

const drafts = (): StepDraft[] => defaultStepPlanSteps.map((step) => draftOfStep(step, `row-${step.key}`));
const edited = (key: string, change: Partial<StepDraft>): StepDraft[] =>
  withChanged(drafts(), `row-${key}`, change);
const words = (rows: StepDraft[]): string[] =>
  readPlan(rows).problems.map((problem) => `${problem.field ?? 'plan'}: ${problem.words}`);

describe('a plan being edited', () => {
  it('reads back as the plan it was', () => {
    const { steps, problems } = readPlan(drafts());
    expect(problems).toEqual([]);
    expect(steps).toEqual(defaultStepPlanSteps);
    expect(steps.every((step) => planStepSchema.safeParse(step).success)).toBe(true);
  });

  it('says what is typed wrongly beside the field, and does not repeat what follows from it', () => {
    expect(words(edited('handbrake-set', { typical: '75', label: ' ' }))).toEqual([
      'label: Name is missing.',
      'typical: Typical: minutes and seconds, such as 1:15.',
    ]);
    expect(words(edited('handbrake-set', { tolerance: '61:00' }))).toEqual([
      'tolerance: Tolerance: between 0:00 and 60:00.',
    ]);
    expect(words(edited('handbrake-set', { key: 'Hand Brake' }))[0]).toBe(
      'key: Key: small letters, digits and dashes, a letter first.',
    );
  });

  it('keeps the railroad’s own words, and where the step is recorded only when the place does not say it', () => {
    const [first] = readPlan(edited('handbrake-set', { instruction: ' Count aloud. ', inCab: true })).steps;
    expect(first).toMatchObject({ instruction: 'Count aloud.', inCab: true });
    expect(planStepSchema.safeParse(first).success).toBe(true);
    expect(readPlan(edited('handbrake-set', { inCab: false })).steps[0]).not.toHaveProperty('inCab');
    expect(words(edited('handbrake-set', { instruction: 'x'.repeat(2001) }))).toEqual([
      'instruction: Instruction: at most 2000 characters.',
    ]);
  });

  it('puts each finding of the core beside its field', () => {
    expect(readPlan(edited('handbrake-set', { after: ['ends-changed'] })).problems[0]?.field).toBe('after');
    expect(readPlan(edited('handbrake-set', { short: '2:00' })).problems[0]?.field).toBe('typical');
    expect(readPlan(edited('running-test', { holdsDeparture: true })).problems[0]?.field).toBe(
      'holdsDeparture',
    );
    expect(readPlan(edited('handbrake-set', { notBefore: '−6:00' })).problems[0]?.field).toBe('notBefore');
    expect(readPlan([]).problems).toEqual([{ stepId: null, field: null, words: 'The plan has no steps.' }]);
  });

  it('finds everything missing in a new row', () => {
    const fields = readPlan([...drafts(), newStepDraft('row-new')]).problems.map(({ field }) => field);
    expect(fields).toEqual(['label', 'shortLabel', 'key', 'offset', 'short', 'typical', 'long']);
  });

  it('lets those that wait for a step follow its new key, and forget it when it goes', () => {
    const renamed = readPlan(edited('handbrake-set', { key: 'chocks' })).steps;
    expect(renamed.find((step) => step.key === 'cab-brake-check')?.after).toEqual(['chocks']);
    const without = readPlan(withoutStep(drafts(), 'row-handbrake-set')).steps;
    expect(without.find((step) => step.key === 'cab-brake-check')?.after).toEqual([]);
  });

  it('moves rows, and not past the ends', () => {
    const keys = (rows: StepDraft[]): string[] => rows.map((row) => row.key).slice(0, 2);
    expect(keys(withMoved(drafts(), 'row-handbrake-set', 1))).toEqual(['cab-brake-check', 'handbrake-set']);
    expect(keys(withMoved(drafts(), 'row-handbrake-set', -1))).toEqual(['handbrake-set', 'cab-brake-check']);
  });

  it.each([
    ['Doors closed', 'doors-closed'],
    ['  2nd look: lights!', 'nd-look-lights'],
    ['x'.repeat(60), 'x'.repeat(40)],
    ['…', ''],
  ])('makes a key of the name %j', (name, key) => {
    expect(keyFromName(name)).toBe(key);
  });
});
