import { formatDuration } from '../lib/zone-time';
import type { AssessedStep, AssessedTurn } from './assessed-turn';
import type { Finding } from './finding';
import { lateSlackSeconds } from './horizon';
import type { LatenessSettings } from './settings';
import { calledWords, deskAnd, openSteps } from './words';

/**
 * *Late departure*: one finding while slack is below 0, however many steps are late. Its lines are the open steps
 * whose finish by the forecast lies past their latest finish. *Act soon* when short by 6 min or more, else *Watch*.
 * None once the train has left.
 */
export function findLateDeparture(turn: AssessedTurn, settings: LatenessSettings): Finding | null {
  const slack = lateSlackSeconds(turn);
  if (turn.departureAt !== null || slack === null || slack >= 0) return null;
  const deciding = openSteps(turn).find((step) => step.key === turn.forecast.criticalSteps[0]);
  const doer = deciding?.doer ?? 'conductor';
  return {
    cause: 'late-departure',
    priority: slack <= -settings.actSoonSeconds ? 'act-soon' : 'watch',
    text: `${whatIsWrong(turn, deciding, settings)}; ${leavesWords(turn, settings)}`,
    action: whatToDo(turn, deciding),
    actor: deskAnd(turn, doer),
    byWhen: deciding?.latestFinishAt ?? turn.forecast.departureAnchorAt,
    lines: openSteps(turn)
      .filter((step) => step.holdsDeparture && step.finishAt > step.latestFinishAt)
      .map((step) => lineOf(step, settings)),
  };
}

function hasCome(turn: AssessedTurn): boolean {
  return turn.kind === 'first-out' || turn.arrivalAt !== null;
}

function whatIsWrong(turn: AssessedTurn, step: AssessedStep | undefined, settings: LatenessSettings): string {
  const { arrivalAnchorAt } = turn.forecast;
  if (!hasCome(turn) && arrivalAnchorAt !== null) {
    return `Not in yet, expected ${settings.formatTime(arrivalAnchorAt)}`;
  }
  if (step === undefined) return 'Ready late';
  const latest = settings.formatTime(step.latestFinishAt);
  if (step.cannotDo !== null) return `${step.label} cannot be done (${step.cannotDo}), latest ${latest}`;
  return `${step.label} not recorded, latest ${latest}`;
}

function leavesWords(turn: AssessedTurn, settings: LatenessSettings): string {
  const { readyAt, departureAnchorAt, slackSeconds } = turn.forecast;
  if (readyAt === null || departureAnchorAt === null) return 'no forecast';
  const short = formatDuration(Math.ceil((slackSeconds ?? 0) / 60) * 60);
  const ready = `ready about ${settings.formatTime(readyAt)}, leaves ${settings.formatTime(departureAnchorAt)}`;
  return (slackSeconds ?? 0) <= -60 ? `${ready}, ${short} short` : ready;
}

function whatToDo(turn: AssessedTurn, step: AssessedStep | undefined): string {
  if (!hasCome(turn)) return 'Ask for a second person at the turn, another set, or a later departure.';
  if (step === undefined) return 'Tell the next station and give the cause when the train has left.';
  if (step.cannotDo !== null) return 'Send help, or arrange another set or a later departure.';
  return `Call ${calledWords(turn, step.doer)}. If it is done, record it by radio; if not, send help or arrange a later departure.`;
}

function lineOf(step: AssessedStep, settings: LatenessSettings): string {
  const due = `due ${settings.formatTime(step.dueAt)}, latest ${settings.formatTime(step.latestFinishAt)}`;
  return `${step.shortLabel}: ${due}, about ${settings.formatTime(step.finishAt)}`;
}
