import type { Instant } from '@stubpost/shared';
import { HEALTH_WORDS, TURN_STATE_WORDS } from '../../../components/words';
import { formatSlackWords, formatTime } from '../../../lib/time-display';
import type { BoardStep, BoardTurn } from './board-turn';
import { healthFlag } from './health-words';
import { arrivalOf, departureOf, isFarOffPlan, isOver, isStanding } from './turn-times';

const lowerFirst = (text: string): string => text.charAt(0).toLowerCase() + text.slice(1);

/** The step that is to be done next: the first overdue one, else the first that is open before the departure. */
export function nextStep(turn: BoardTurn): BoardStep | null {
  const open = turn.steps.filter((step) => step.doneAt === null && step.state !== 'not-needed');
  const overdue = open.find((step) => step.state === 'overdue');
  const side = turn.departedAt === null ? open.filter((step) => step.holdsDeparture) : open;
  return overdue ?? side[0] ?? null;
}

/** A step in words: "cab brake check not recorded, due 17:24", "handbrake set recorded 17:20, by radio". */
export function stepWords(step: BoardStep, zone: string): string {
  const name = lowerFirst(step.label);
  const due = step.dueAt === null ? '' : `, due ${formatTime(step.dueAt, zone)}`;
  if (step.doneAt !== null) {
    const relayed = step.source === 'by-radio' ? ', by radio' : step.source === 'entered-later' ? ', entered later' : '';
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

function placeWords(turn: BoardTurn): string {
  return turn.track === null ? 'no track yet' : `track ${turn.track}`;
}

function arrivalWords(turn: BoardTurn, zone: string): string {
  if (turn.arrivedAt !== null) return `in since ${formatTime(turn.arrivedAt, zone)}`;
  const at = arrivalOf(turn);
  if (at === null) return 'first train out';
  const late = turn.expectedArrivalAt !== null && at > (turn.scheduledArrivalAt ?? at);
  return `${late ? 'expected' : 'due in'} ${formatTime(at, zone)}`;
}

function departureWords(turn: BoardTurn, zone: string): string {
  if (turn.departedAt !== null) return `left ${formatTime(turn.departedAt, zone)}`;
  const leaves = departureOf(turn);
  if (leaves === null) return 'ties up here';
  const held = turn.heldUntil !== null && turn.heldUntil > (turn.scheduledDepartureAt ?? turn.heldUntil);
  return `${held ? 'held until' : 'leaves'} ${formatTime(leaves, zone)}`;
}

function standingWords(turn: BoardTurn, now: Instant): string {
  if (turn.health === 'no-word' || turn.health === 'late') return lowerFirst(healthFlag(turn, now) ?? '').replace(/min$/, 'minutes');
  return formatSlackWords(turn.slackSeconds);
}

function alertWords(turn: BoardTurn): string {
  const standing = turn.alerts.filter(isStanding);
  if (standing.length === 0) return '';
  const untaken = standing.filter((alert) => alert.state === 'raised').length;
  const count = `${standing.length} ${standing.length === 1 ? 'alert' : 'alerts'}`;
  return `. ${count}${untaken > 0 ? `, ${untaken === standing.length ? '' : `${untaken} `}not taken` : ''}`;
}

/** A turn as it is read out when its row has the focus: place, train, times, how it stands, what is next, alerts. */
export function rowWords(turn: BoardTurn, now: Instant): string {
  const { zone } = turn;
  const start = `${placeWords(turn)}, train ${turn.train}`;
  if (turn.annulled !== null) return sentence(`${start}, annulled: ${turn.annulled.reason}`);
  const parts = [start, lowerFirst(TURN_STATE_WORDS[turn.state]), arrivalWords(turn, zone), departureWords(turn, zone)];
  if (!isOver(turn)) parts.push(standingWords(turn, now), ...markedWords(turn));
  const next = isFarOffPlan(turn) ? null : nextStep(turn);
  if (next !== null) parts.push(stepWords(next, zone));
  return sentence(parts.filter(Boolean).join(', ') + alertWords(turn));
}

function markedWords(turn: BoardTurn): string[] {
  const health = turn.health === 'tight' ? [lowerFirst(HEALTH_WORDS.tight)] : [];
  return turn.blueSignal === null ? health : [...health, `blue signal up, ${turn.blueSignal.by}`];
}

const sentence = (text: string): string => `${text.charAt(0).toUpperCase()}${text.slice(1)}.`;
