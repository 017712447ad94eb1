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

/**
 * The turns that match. Each word of the text must be found somewhere in train, set, track, car or person; "track 7" and
 * "set 52" mean exactly that track and that set.
 */
export function filterTurns(turns: readonly TurnNow[], filter: TurnFilter): TurnNow[] {
  const tests = textTests(filter.text);
  return turns.filter(
    (turn) =>
      (filter.states.length === 0 || filter.states.includes(turn.state)) &&
      (!filter.needsAction || needsAction(turn)) &&
      tests.every((test) => test(turn)),
  );
}

type TurnTest = (turn: TurnNow) => boolean;

const namedPlace = /\b(track|set)\s+(\S+)/g;

function textTests(text: string): TurnTest[] {
  const lower = text.toLocaleLowerCase();
  const places = [...lower.matchAll(namedPlace)].map(([, subject, label]): TurnTest => {
    return (turn) => (subject === 'track' ? turn.track : turn.set)?.toLocaleLowerCase() === label;
  });
  const words = lower.replace(namedPlace, ' ').split(/\s+/).filter(Boolean);
  return [
    ...places,
    ...words.map(
      (word): TurnTest =>
        (turn) =>
          wordsOf(turn).some((one) => one.includes(word)),
    ),
  ];
}

function wordsOf(turn: TurnNow): string[] {
  const people = turn.crew.map((member) => member.name);
  return [turn.outboundTrain, turn.inboundTrain, turn.track, turn.set, ...turn.cars, ...people].map((text) =>
    (text ?? '').toLocaleLowerCase(),
  );
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
