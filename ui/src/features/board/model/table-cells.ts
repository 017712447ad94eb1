import { millisecondsInMinute, type Instant, type WireTrack } from '@stubpost/shared';
import { PRIORITY_WORDS, TURN_STATE_WORDS } from '../../../components/words';
import { formatSlack } from '../../../lib/time-display';
import type { TurnNow } from '../../../lib/turn/turn-now';
import { healthFlag } from '../../../lib/turn/health-flag';
import { stepCell, type StepCell } from './step-cell';
import { clockText, timeText } from '../../../lib/turn/time-text';
import {
  arrivalOf,
  departureOf,
  foremostAlert,
  isFarOffPlan,
  isOver,
  isUntaken,
  shownSlack,
} from '../../../lib/turn/turn-times';

/** A cell of two lines. `estimate` marks a forecast time (written ~17:37, read out "about 17:37"). */
export interface Cell {
  text: string;
  estimate?: boolean;
  small?: string;
  smallEstimate?: boolean;
}

export type FlagKind = 'tight' | 'short' | 'late' | 'no-word' | 'blue-signal' | null;

/** How the turn stands and who has its alert. */
export interface PlanCell {
  flag: FlagKind;
  text: string;
  small: string;
  /** Set in bold after `small`: what is still owed. */
  owed: string;
}

/** One row of the table, as texts. */
export interface TableRow {
  id: string;
  look: 'over' | 'annulled' | 'scheduled' | 'standing';
  untaken: boolean;
  blueSignal: boolean;
  track: string;
  train: Cell;
  leaves: Cell;
  plan: PlanCell;
  spare: string;
  state: Cell;
  set: Cell;
  marker: Cell;
  arrived: Cell;
  steps: (StepCell | null)[];
  ready: Cell;
  conductor: Cell;
}

/** What a row needs beside its turn. */
export interface RowContext {
  now: Instant;
  tracks: readonly WireTrack[];
  /** Keys of the step columns, in order. */
  stepKeys: readonly string[];
  /** Name of the person who looks, so that their own alerts say "you". */
  me: string;
  /** Trains that claim the same track at the same time. */
  clashesWith: readonly string[];
}

const dash = '–';
const nothing: Cell = { text: dash };

/** The row of a turn at `now`. */
export function tableRow(turn: TurnNow, context: RowContext): TableRow {
  const { now, tracks } = context;
  return {
    id: turn.id,
    look: lookOf(turn),
    untaken: isUntaken(turn),
    blueSignal: turn.blueSignal !== null,
    track: turn.track ?? dash,
    train: trainCell(turn),
    leaves: leavesCell(turn),
    plan: planCell(turn, context),
    spare: formatSlack(shownSlack(turn)),
    state: stateCell(turn),
    set: { text: turn.set ?? dash, ...(turn.cars.length > 0 && { small: carsSaid(turn.cars.length) }) },
    marker: markerCell(turn, tracks),
    arrived: arrivedCell(turn),
    steps: context.stepKeys.map((key) => {
      const step = turn.steps.find((one) => one.key === key);
      return step === undefined ? null : stepCell(step, turn);
    }),
    ready: readyCell(turn, now),
    conductor: conductorCell(turn),
  };
}

function lookOf(turn: TurnNow): TableRow['look'] {
  if (turn.annulled !== null) return 'annulled';
  if (isOver(turn)) return 'over';
  return turn.state === 'scheduled' ? 'scheduled' : 'standing';
}

function trainCell(turn: TurnNow): Cell {
  if (turn.outboundTrain === null) return { text: turn.train, small: 'ties up' };
  return { text: turn.train, small: turn.inboundTrain === null ? 'first out' : `in ${turn.inboundTrain}` };
}

function leavesCell(turn: TurnNow): Cell {
  const { zone, scheduledDepartureAt: scheduled, departedAt } = turn;
  if (scheduled === null) return nothing;
  if (departedAt !== null)
    return { text: clockText(departedAt, zone), small: `sched ${timeText(scheduled, zone)}` };
  const leaves = departureOf(turn) ?? scheduled;
  const text = timeText(scheduled, zone);
  const expected = turn.expectedDepartureAt;
  if (isOver(turn) || isFarOffPlan(turn)) return { text };
  if (expected !== null && expected > leaves && turn.health !== 'no-word') {
    return { text, small: timeText(expected, zone), smallEstimate: true };
  }
  return leaves > scheduled ? { text, small: `held to ${timeText(leaves, zone)}` } : { text };
}

function planCell(turn: TurnNow, { now, me, clashesWith }: RowContext): PlanCell {
  const alert = foremostAlert(turn.alerts);
  const untaken = alert?.state === 'raised';
  const has = alert === null ? '' : alertSaid(alert, turn.zone, me);
  const clash = clashesWith.length === 0 ? '' : `same track as ${clashesWith.join(', ')}`;
  const base = { small: has || clash, owed: untaken ? 'not taken' : '' };
  if (isOver(turn)) return { ...base, flag: null, text: dash };
  const health = healthFlag(turn, now);
  if (health !== null && turn.health !== 'on-plan') return { ...base, flag: turn.health, text: health };
  if (turn.blueSignal === null) return { ...base, flag: null, text: 'On plan' };
  const since = turn.blueSignal.since === null ? '' : `since ${timeText(turn.blueSignal.since, turn.zone)}, `;
  return {
    ...base,
    flag: 'blue-signal',
    text: 'Blue signal',
    small: has || `${since}${surname(turn.blueSignal.by)}`,
  };
}

