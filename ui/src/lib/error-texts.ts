import type { ErrorCode } from '@stubpost/shared';
import { ApiError, type TransportCode } from './api-client';

type Facts = Readonly<Record<string, unknown>>;

function fact(facts: Facts, name: string, otherwise: string): string {
  const value = facts[name];
  return typeof value === 'string' || typeof value === 'number' ? String(value) : otherwise;
}

/** Words of the first problem that the service listed, with the field it is about. */
function firstProblem(facts: Facts): string | null {
  const problems = facts['problems'];
  const first: unknown = Array.isArray(problems) ? problems[0] : undefined;
  if (typeof first !== 'object' || first === null) return null;
  const { path, message } = first as { path?: unknown; message?: unknown };
  if (typeof message !== 'string') return null;
  return typeof path === 'string' && path !== '' ? `${path}: ${message}` : message;
}

function listed(facts: Facts, name: string): string {
  const values = facts[name];
  return Array.isArray(values) ? values.join(', ') : 'with this code';
}

/** "in 2 min" from a number of seconds in the facts; "later" when there is none. */
function waiting(facts: Facts): string {
  const seconds = Number(facts['retryAfterSeconds']);
  if (!Number.isFinite(seconds) || seconds <= 0) return 'later';
  return seconds < 60 ? `in ${Math.ceil(seconds)} s` : `in ${Math.ceil(seconds / 60)} min`;
}

/**
 * Words for every refusal. The type asks for each code: a new code without words does not build. Each says the fact,
 * then what can be done.
 */
