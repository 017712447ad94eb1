import { addSeconds, type Instant } from '../lib/instant';
import { arrivalEvent, departureEvent } from '../plan/step-network';
import type { PlanStep } from '../plan/step-plan';
import { rolesOf } from '../plan/step-roles';
import type { TurnFacts } from './facts';
import type { StepState, TurnKind, TurnState } from './turn';

/** Seconds before its arrival at which a turn is *Inbound*. */
export const inboundHorizonSeconds = 1800;
/** Seconds before its departure at which a first-out, which has no arrival, comes into view. */
export const firstOutHorizonSeconds = 3600;
/** Seconds after which a turn is *Closed* whatever is still open. */
export const closedAfterSeconds = 86_400;

type Word = readonly [word: TurnState, recorded: boolean];

/**
 * The life of a turn at `now`: the last word of its row whose every earlier condition is recorded. A train that left
 * without a handbrake record is therefore still *Arrived*. *Inbound* begins 30 min before the arrival as scheduled or
 * expected. *Closed* is a turn of which all is recorded and nothing is in question, or any turn 24 h after its
 * departure (a tie-up: after its arrival). A first-out has no words before *Crew in cab*, a tie-up none between
 * *Secured* and *Closed*, and a turn without steps for a word goes without that word.
 */
export function lifeOf(facts: TurnFacts, now: Instant): TurnState {
  if (facts.annulled !== null) return 'annulled';
  const closesAt = closingTime(facts);
  if (closesAt !== null && now >= closesAt) return 'closed';
  const row = rowOf(facts, now);
  const gap = row.findIndex(([, recorded]) => !recorded);
  if (gap < 0) return facts.inQuestion.length === 0 ? 'closed' : (row.at(-1)?.[0] ?? 'scheduled');
  return row[gap - 1]?.[0] ?? 'scheduled';
}

/** 24 h after the departure, else after the time it was to leave; for a tie-up after the arrival. Null without either. */
function closingTime(facts: TurnFacts): Instant | null {
  const { planned, departureAt, arrivalAt } = facts;
  const leaves = planned.kind === 'tie-up' ? null : (departureAt ?? departureAnchorOf(facts));
  const end = leaves ?? arrivalAt ?? later(planned.scheduledArrivalAt, facts.expectedArrivalAt);
  return end === null ? null : addSeconds(end, closedAfterSeconds);
}

function departureAnchorOf({ planned, heldUntil }: TurnFacts): Instant | null {
  return planned.scheduledDepartureAt === null ? null : later(planned.scheduledDepartureAt, heldUntil);
}

function later(a: Instant | null, b: Instant | null): Instant | null {
  return a === null || b === null ? (a ?? b) : Math.max(a, b);
}

/** The words of a turn in order, each with whether its own condition is recorded. */
function rowOf(facts: TurnFacts, now: Instant): Word[] {
  const roles = rolesOf(facts.steps);
  const kind: TurnKind = facts.planned.kind;
  const done = (steps: readonly PlanStep[]): boolean =>
    steps.every((step) => facts.doneAt[step.key] !== undefined);
  const word = (name: TurnState, steps: readonly PlanStep[]): Word[] =>
    steps.length > 0 ? [[name, done(steps)]] : [];

  const arriving: Word[] = [
    ['inbound', facts.arrivalAt !== null || now >= inboundFrom(facts)],
    ['arrived', facts.arrivalAt !== null],
    ...word('secured', roles.secure),
  ];
  const leaving: Word[] = [
    ...word('ends-changed', roles.changeEnds),
    ...word('crew-in-cab', roles.manCab),
    ...word('ready', roles.hold),
    ['departed', facts.departureAt !== null],
    ...word('tested', roles.runningTest),
  ];
  const scheduled: Word = ['scheduled', true];
  if (kind === 'tie-up') return [scheduled, ...arriving];
  if (kind === 'first-out') return [scheduled, ...leaving];
  return [scheduled, ...arriving, ...leaving];
}

function inboundFrom({ planned, expectedArrivalAt }: TurnFacts): Instant {
  const arrives = later(planned.scheduledArrivalAt, expectedArrivalAt);
  return arrives === null ? Infinity : addSeconds(arrives, -inboundHorizonSeconds);
}

/** When a step is due and when it could have started, both from the forecast. */
export interface StepTimes {
  dueAt: Instant;
  startAt: Instant;
}

/**
 * How one step stands at `now`. *In question*: accounts more than 60 s apart. *Done*: recorded. *Not needed*: open on
 * an annulled turn. *Blocked*: said to be impossible, or counted from a departure that a blue signal holds.
 * *Withdrawn*: every record of it was taken back. Else *overdue* once its due time plus its tolerance has passed;
 * *due* from its due time on, or as soon as it could start with all before it recorded; *not due* before. A step
 * after the departure is neither due nor overdue before the train has left, and its time then runs from the actual
 * departure where that was later than planned.
 */
export function stepStateOf(facts: TurnFacts, step: PlanStep, times: StepTimes, now: Instant): StepState {
  if (facts.inQuestion.some((question) => question.step === step.key)) return 'in-question';
  if (facts.doneAt[step.key] !== undefined) return 'done';
  if (facts.annulled !== null) return 'not-needed';
  if (facts.cannotDo.some((cannot) => cannot.step === step.key)) return 'blocked';
  const held = step.anchor === 'departure' && facts.blueSignal !== null && facts.departureAt === null;
  if (held) return 'blocked';
  if (facts.withdrawn.includes(step.key)) return 'withdrawn';
  return openStepState({ step, times, ...facts }, now);
}

/** What an open step's state depends on besides the time. */
export interface OpenStep {
  step: PlanStep;
  steps: readonly PlanStep[];
  times: StepTimes;
  arrivalAt: Instant | null;
  departureAt: Instant | null;
  doneAt: Readonly<Record<string, Instant>>;
}

/** *Not due*, *due* or *overdue* for a step that is simply open; the last three rules of `stepStateOf`. */
export function openStepState(open: OpenStep, now: Instant): StepState {
  const { step, departureAt } = open;
  const isAfterDeparture = rolesOf(open.steps).afterDeparture.has(step.key);
  if (isAfterDeparture && departureAt === null) return 'not-due';
  const dueAt =
    isAfterDeparture && departureAt !== null
      ? Math.max(open.times.dueAt, addSeconds(departureAt, step.offsetSeconds))
      : open.times.dueAt;
  if (now > addSeconds(dueAt, step.toleranceSeconds)) return 'overdue';
  if (now >= dueAt) return 'due';
  const isFree = step.after.every((key) => isRecorded(open, key));
  return isFree && now >= open.times.startAt ? 'due' : 'not-due';
}

function isRecorded({ steps, arrivalAt, departureAt, doneAt }: OpenStep, key: string): boolean {
  if (key === arrivalEvent) return arrivalAt !== null;
  if (key === departureEvent) return departureAt !== null;
  return doneAt[key] !== undefined || !steps.some((step) => step.key === key);
}
