import { addSeconds, type Instant } from '../lib/instant';
import { formatDuration } from '../lib/zone-time';
import type { AssessedStep, AssessedTurn } from './assessed-turn';
import type { Finding } from './finding';
import type { LatenessSettings } from './settings';
import { calledWords, deskAnd, openSteps } from './words';

/**
 * *No required record*: the train left without a record of a brake test or a securement step that its plan lets the
 * departure wait for; one finding with a line for each. Before the departure it stands while fewer handbrakes are
 * released than were set: the count must agree before the train moves.
 */
export function findNoRequiredRecord(turn: AssessedTurn, settings: LatenessSettings): Finding | null {
  return turn.departureAt === null
    ? findSmallerCount(turn)
    : findLeftWithout(turn, turn.departureAt, settings);
}

function findLeftWithout(
  turn: AssessedTurn,
  departureAt: Instant,
  settings: LatenessSettings,
): Finding | null {
  const missing = openSteps(turn).filter(isRequired);
  const [first] = missing;
  if (first === undefined) return null;
  return {
    cause: 'no-required-record',
    priority: 'act-now',
    text: `Left at ${settings.formatExactTime(departureAt)}, not recorded: ${missing.map((step) => step.label).join('; ')}`,
    action:
      'Ask the crew. If it was done, enter it later; if not, the railroad’s rule for a missing test decides.',
    actor: deskAnd(turn, first.doer),
    byWhen: null,
    lines: missing.map((step) => `${step.shortLabel}: no record, due ${settings.formatTime(step.dueAt)}`),
  };
}

function isRequired(step: AssessedStep): boolean {
  return step.holdsDeparture && (step.kind === 'brake-test' || step.kind === 'securement');
}

function findSmallerCount(turn: AssessedTurn): Finding | null {
  const { set, released, carsStillSet } = turn.handbrakes;
  if (set === null || released === null || released === 0 || released >= set) return null;
  const cars = carsStillSet.length > 0 ? ` Still set: car ${carsStillSet.join(', ')}.` : '';
  return {
    cause: 'no-required-record',
    priority: 'act-now',
    text: `${released} of ${set} handbrakes released.${cars}`,
    action: `Call ${calledWords(turn, 'conductor')}: release the rest, or correct the count.`,
    actor: deskAnd(turn, 'conductor'),
    byWhen: turn.forecast.departureAnchorAt,
    lines: [],
  };
}

/**
 * *Running test* not recorded 20 min after the departure, or when the train is recorded at its next stop if that is
 * earlier. Stands until it is recorded or the turn is closed.
 */
export function findRunningTest(
  turn: AssessedTurn,
  settings: LatenessSettings,
  now: Instant,
): Finding | null {
  const { departureAt, nextStopAt } = turn;
  const step = openSteps(turn).find((each) => each.isAfterDeparture && each.kind === 'brake-test');
  if (departureAt === null || step === undefined) return null;
  const limit = addSeconds(departureAt, settings.runningTestSeconds);
  const from = nextStopAt === null ? limit : Math.min(limit, nextStopAt);
  if (now < from) return null;
  const passed =
    now >= limit ? `${formatDuration(settings.runningTestSeconds)} after it left` : 'at its next stop';
  return {
    cause: 'running-test',
    priority: 'act-soon',
    text: `${step.label} not recorded ${passed} at ${settings.formatExactTime(departureAt)}`,
    action: 'Ask by radio when the crew may answer, then record what they say and when it was.',
    actor: deskAnd(turn, 'conductor'),
    byWhen: null,
    lines: [],
  };
}
