import type { WireAlert, WireBoard, WireTurn } from '@stubpost/shared';
import type { QueryClient } from '@tanstack/react-query';
import { queryKeys, type AlertQuestion, type BoardQuestion } from './query-keys';

const STANDING: readonly string[] = ['raised', 'taken', 'set-aside'];

/** Whether a turn that comes in replaces the one at hand: a later version, or the same one computed later. */
export function isNewer(incoming: WireTurn, known: WireTurn): boolean {
  if (incoming.version !== known.version) return incoming.version > known.version;
  return incoming.computedAt > known.computedAt;
}

const firstInstant = (turn: WireTurn): string =>
  turn.inbound?.scheduledArrivalAt ?? turn.outbound?.scheduledDepartureAt ?? '';
const lastInstant = (turn: WireTurn): string =>
  turn.outbound?.scheduledDepartureAt ?? turn.inbound?.scheduledArrivalAt ?? '';

const minutesBefore = 20;
const minutesAfter = 240;
/** Both ways, for the list of a crew. */
const crewMinutes = 120;

/** Whether a board list that was asked with `question` would hold the turn. */
export function belongsTo(question: BoardQuestion, turn: WireTurn, now: number): boolean {
  if (question.terminal !== turn.terminal) return false;
  if (question.serviceDate !== undefined) return question.serviceDate === turn.serviceDate;
  const [before, after] =
    question.span === 'crew' ? [crewMinutes, crewMinutes] : [minutesBefore, minutesAfter];
  const from = question.from === undefined ? now - before * 60_000 : Date.parse(question.from);
  const to = question.to === undefined ? now + after * 60_000 : Date.parse(question.to);
  return Date.parse(firstInstant(turn)) < to && Date.parse(lastInstant(turn)) >= from;
}

/** The board with a turn put in its place; the same board when nothing is new. */
export function boardWithTurn(board: WireBoard, turn: WireTurn, belongs: boolean): WireBoard {
  const at = board.turns.findIndex(({ id }) => id === turn.id);
  const known = board.turns[at];
  if (known !== undefined) {
    return isNewer(turn, known) ? { ...board, turns: board.turns.with(at, turn) } : board;
  }
  if (!belongs) return board;
  const before = board.turns.findIndex((other) => firstInstant(other) > firstInstant(turn));
  return { ...board, turns: board.turns.toSpliced(before === -1 ? board.turns.length : before, 0, turn) };
}

/** Puts a turn that came over the stream wherever the cache shows it. */
export function patchTurn(client: QueryClient, turn: WireTurn, now: number): void {
  const known = client.getQueryData<WireTurn>(queryKeys.turns.detail(turn.id));
  if (known !== undefined && isNewer(turn, known)) client.setQueryData(queryKeys.turns.detail(turn.id), turn);
  if (known !== undefined && turn.version > known.version) {
    void client.invalidateQueries({ queryKey: queryKeys.turns.entries(turn.id) });
  }
  for (const query of client.getQueryCache().findAll({ queryKey: queryKeys.turns.boards })) {
    const question = query.queryKey[2] as BoardQuestion;
    client.setQueryData<WireBoard>(query.queryKey, (board) =>
      board === undefined ? board : boardWithTurn(board, turn, belongsTo(question, turn, now)),
    );
  }
}

/** Whether an alert list that was asked with `question` would hold the alert. */
function listHolds(question: AlertQuestion, alert: WireAlert): boolean {
  if (question.terminal !== alert.terminal) return false;
  const state = question.state ?? 'standing';
  if (state === 'all') return true;
  return state === 'standing' ? STANDING.includes(alert.state) : state === alert.state;
}

/** The list with an alert put in its place, taken out, or left alone when the known one is newer. */
export function listWithAlert(list: WireAlert[], alert: WireAlert, holds: boolean): WireAlert[] {
  const known = list.find(({ id }) => id === alert.id);
  if (known !== undefined && known.version > alert.version) return list;
  if (known === undefined) return holds ? [alert, ...list] : list;
  return holds
    ? list.map((other) => (other.id === alert.id ? alert : other))
    : list.filter((other) => other !== known);
}

const turnWithAlert = (turn: WireTurn, alert: WireAlert): WireTurn =>
  turn.id === alert.turnId
    ? { ...turn, alerts: listWithAlert(turn.alerts, alert, STANDING.includes(alert.state)) }
    : turn;

/** Puts an alert that came over the stream into the lists and onto its turn. */
export function patchAlert(client: QueryClient, alert: WireAlert): void {
  for (const query of client.getQueryCache().findAll({ queryKey: queryKeys.alerts.lists })) {
    const question = query.queryKey[2] as AlertQuestion;
    client.setQueryData<WireAlert[]>(query.queryKey, (list) =>
      list === undefined ? list : listWithAlert(list, alert, listHolds(question, alert)),
    );
  }
  if (alert.turnId === null) return;
  client.setQueryData<WireTurn>(queryKeys.turns.detail(alert.turnId), (turn) =>
    turn === undefined ? turn : turnWithAlert(turn, alert),
  );
  client.setQueriesData<WireBoard>({ queryKey: queryKeys.turns.boards }, (board) =>
    board === undefined ? board : { ...board, turns: board.turns.map((turn) => turnWithAlert(turn, alert)) },
  );
}