const TEXTS: Record<ErrorCode | TransportCode, (facts: Facts) => string> = {
  'transport.unreachable': () => 'The server does not answer. Check the network, then try again.',
  'transport.unreadable': () =>
    'The answer could not be read. Try again; if it stays so, tell the administrator.',
  'request.invalid': (facts) => `Something is not right: ${firstProblem(facts) ?? 'look at the fields'}.`,
  'request.malformed': () => 'The request could not be read.',
  'request.too_large': () => 'That is too large to send.',
  'request.content_type': () => 'The server does not take this kind of content.',
  'request.too_many': (facts) => `Too many requests from here. Try again ${waiting(facts)}.`,
  'route.unknown': () => 'This installation does not have that.',
  'server.fault': () => 'The server could not do this. Nothing was changed. Try again.',
  'server.busy': () => 'The server is busy. Try again in a moment.',
  'session.missing': () => 'You are signed out. Sign in to go on.',
  'session.wrong_credentials': () => 'E-mail and password do not fit together.',
  'session.other_person': () => 'Somebody else is signed in on this phone. Sign in to go on.',
  'session.cross_site': () => 'The request came from another site and was not taken.',
  'session.unknown': () => 'That session has already ended.',
  'session.too_many_tries': (facts) => `Too many tries. Try again ${waiting(facts)}.`,
  'session.wrong_password': () => 'The current password is not right.',
  'access.forbidden': () => 'Your roles do not cover this.',
  'link.unknown': () => 'This link was used, has run out, or was replaced by a newer one. Ask for a new one.',
  'setup.done': () => 'The first administrator is already there. Sign in.',
  'password.too_short': (facts) => `Too short: at least ${fact(facts, 'shortest', '8')} characters.`,
  'password.too_long': (facts) => `Too long: at most ${fact(facts, 'longest', '128')} characters.`,
  'password.common': () => 'This password is among the most used ones. Choose another.',
  'pin.too_simple': () => 'One digit repeated, or a run such as 1234, is tried first. Choose another PIN.',
  'pin.no_badge': () => 'A PIN goes with a badge. The administrator gives badges out.',
  'people.badge_taken': (facts) => `Somebody else has badge ${fact(facts, 'badge', 'of this number')}.`,
  'people.exists': () => 'Somebody with this e-mail is already there.',
  'people.unknown': () => 'This person is not there any more.',
  'people.last_administrator': () =>
    'This is the last administrator. Make somebody else administrator first.',
  'people.terminal_unknown': (facts) => `There is no terminal ${listed(facts, 'terminals')}.`,
  'people.changed': () => 'Somebody changed this person meanwhile. The new state is shown; change it again.',
  'terminal.exists': () => 'There is already a terminal with this code.',
  'terminal.unknown': (facts) => `There is no terminal ${fact(facts, 'terminal', 'with this code')}.`,
  'terminal.zone_unknown': () => 'This time zone is not known. Use a name such as America/New_York.',
  'terminal.track_twice': (facts) => `Track ${fact(facts, 'track', 'label')} is there twice.`,
  'terminal.changed': () => 'Somebody changed this terminal meanwhile. The new state is shown.',
  'settings.changed': () => 'Somebody changed these settings meanwhile. The new values are shown.',
  'turn.unknown': () => 'This turn is not there.',
  'turn.changed': () => 'Somebody was faster. The turn is shown as it now stands.',
  'turn.date_far_from_times': () => 'The service date must be within a day of the times.',
  'turn.order_of_times': () => 'The departure must not be before the arrival.',
  'entry.id_taken': () => 'Another entry has this number. It was not recorded; record it again.',
  'entry.kind_not_permitted': () => 'Your roles at this terminal do not record this.',
  'entry.at_the_controls': () =>
    'Not from the engineer at the controls. The conductor records it, the desk does from radio, or it is entered later.',
  'entry.not_yours': () => 'Only the person who wrote an entry, the desk or the supervisor takes it back.',
  'entry.own_request': () => 'You asked for this correction yourself. Somebody else has to decide on it.',
  'entry.target_unknown': () => 'The entry to take back or correct is not there.',
  'entry.step_unknown': () => 'This step is not in the plan of this turn.',
  'entry.person_unknown': () => 'This person is not there.',
  'set.unknown': () => 'This set is not there.',
  'set.changed': () => 'Somebody changed this set meanwhile. The new state is shown.',
  'set.exists': () => 'There is already a set with this name.',
  'plan.unknown': () => 'This step plan is not there.',
  'plan.invalid': (facts) => firstProblem(facts) ?? 'The step plan does not hold together.',
  'alert.unknown': () => 'This alert is not there.',
  'alert.not_standing': () => 'This alert no longer stands.',
  'alert.changed': () => 'Somebody was faster. The alert is shown as it now stands.',
  'alert.until_far': () => 'That is too long to set an alert aside.',
  'alert.never_aside': () => 'This alert cannot be set aside: it stays until somebody has acted.',
  'alert.still_standing': () => 'This alert still stands. It can be closed once it has cleared.',
  'alert.link_unknown': () =>
    'This link was used, has run out, or its alert is closed. Sign in to look at the alerts.',
  'roster.changed': () => 'Somebody changed this roster meanwhile. The new state is shown; change it again.',
  'roster.person_unfit': () =>
    'Only dispatchers and supervisors of the terminal stand on its roster. Look at the names.',
  'alert.until_past': () => 'The time to set aside until has passed.',
  'timetable.unknown': () => 'This timetable is not there.',
  'timetable.too_large': (facts) =>
    `The file is too large: at most ${fact(facts, 'limit', 'the set limit')}.`,
  'timetable.not_a_zip': () => 'The file is not a zip. Nothing was changed.',
  'timetable.file_missing': () => 'No file was chosen.',
  'timetable.not_ready': () => 'This timetable is not ready to be used.',
  'timetable.station_unknown': (facts) =>
    `The timetable has no station ${fact(facts, 'stationId', 'of that name')}.`,
  'timetable.station_twice': (facts) =>
    `${fact(facts, 'stationId', 'A station')} is in two terminals. It can be in one.`,
  'timetable.terminal_twice': (facts) => `Two terminals have the code ${fact(facts, 'terminal', 'of one')}.`,
  'timetable.not_newest': () =>
    'Another timetable was made active after this one. Only the newest can be taken back.',
  'timetable.nothing_before': () =>
    'No timetable was running before this one. There is nothing to go back to.',
  'history.import_unknown': () => 'This import is not there.',
  'history.file_missing': () => 'No file was chosen.',
  'history.too_large': (facts) => `The file is too large: at most ${fact(facts, 'limit', 'the set limit')}.`,
  'history.not_a_table': () => 'The file is not a table of comma-separated values.',
  'history.range': () => 'The last day must not be before the first.',
  'demo.off': () => 'This installation is not a demo.',
};

/** What to tell a person about a failure. Anything that is not our own refusal is a fault of the page. */
export function errorText(problem: unknown): string {
  if (!(problem instanceof ApiError)) return 'This part of the page stopped working.';
  return TEXTS[problem.code](problem.facts);
}
