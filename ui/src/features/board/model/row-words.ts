import type { Instant } from '@stubpost/shared';
import { HEALTH_WORDS, TURN_STATE_WORDS } from '../../../components/words';
import { formatSlackWords, formatTime } from '../../../lib/time-display';
import { lowerFirst, nextStep, stepWords } from '../../../lib/turn/step-words';
import type { TurnNow } from '../../../lib/turn/turn-now';
import { healthFlag } from '../../../lib/turn/health-flag';
import {
  arrivalOf,
  departureOf,
  isFarOffPlan,
  isOver,
  isStanding,
  shownSlack,
} from '../../../lib/turn/turn-times';

function placeWords(turn: TurnNow): string {
  return turn.track === null ? 'no track yet' : `track ${turn.track}`;
}

function arrivalWords(turn: TurnNow, zone: string): string {
  if (turn.arrivedAt !== null) return `in since ${formatTime(turn.arrivedAt, zone)}`;
  const at = arrivalOf(turn);
  if (at === null) return 'first train out';
  const late = turn.expectedArrivalAt !== null && at > (turn.scheduledArrivalAt ?? at);
  return `${late ? 'expected' : 'due in'} ${formatTime(at, zone)}`;
}

function departureWords(turn: TurnNow, zone: string): string {
  if (turn.departedAt !== null) return `left ${formatTime(turn.departedAt, zone)}`;
  const leaves = departureOf(turn);
  if (leaves === null) return 'ties up here';
  const held = turn.heldUntil !== null && turn.heldUntil > (turn.scheduledDepartureAt ?? turn.heldUntil);
  return `${held ? 'held until' : 'leaves'} ${formatTime(leaves, zone)}`;
}

function standingWords(turn: TurnNow, now: Instant): string {
  if (turn.health === 'no-word' || turn.health === 'late')
    return lowerFirst(healthFlag(turn, now) ?? '').replace(/min$/, 'minutes');
  return formatSlackWords(shownSlack(turn));
}

function alertWords(turn: TurnNow): string {
  const standing = turn.alerts.filter(isStanding);
  if (standing.length === 0) return '';
  const untaken = standing.filter((alert) => alert.state === 'raised').length;
  const count = `${standing.length} ${standing.length === 1 ? 'alert' : 'alerts'}`;
  return `. ${count}${untaken > 0 ? `, ${untaken === standing.length ? '' : `${untaken} `}not taken` : ''}`;
}

/** A turn as it is read out when its row has the focus: place, train, times, how it stands, what is next, alerts. */
export function rowWords(turn: TurnNow, now: Instant): string {
  const { zone } = turn;
  const start = `${placeWords(turn)}, train ${turn.train}`;
  if (turn.annulled !== null) return sentence(`${start}, annulled: ${turn.annulled.reason}`);
  const parts = [
    start,
    lowerFirst(TURN_STATE_WORDS[turn.state]),
    arrivalWords(turn, zone),
    departureWords(turn, zone),
  ];
  if (!isOver(turn)) parts.push(standingWords(turn, now), ...markedWords(turn));
  const next = isFarOffPlan(turn) ? null : nextStep(turn);
  if (next !== null) parts.push(stepWords(next, zone));
  return sentence(parts.filter(Boolean).join(', ') + alertWords(turn));
}

function markedWords(turn: TurnNow): string[] {
  const health = turn.health === 'tight' ? [lowerFirst(HEALTH_WORDS.tight)] : [];
  return turn.blueSignal === null ? health : [...health, `blue signal up, ${turn.blueSignal.by}`];
}

const sentence = (text: string): string => `${text.charAt(0).toUpperCase()}${text.slice(1)}.`;
