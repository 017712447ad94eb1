import {
  checkPlan,
  isInCab,
  longestInstruction,
  type Anchor,
  type Doer,
  type Place,
  type PlanProblemCode,
  type PlanStep,
  type ReadingKey,
  type StepKind,
} from '@stubpost/shared';
import { formatMinutes, parseMinutes } from './minutes-text';

/** A step while it is edited: times as they are typed. `id` is the row's own and never changes. */
export interface StepDraft {
  id: string;
  key: string;
  label: string;
  shortLabel: string;
  kind: StepKind;
  doer: Doer;
  place: Place;
  anchor: Anchor;
  offset: string;
  short: string;
  typical: string;
  long: string;
  /** Keys of steps, and the words `arrival` and `departure`. */
  after: string[];
  /** Empty where the step may begin at any time. */
  notBefore: string;
  tolerance: string;
  holdsDeparture: boolean;
  reads: ReadingKey[];
  /** Recorded from the controlling cab. */
  inCab: boolean;
  /** Empty where the railroad has written nothing about the step. */
  instruction: string;
}

export type StepField = Exclude<keyof StepDraft, 'id'>;

/** Something to mend, beside the field it stands in; `stepId` null for the plan as a whole. */
export interface DraftProblem {
  stepId: string | null;
  field: StepField | null;
  words: string;
}

/** A step of a plan, ready to be edited. */
export function draftOfStep(step: PlanStep, id: string): StepDraft {
  const {
    offsetSeconds,
    shortSeconds,
    typicalSeconds,
    longSeconds,
    notBeforeSeconds,
    toleranceSeconds,
    ...rest
  } = step;
  return {
    ...rest,
    id,
    after: [...step.after],
    reads: [...step.reads],
    inCab: isInCab(step),
    instruction: step.instruction ?? '',
    offset: formatMinutes(offsetSeconds),
    short: formatMinutes(shortSeconds),
    typical: formatMinutes(typicalSeconds),
    long: formatMinutes(longSeconds),
    notBefore: notBeforeSeconds === null ? '' : formatMinutes(notBeforeSeconds),
    tolerance: formatMinutes(toleranceSeconds),
  };
}

/** An empty row after the others. */
export function newStepDraft(id: string): StepDraft {
  return {
    id,
    key: '',
    label: '',
    shortLabel: '',
    kind: 'brake-test',
    doer: 'engineer',
    place: 'cab',
    anchor: 'departure',
    offset: '',
    short: '',
    typical: '',
    long: '',
    after: [],
    notBefore: '',
    tolerance: '1:00',
    holdsDeparture: true,
    reads: [],
    inCab: true,
    instruction: '',
  };
}

/** Limits of the wire, in seconds. */
const offsetLimit = 14_400;
const durationLimit = 7200;
const longLimit = 14_400;
const toleranceLimit = 3600;

type Times = Pick<
  PlanStep,
  | 'offsetSeconds'
  | 'shortSeconds'
  | 'typicalSeconds'
  | 'longSeconds'
  | 'notBeforeSeconds'
  | 'toleranceSeconds'
>;

const keyForm = /^[a-z][a-z0-9-]{0,39}$/;

function textProblems(draft: StepDraft): DraftProblem[] {
  const problem = (field: StepField, words: string): DraftProblem => ({ stepId: draft.id, field, words });
  const problems: DraftProblem[] = [];
  if (draft.label.trim() === '') problems.push(problem('label', 'Name is missing.'));
  if (draft.label.trim().length > 120) problems.push(problem('label', 'Name: at most 120 characters.'));
  if (draft.shortLabel.trim() === '') problems.push(problem('shortLabel', 'Short name is missing.'));
  if (draft.shortLabel.trim().length > 30)
    problems.push(problem('shortLabel', 'Short name: at most 30 characters.'));
  if (draft.instruction.trim().length > longestInstruction)
    problems.push(problem('instruction', `Instruction: at most ${longestInstruction} characters.`));
  if (!keyForm.test(draft.key))
    problems.push(problem('key', 'Key: small letters, digits and dashes, a letter first.'));
  return problems;
}

const asMinutes = 'minutes and seconds, such as 1:15';

function readTimes(draft: StepDraft): { times: Times; problems: DraftProblem[] } {
  const problems: DraftProblem[] = [];
  const read = (field: StepField, name: string, text: string, lowest: number, highest: number): number => {
    const seconds = parseMinutes(text);
    if (seconds === null) problems.push({ stepId: draft.id, field, words: `${name}: ${asMinutes}.` });
    else if (seconds < lowest || seconds > highest) {
      const words = `${name}: between ${formatMinutes(lowest)} and ${formatMinutes(highest)}.`;
      problems.push({ stepId: draft.id, field, words });
    }
    return seconds ?? 0;
  };
  const times = {
    offsetSeconds: read('offset', 'Due', draft.offset, -offsetLimit, offsetLimit),
    shortSeconds: read('short', 'Short', draft.short, 0, durationLimit),
    typicalSeconds: read('typical', 'Typical', draft.typical, 0, durationLimit),
    longSeconds: read('long', 'Long', draft.long, 0, longLimit),
    notBeforeSeconds:
      draft.notBefore.trim() === ''
        ? null
        : read('notBefore', 'Not before', draft.notBefore, -offsetLimit, 0),
    toleranceSeconds: read('tolerance', 'Tolerance', draft.tolerance, 0, toleranceLimit),
  };
  return { times, problems };
}

