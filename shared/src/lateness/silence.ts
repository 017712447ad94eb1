import { addSeconds, type Instant } from '../lib/instant';
import type { AssessedTurn } from './assessed-turn';
import type { Finding } from './finding';
import { arrivalDueAt, isAssessed } from './horizon';
import type { LatenessSettings } from './settings';
import { deskAnd, openSteps } from './words';

/** An act that should have been heard of. */
interface Expected {
  what: string;
  dueAt: Instant;
}

/**
 * The act that is 3 min past its due time with no entry and no feed message since that time; null when there has been
 * word or nothing is due. Looked at are the arrival until it is recorded, then the open steps before the departure,
 * and the departure itself once no step is open. After the departure silence is no news: the running test has a rule
 * of its own.
 */
export function findSilence(turn: AssessedTurn, settings: LatenessSettings, now: Instant): Expected | null {
  if (turn.departureAt !== null || !isAssessed(turn, now)) return null;
  const heardAt = turn.lastHeardAt ?? -Infinity;
  const silent = expectedActs(turn).filter(
    ({ dueAt }) => heardAt < dueAt && now >= addSeconds(dueAt, settings.noWordSeconds),
  );
  return silent.reduce<Expected | null>(
    (first, act) => (first === null || act.dueAt < first.dueAt ? act : first),
    null,
  );
}

function expectedActs(turn: AssessedTurn): Expected[] {
  const arrives = arrivalDueAt(turn);
  if (arrives !== null && turn.arrivalAt === null) return [{ what: 'Arrival', dueAt: arrives }];
  const open = openSteps(turn).filter((step) => !step.isAfterDeparture);
  if (open.length > 0) return open.map(({ shortLabel, dueAt }) => ({ what: shortLabel, dueAt }));
  const { departureAnchorAt } = turn.forecast;
  return departureAnchorAt === null ? [] : [{ what: 'Departure', dueAt: departureAnchorAt }];
}

/** *No word*: as `findSilence`, in words. */
export function findNoWord(turn: AssessedTurn, settings: LatenessSettings, now: Instant): Finding | null {
  const silence = findSilence(turn, settings, now);
  if (silence === null) return null;
  const { lastHeardAt } = turn;
  const heard =
    lastHeardAt === null
      ? 'Nothing heard yet'
      : `Nothing heard since ${settings.formatExactTime(lastHeardAt)}`;
  return {
    cause: 'no-word',
    priority: 'watch',
    text: `${heard}; ${silence.what.toLowerCase()} due ${settings.formatTime(silence.dueAt)}`,
    action: 'Radio the crew; if there is no answer, send somebody.',
    actor: deskAnd(turn, 'conductor'),
    byWhen: null,
    lines: [],
  };
}

/**
 * *Crew*: the engineer is not recorded in the leaving cab so many seconds before the departure. Off unless the
 * terminal sets the time.
 */
export function findEngineerAbsent(
  turn: AssessedTurn,
  settings: LatenessSettings,
  now: Instant,
): Finding | null {
  const { departureAnchorAt } = turn.forecast;
  const step = openSteps(turn).find((each) => each.mansCab);
  if (settings.engineerAboardSeconds === null || departureAnchorAt === null) return null;
  if (step === undefined || turn.departureAt !== null) return null;
  const aboardBy = addSeconds(departureAnchorAt, -settings.engineerAboardSeconds);
  if (now < aboardBy) return null;
  return {
    cause: 'crew',
    priority: 'act-soon',
    text: `Engineer not in the leaving cab, due ${settings.formatTime(aboardBy)}`,
    action: 'Call the engineer; if there is no answer, call the crew desk.',
    actor: deskAnd(turn, 'engineer'),
    byWhen: step.latestFinishAt,
    lines: [],
  };
}
