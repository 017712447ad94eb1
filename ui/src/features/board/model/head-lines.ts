import { millisecondsInMinute, type Instant, type WireTrack } from '@stubpost/shared';
import { HEALTH_WORDS, TURN_STATE_WORDS } from '../../../components/words';
import { formatSlack } from '../../../lib/time-display';
import type { BoardRow } from './group-rows';
import type { TurnNow } from '../../../lib/turn/turn-now';
import { markerFor, surname, type FlagKind } from './table-cells';
import { clockText, timeText } from '../../../lib/turn/time-text';
import { departureOf, isOver, isUntaken, shownSlack } from '../../../lib/turn/turn-times';

/** One line of a row's head. */
export interface HeadLine {
  id: string;
  look: 'now' | 'later' | 'gone' | 'annulled';
  untaken: boolean;
  train: string;
  /** The set in rows by track, the track in rows by set. */
  other: string;
  flag: FlagKind;
  state: string;
  leaves: string;
  spare: string;
}

/** The head of a row: up to three turns, or two and a line about where the train stands. */
export interface RowHead {
  rowId: string;
  label: string;
  /** Words for the label of rows whose label does not say enough. */
  labelWords: string;
  lines: HeadLine[];
  about: { text: string; flag: FlagKind } | null;
}

const mostLines = 3;

export interface HeadContext {
  now: Instant;
  zone: string;
  windowTo: Instant;
  tracks: readonly WireTrack[];
  trainOf: (turnId: string) => string;
}

/** The head of one row for the turns of it that are in view. */
export function rowHead(row: BoardRow, context: HeadContext): RowHead {
  const shown = linesFor(row.turns);
  const current = shown.find((turn) => !isOver(turn)) ?? shown.at(-1);
  const hidden = row.turns.length - shown.length;
  return {
    rowId: row.id,
    label: row.part > 0 ? '″' : (row.label ?? labelWords(row)),
    labelWords: labelWords(row),
    lines: shown.map((turn) => headLine(turn, row, turn === current)),
    about: shown.length === mostLines ? null : about(row, current, hidden, context),
  };
}

function labelWords(row: BoardRow): string {
  const noun = row.subject === 'track' ? 'Track' : 'Set';
  if (row.label === null) return `No ${noun.toLowerCase()} yet`;
  return row.part > 0 ? `${noun} ${row.label}, further trains` : `${noun} ${row.label}`;
}

/** Three turns if there are three; of more, the two that matter now. Those that left give way first. */
function linesFor(turns: readonly TurnNow[]): TurnNow[] {
  if (turns.length <= mostLines) return [...turns];
  const firstStanding = turns.findIndex((turn) => !isOver(turn));
  const from = firstStanding === -1 ? turns.length - 2 : Math.min(firstStanding, turns.length - 2);
  return turns.slice(from, from + 2);
}

function headLine(turn: TurnNow, row: BoardRow, isCurrent: boolean): HeadLine {
  const flagged = !isOver(turn) && turn.state !== 'scheduled' && turn.health !== 'on-plan';
  const leaves = turn.departedAt ?? turn.scheduledDepartureAt;
  const slack = shownSlack(turn);
  return {
    id: turn.id,
    look: turn.annulled !== null ? 'annulled' : isOver(turn) ? 'gone' : isCurrent ? 'now' : 'later',
    untaken: isUntaken(turn),
    train: turn.train,
    other: (row.subject === 'track' ? turn.set : turn.track) ?? '–',
    flag: flagged && turn.health !== 'on-plan' ? turn.health : null,
    state: flagged ? HEALTH_WORDS[turn.health] : TURN_STATE_WORDS[turn.state],
    leaves: leaves === null ? 'ties up' : timeText(leaves, turn.zone),
    spare: slack === null ? '' : formatSlack(slack),
  };
}

function about(
  row: BoardRow,
  turn: TurnNow | undefined,
  hidden: number,
  context: HeadContext,
): RowHead['about'] {
  if (turn === undefined)
    return { text: `no turns until ${timeText(context.windowTo, context.zone)}`, flag: null };
  const { zone } = turn;
  if (turn.blueSignal !== null) {
    const since = turn.blueSignal.since === null ? '' : ` since ${timeText(turn.blueSignal.since, zone)}`;
    return { text: `Blue signal up${since}, ${surname(turn.blueSignal.by)}`, flag: 'blue-signal' };
  }
  const clash = row.clashes[0];
  if (clash !== undefined) {
    const trains = `${context.trainOf(clash.first)} and ${context.trainOf(clash.second)}`;
    return {
      text: `${trains} both here ${timeText(clash.from, zone)} to ${timeText(clash.to, zone)}`,
      flag: null,
    };
  }
  if (turn.health === 'no-word' && turn.lastHeardAt !== null && !isOver(turn)) {
    const minutes = Math.floor((context.now - turn.lastHeardAt) / millisecondsInMinute);
    return { text: `No word since ${clockText(turn.lastHeardAt, zone)} (${minutes} min)`, flag: null };
  }
  const leaves = departureOf(turn);
  if (turn.heldUntil !== null && leaves === turn.heldUntil && !isOver(turn)) {
    return {
      text: `Held to ${timeText(leaves, zone)}${turn.holdReason === null ? '' : `: ${turn.holdReason}`}`,
      flag: null,
    };
  }
  if (hidden > 0) return { text: `and ${hidden} more until ${timeText(context.windowTo, zone)}`, flag: null };
  return { text: standsAt(turn, context.tracks), flag: null };
}

function standsAt(turn: TurnNow, tracks: readonly WireTrack[]): string {
  const track = tracks.find((one) => one.label === turn.track);
  const cars = turn.cars.length;
  const room = track?.cars;
  if (cars === 0) return room === undefined ? '' : `fits ${carsSaid(room)}`;
  const marker = markerFor(track, cars);
  const parts = [
    carsSaid(cars),
    marker === null ? '' : `at marker ${marker}`,
    room === undefined ? '' : `(${room} fit)`,
  ].filter(Boolean);
  return parts.join(' ');
}

const carsSaid = (count: number): string => `${count} ${count === 1 ? 'car' : 'cars'}`;
