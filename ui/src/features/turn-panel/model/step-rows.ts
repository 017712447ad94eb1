import { SOURCE_WORDS } from '../../../components/words';
import { timeText, clockText } from '../../../lib/turn/time-text';
import type { StepNow, TurnNow } from '../../../lib/turn/turn-now';
import { nextStep } from '../../../lib/turn/step-words';
import { isOutsideQuestions } from './question-words';

/** One row of the steps table, as texts. */
export interface StepRow {
  step: StepNow;
  name: string;
  isNext: boolean;
  due: string;
  latest: string;
  done: string;
  isEstimate: boolean;
  known: string;
  remarks: readonly string[];
}

export interface StepGroup {
  anchor: 'arrival' | 'departure';
  heading: string;
  rows: StepRow[];
}

const dash = '–';

/** The steps in two groups, from the arrival and from the departure. */
export function stepGroups(turn: TurnNow): StepGroup[] {
  const next = nextStep(turn);
  return (['arrival', 'departure'] as const)
    .map((anchor) => ({
      anchor,
      heading: anchor === 'arrival' ? arrivalHeading(turn) : departureHeading(turn),
      rows: turn.steps
        .filter((step) => step.anchor === anchor)
        .map((step) => stepRow(step, turn, step === next)),
    }))
    .filter((group) => group.rows.length > 0);
}

function arrivalHeading({ arrivedAt, scheduledArrivalAt, expectedArrivalAt, zone }: TurnNow): string {
  const scheduled = scheduledArrivalAt === null ? '' : timeText(scheduledArrivalAt, zone);
  if (arrivedAt !== null) return `From the arrival, ${clockText(arrivedAt, zone)} (scheduled ${scheduled})`;
  if (expectedArrivalAt === null) return `From the arrival, scheduled ${scheduled}`;
  return `From the arrival, expected ${timeText(expectedArrivalAt, zone)} (scheduled ${scheduled})`;
}

function departureHeading({ departedAt, scheduledDepartureAt, heldUntil, zone }: TurnNow): string {
  if (scheduledDepartureAt === null) return 'From the departure';
  const scheduled = timeText(scheduledDepartureAt, zone);
  if (departedAt !== null)
    return `From the departure, ${clockText(departedAt, zone)} (scheduled ${scheduled})`;
  if (heldUntil !== null && heldUntil > scheduledDepartureAt) {
    return `From the departure, held to ${timeText(heldUntil, zone)} (scheduled ${scheduled})`;
  }
  return `From the departure, ${scheduled}`;
}

function stepRow(step: StepNow, turn: TurnNow, isNext: boolean): StepRow {
  const { zone } = turn;
  const count = step.reading?.count;
  const base = {
    step,
    name: count === undefined ? step.shortLabel : `${step.shortLabel}, ${count}`,
    isNext,
    due: step.dueAt === null ? dash : timeText(step.dueAt, zone),
    latest: step.latestFinishAt === null || !step.holdsDeparture ? dash : timeText(step.latestFinishAt, zone),
    isEstimate: false,
    remarks: step.remarks.filter(isOutsideQuestions),
  };
  if (step.doneAt !== null) return { ...base, done: clockText(step.doneAt, zone), known: knownOf(step) };
  return { ...base, ...openWords(step, turn) };
}

function knownOf(step: StepNow): string {
  if (step.source === null) return '';
  const who = step.saidBy ?? step.by;
  // What is in question comes first: the column is narrow, and cuts off at its end.
  const doubt = step.state === 'in-question' ? 'in question, ' : '';
  return `${doubt}${SOURCE_WORDS[step.source]}${who === null ? '' : `, ${surname(who)}`}`;
}

const surname = (name: string): string => name.trim().split(/\s+/).at(-1) ?? name;

function openWords(step: StepNow, turn: TurnNow): Pick<StepRow, 'done' | 'isEstimate' | 'known'> {
  const holder = turn.crew.find((member) => member.as === step.doer);
  const doer = holder === undefined ? `${step.doer} to do` : `${surname(holder.name)} to do`;
  const words = (done: string, known = doer) => ({ done, isEstimate: false, known });
  if (turn.departedAt !== null && step.holdsDeparture && step.state !== 'not-needed')
    return words('no record');
  switch (step.state) {
    case 'not-needed':
      return words(dash, 'not needed');
    case 'withdrawn':
      return words(dash, 'withdrawn');
    case 'blocked':
      return words('cannot');
    case 'overdue':
      return words('overdue');
    default:
      break;
  }
  if (!step.holdsDeparture) return words(dash, turn.departedAt === null ? 'after leaving' : doer);
  if (turn.health === 'no-word' || step.finishAt === null) return words(dash);
  return { done: timeText(step.finishAt, turn.zone), isEstimate: true, known: doer };
}