/** The step as it stands; where a time cannot be read it is 0, and a problem says so. */
function stepOfDraft(draft: StepDraft, times: Times): PlanStep {
  const { key, label, shortLabel, kind, doer, place, anchor, after, holdsDeparture, reads, inCab } = draft;
  const instruction = draft.instruction.trim();
  return {
    key,
    label: label.trim(),
    shortLabel: shortLabel.trim(),
    kind,
    doer,
    place,
    anchor,
    after,
    holdsDeparture,
    reads,
    ...times,
    ...(inCab === isInCab({ place }) ? {} : { inCab }),
    ...(instruction === '' ? {} : { instruction }),
  };
}

/** Field beside which each problem of the core is shown. */
const fieldOfCode: Record<PlanProblemCode, StepField | null> = {
  'plan.no_steps': null,
  'plan.duplicate_key': 'key',
  'plan.reserved_key': 'key',
  'plan.unknown_predecessor': 'after',
  'plan.cycle': 'after',
  'plan.durations': 'typical',
  'plan.not_before': 'notBefore',
  'plan.after_departure_holds': 'holdsDeparture',
  'plan.arrival_after_departure': 'anchor',
};

/** A plan as typed: its steps, and everything that is wrong with them in the order of the rows. */
export interface ReadPlan {
  steps: PlanStep[];
  problems: DraftProblem[];
}

/** Reads the rows of a plan: what is typed wrongly first, then what the core's own check finds in the whole. */
export function readPlan(drafts: readonly StepDraft[]): ReadPlan {
  const read = drafts.map((draft) => ({ draft, ...readTimes(draft) }));
  const steps = read.map(({ draft, times }) => stepOfDraft(draft, times));
  const typed = read.flatMap(({ draft, problems }) => [...textProblems(draft), ...problems]);
  const unread = new Set(
    typed
      .filter(({ field }) => !['label', 'shortLabel', 'instruction'].includes(field ?? ''))
      .map(({ stepId }) => stepId),
  );
  const checked = checkPlan(steps).flatMap((problem): DraftProblem[] => {
    const stepId = drafts.find((draft) => draft.key === problem.step)?.id ?? null;
    const field = fieldOfCode[problem.code];
    // A time that could not be read stands as 0: what follows from that is not worth saying.
    const isEcho = problem.code === 'plan.durations' && unread.has(stepId);
    return isEcho ? [] : [{ stepId, field, words: problem.message }];
  });
  return { steps, problems: [...typed, ...checked] };
}

/** A key made of a name, for a new step: "Doors closed" is "doors-closed". */
export function keyFromName(name: string): string {
  const key = name
    .toLowerCase()
    .replace(/[^a-z0-9]+/g, '-')
    .replace(/^[^a-z]+|-+$/g, '');
  return key.slice(0, 40).replace(/-+$/, '');
}

/** The rows with one moved up (−1) or down (1); unchanged at the ends. */
export function withMoved(drafts: readonly StepDraft[], id: string, by: -1 | 1): StepDraft[] {
  const at = drafts.findIndex((draft) => draft.id === id);
  const to = at + by;
  const moved = drafts[at];
  if (moved === undefined || to < 0 || to >= drafts.length) return [...drafts];
  return drafts.toSpliced(at, 1).toSpliced(to, 0, moved);
}

/** The rows without one; others no longer wait for it. */
export function withoutStep(drafts: readonly StepDraft[], id: string): StepDraft[] {
  const gone = drafts.find((draft) => draft.id === id);
  return drafts
    .filter((draft) => draft.id !== id)
    .map((draft) => ({ ...draft, after: draft.after.filter((key) => key !== gone?.key) }));
}

/** The rows with one changed; when its key changes, those that wait for it follow. */
export function withChanged(
  drafts: readonly StepDraft[],
  id: string,
  change: Partial<StepDraft>,
): StepDraft[] {
  const before = drafts.find((draft) => draft.id === id)?.key;
  const newKey = change.key;
  return drafts.map((draft) => {
    if (draft.id === id) return { ...draft, ...change };
    if (newKey === undefined || before === undefined || before === '') return draft;
    return { ...draft, after: draft.after.map((key) => (key === before ? newKey : key)) };
  });
}
