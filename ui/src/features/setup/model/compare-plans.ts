import { isInCab, type PlanStep, type WireStepPlan } from '@stubpost/shared';
import { formatAnchored, formatMinutes } from './minutes-text';

/** One thing that differs between two versions. */
export interface PlanDifference {
  step: string;
  what: string;
  before: string;
  after: string;
}

const list = (items: readonly string[]): string => (items.length === 0 ? 'nothing' : items.join(', '));
const yesNo = (value: boolean): string => (value ? 'yes' : 'no');

/** Every field of a step in words, in the order of the editor. */
export function stepFacts(step: PlanStep): [what: string, value: string][] {
  return [
    ['Name', step.label],
    ['Short name', step.shortLabel],
    ['Kind', step.kind],
    ['Done by', step.doer],
    ['Where', step.place],
    ['Due', formatAnchored(step.anchor, step.offsetSeconds)],
    [
      'Short, typical, long',
      [step.shortSeconds, step.typicalSeconds, step.longSeconds].map(formatMinutes).join(' – '),
    ],
    ['After', list(step.after)],
    [
      'Not before',
      step.notBeforeSeconds === null ? 'any time' : formatAnchored('departure', step.notBeforeSeconds),
    ],
    ['Tolerance', formatMinutes(step.toleranceSeconds)],
    ['Holds the departure', yesNo(step.holdsDeparture)],
    ['Reads off', list(step.reads)],
    ['In the controlling cab', yesNo(isInCab(step))],
    ['Instruction', step.instruction ?? 'none'],
  ];
}

/** What is different in `after` against `before`: steps gone, steps new, steps moved, fields changed. */
export function comparePlans(
  before: Pick<WireStepPlan, 'steps'>,
  after: Pick<WireStepPlan, 'steps'>,
): PlanDifference[] {
  const place = (steps: readonly PlanStep[], key: string): number =>
    steps.filter((step) => keysOf(before, after).has(step.key)).findIndex((step) => step.key === key);
  const gone = before.steps
    .filter((step) => !after.steps.some((other) => other.key === step.key))
    .map((step): PlanDifference => ({
      step: step.shortLabel,
      what: 'Step',
      before: 'in the plan',
      after: 'left out',
    }));
  const rest = after.steps.flatMap((step): PlanDifference[] => {
    const old = before.steps.find((other) => other.key === step.key);
    if (old === undefined)
      return [{ step: step.shortLabel, what: 'Step', before: 'not in the plan', after: 'new' }];
    const [from, to] = [place(before.steps, step.key), place(after.steps, step.key)];
    const moved =
      from === to
        ? []
        : [{ step: step.shortLabel, what: 'Place', before: String(from + 1), after: String(to + 1) }];
    return [...moved, ...changedFacts(old, step)];
  });
  return [...gone, ...rest];
}

/** Keys that both versions have: places are counted among these, so that one new step does not move all others. */
function keysOf(before: Pick<WireStepPlan, 'steps'>, after: Pick<WireStepPlan, 'steps'>): Set<string> {
  const known = new Set(before.steps.map((step) => step.key));
  return new Set(after.steps.map((step) => step.key).filter((key) => known.has(key)));
}

function changedFacts(old: PlanStep, step: PlanStep): PlanDifference[] {
  const before = new Map(stepFacts(old));
  return stepFacts(step).flatMap(([what, value]): PlanDifference[] => {
    const was = before.get(what) ?? '';
    return was === value ? [] : [{ step: step.shortLabel, what, before: was, after: value }];
  });
}

/** The version in force on a service date: of those that have begun the one that began last, then the newest. */
export function inForceOn<Version extends Pick<WireStepPlan, 'effectiveFrom' | 'version'>>(
  versions: readonly Version[],
  date: string,
): Version | null {
  const begun = versions.filter((version) => version.effectiveFrom <= date);
  const sorted = [...begun].sort(
    (a, b) => b.effectiveFrom.localeCompare(a.effectiveFrom) || b.version - a.version,
  );
  return sorted[0] ?? null;
}