function alertSaid(alert: TurnNow['alerts'][number], zone: string, me: string): string {
  const priority = PRIORITY_WORDS[alert.priority];
  if (alert.state === 'raised') return `${priority}, `;
  if (alert.state === 'set-aside' && alert.setAsideUntil !== null) {
    return `${priority}, aside to ${timeText(Date.parse(alert.setAsideUntil), zone)}`;
  }
  const who = alert.takenBy === me ? 'you' : surname(alert.takenBy ?? '');
  const at = alert.takenAt === null ? '' : ` ${timeText(Date.parse(alert.takenAt), zone)}`;
  return `${priority}, ${who}${at}`;
}

function stateCell(turn: TurnNow): Cell {
  const text = TURN_STATE_WORDS[turn.state];
  const small = turn.annulled === null ? stateSaid(turn) : annulledSaid(turn);
  return small === '' ? { text } : { text, small };
}

function annulledSaid({ annulled, zone }: TurnNow): string {
  if (annulled === null) return '';
  return annulled.at === null ? annulled.reason : `${timeText(annulled.at, zone)}, ${annulled.reason}`;
}

function stateSaid(turn: TurnNow): string {
  if (turn.departedAt !== null) return runningTestSaid(turn);
  if (turn.state === 'inbound') return latenessSaid(turn);
  if (turn.state === 'scheduled') return turn.extra ? 'extra' : '';
  const asked = turn.steps.filter((step) => step.holdsDeparture && step.state !== 'not-needed');
  const done = asked.filter((step) => step.doneAt !== null).length;
  return asked.length === 0 ? '' : `${done} of ${asked.length} done`;
}

function runningTestSaid(turn: TurnNow): string {
  const test = turn.steps.find((step) => !step.holdsDeparture && step.state !== 'not-needed');
  if (test === undefined) return '';
  if (test.doneAt !== null) return `test ${clockText(test.doneAt, turn.zone)}`;
  return test.dueAt === null ? '' : `test due ${timeText(test.dueAt, turn.zone)}`;
}

function latenessSaid(turn: TurnNow): string {
  const late = (arrivalOf(turn) ?? 0) - (turn.scheduledArrivalAt ?? 0);
  const minutes = Math.floor(late / millisecondsInMinute);
  return turn.scheduledArrivalAt === null || minutes < 1 ? 'on time' : `${minutes} min late`;
}

function markerCell(turn: TurnNow, tracks: readonly WireTrack[]): Cell {
  const track = tracks.find((one) => one.label === turn.track);
  const marker = markerFor(track, turn.cars.length);
  const small = track?.cars === undefined ? {} : { small: `${track.cars} fit` };
  return { text: marker ?? dash, ...small };
}

/** The stopping marker for a train of so many cars on a track; null when the track names none. */
export function markerFor(track: WireTrack | undefined, cars: number): string | null {
  return track?.markers?.find((marker) => marker.cars === cars)?.label ?? null;
}

const carsSaid = (count: number): string => `${count} ${count === 1 ? 'car' : 'cars'}`;

function arrivedCell(turn: TurnNow): Cell {
  const { zone, scheduledArrivalAt: scheduled, arrivedAt } = turn;
  if (scheduled === null) return nothing;
  const small = `sched ${timeText(scheduled, zone)}`;
  if (arrivedAt !== null) return { text: clockText(arrivedAt, zone), small };
  const expected = arrivalOf(turn);
  if (isFarOffPlan(turn) || expected === null) return { text: dash, small };
  return { text: timeText(expected, zone), estimate: true, small };
}

function readyCell(turn: TurnNow, now: Instant): Cell {
  if (isOver(turn) || turn.outboundTrain === null) return nothing;
  if (turn.health === 'no-word' || turn.readyAt === null) return { text: dash, small: 'no forecast' };
  const held = turn.steps.filter((step) => step.holdsDeparture && step.state !== 'not-needed');
  if (held.length > 0 && held.every((step) => step.doneAt !== null)) {
    return { text: clockText(turn.readyAt, turn.zone), small: 'is ready' };
  }
  return { text: timeText(Math.max(turn.readyAt, now), turn.zone), estimate: true };
}

function conductorCell(turn: TurnNow): Cell {
  const conductor = turn.crew.find((member) => member.as === 'conductor');
  const heard = turn.lastHeardAt === null ? {} : { small: `heard ${clockText(turn.lastHeardAt, turn.zone)}` };
  return { text: conductor === undefined ? dash : surname(conductor.name), ...heard };
}

/** The last part of a name: what people say on the radio. */
export function surname(name: string): string {
  return name.trim().split(/\s+/).at(-1) ?? name;
}
