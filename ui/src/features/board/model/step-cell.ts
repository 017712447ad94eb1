import { stepMarkClass } from '../../../components/step-mark';
import type { StepNow, TurnNow } from '../../../lib/turn/turn-now';
import { clockText, timeText } from '../../../lib/turn/time-text';
import { isFarOffPlan, isOver } from '../../../lib/turn/turn-times';

/** A step in a cell: its mark, its time or the word for it, and under that when it was due or how it is known. */
export interface StepCell {
  key: string;
  mark: string | null;
  text: string;
  estimate: boolean;
  strong: boolean;
  small: string;
}

/** The cell of one step of a turn. */
export function stepCell(step: StepNow, turn: TurnNow): StepCell {
  const due = step.dueAt === null ? '' : `due ${timeText(step.dueAt, turn.zone)}`;
  const cell = {
    key: step.key,
    mark: stepMarkClass(step.kind, step.state, step.source),
    estimate: false,
    strong: false,
    small: due,
  };
  if (turn.annulled !== null) return { ...cell, mark: null, text: '–', small: '' };
  if (step.doneAt !== null) {
    return { ...cell, text: clockText(step.doneAt, turn.zone), ...saidOf(step, due) };
  }
  if (step.state === 'not-needed') return { ...cell, text: 'not needed', small: '' };
  if (isOver(turn) && step.holdsDeparture) return { ...cell, text: 'no record' };
  if (step.state === 'overdue') return { ...cell, text: 'overdue', strong: true };
  if (step.state === 'withdrawn') return { ...cell, text: 'withdrawn' };
  if (step.state === 'blocked') return blockedCell(cell, step);
  if (isFarOffPlan(turn)) return { ...cell, mark: null, text: '' };
  if (turn.health === 'no-word') return { ...cell, text: 'no word' };
  if (step.finishAt === null) return { ...cell, text: '' };
  return { ...cell, text: timeText(step.finishAt, turn.zone), estimate: true };
}

/** Somebody said that it cannot be done; without such words a blue signal stands in the way. */
function blockedCell(cell: Omit<StepCell, 'text'>, step: StepNow): StepCell {
  return step.remarks.length > 0 ? { ...cell, text: 'cannot', strong: true } : { ...cell, text: 'blocked' };
}

function saidOf(step: StepNow, due: string): Pick<StepCell, 'small' | 'strong'> {
  if (step.state === 'in-question') return { small: 'in question', strong: true };
  if (step.source === 'by-radio') return { small: 'by radio', strong: false };
  if (step.source === 'entered-later') return { small: 'later', strong: false };
  return { small: due, strong: false };
}
