import type { TurnFilter } from './board-search';
import type { TurnNow } from '../../../lib/turn/turn-now';
import { isOver, isStanding } from '../../../lib/turn/turn-times';

/** Whether anything narrows the list. */
export function isFiltering(filter: TurnFilter): boolean {
  return filter.text.trim() !== '' || filter.states.length > 0 || filter.needsAction;
}

/**
 * Whether somebody has to do something about a turn now: an alert stands, a step is overdue, or it is not on plan.
 * A turn that has left or was annulled needs action only while an alert stands.
 */
export function needsAction(turn: TurnNow): boolean {
  if (turn.alerts.some(isStanding)) return true;
  if (isOver(turn)) return false;
  return turn.health !== 'on-plan' || turn.steps.some((step) => step.state === 'overdue');
}

/** The turns that match; each word of the text must be found somewhere in train, set, track, car or person. */
export function filterTurns(turns: readonly TurnNow[], filter: TurnFilter): TurnNow[] {
  const words = filter.text.toLocaleLowerCase().split(/\s+/).filter(Boolean);
  return turns.filter(
    (turn) =>
      (filter.states.length === 0 || filter.states.includes(turn.state)) &&
      (!filter.needsAction || needsAction(turn)) &&
      matches(turn, words),
  );
}

function matches(turn: TurnNow, words: readonly string[]): boolean {
  if (words.length === 0) return true;
  const texts = [
    turn.outboundTrain,
    turn.inboundTrain,
    turn.track === null ? null : `track ${turn.track}`,
    turn.set === null ? null : `set ${turn.set}`,
    ...turn.cars,
    ...turn.crew.map((member) => member.name),
  ].map((text) => (text ?? '').toLocaleLowerCase());
  return words.every((word) => texts.some((text) => text.includes(word)));
}

/** What the filter button says: "Filter: none", "Filter: needs action, 2 states, “17”". */
export function filterSaid(filter: TurnFilter): string {
  const parts = [
    filter.needsAction ? 'needs action' : '',
    filter.states.length > 0
      ? `${filter.states.length} ${filter.states.length === 1 ? 'state' : 'states'}`
      : '',
    filter.text.trim() === '' ? '' : `“${filter.text.trim()}”`,
  ].filter(Boolean);
  return `Filter: ${parts.length === 0 ? 'none' : parts.join(', ')}`;
}
