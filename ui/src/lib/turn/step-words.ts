import { formatTime } from '../time-display';
import type { StepNow, TurnNow } from './turn-now';

/** A label inside a sentence. */
export const lowerFirst = (text: string): string => text.charAt(0).toLowerCase() + text.slice(1);

/** The step that is to be done next: the first overdue one, else the first open one; after the departure of those that follow it. */
export function nextStep(turn: TurnNow): StepNow | null {
  const open = turn.steps.filter((step) => step.doneAt === null && step.state !== 'not-needed');
  const side = open.filter((step) => step.holdsDeparture === (turn.departedAt === null));
  return side.find((step) => step.state === 'overdue') ?? side[0] ?? null;
}

/** A step in words: "cab brake check not recorded, due 17:24", "handbrake set recorded 17:20, by radio". */
export function stepWords(step: StepNow, zone: string): string {
  const name = lowerFirst(step.label);
  const due = step.dueAt === null ? '' : `, due ${formatTime(step.dueAt, zone)}`;
  if (step.doneAt !== null) {
    const relayed =
      step.source === 'by-radio' ? ', by radio' : step.source === 'entered-later' ? ', entered later' : '';
    const doubt = step.state === 'in-question' ? ', in question' : '';
    return `${name} recorded ${formatTime(step.doneAt, zone)}${relayed}${doubt}`;
  }
  switch (step.state) {
    case 'not-needed':
      return `${name} not needed`;
    case 'withdrawn':
      return `${name} withdrawn${due}`;
    case 'blocked':
      return `${name} cannot be done${due}`;
    case 'overdue':
      return `${name} not recorded, was due ${step.dueAt === null ? 'before' : formatTime(step.dueAt, zone)}`;
    default:
      return `${name} not recorded${due}`;
  }
}
