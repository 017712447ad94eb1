/**
 * Every code an answer can carry when it says no, with its HTTP status: one list per area. The texts for people
 * live in the browser's catalogue, whose type is made from these lists.
 */
const requestErrors = {
  'request.invalid': 400,
  'request.malformed': 400,
  'request.too_large': 413,
  'request.content_type': 415,
  'request.too_many': 429,
  'route.unknown': 404,
  'server.fault': 500,
  'server.busy': 503,
} as const;

const sessionErrors = {
  'session.missing': 401,
  'session.wrong_credentials': 401,
  'session.other_person': 401,
  'session.cross_site': 403,
  'session.unknown': 404,
  'session.too_many_tries': 429,
  'session.wrong_password': 403,
  'access.forbidden': 403,
  'link.unknown': 404,
  'setup.done': 409,
  'password.too_short': 400,
  'password.too_long': 400,
  'password.common': 400,
  'pin.too_simple': 400,
  'pin.no_badge': 409,
} as const;

const peopleErrors = {
  'people.exists': 409,
  'people.badge_taken': 409,
  'people.unknown': 404,
  'people.last_administrator': 409,
  'people.terminal_unknown': 400,
  'people.changed': 412,
} as const;

const terminalErrors = {
  'terminal.exists': 409,
  'terminal.unknown': 404,
  'terminal.zone_unknown': 400,
  'terminal.track_twice': 400,
  'terminal.changed': 412,
  'settings.changed': 412,
} as const;

const turnErrors = {
  'turn.unknown': 404,
  'turn.changed': 412,
  'turn.date_far_from_times': 400,
  'turn.order_of_times': 400,
  'entry.id_taken': 409,
  'entry.kind_not_permitted': 403,
  'entry.at_the_controls': 403,
  'entry.not_yours': 403,
  'entry.own_request': 403,
  'entry.target_unknown': 400,
  'entry.step_unknown': 400,
  'entry.person_unknown': 400,
  'set.unknown': 404,
  'set.exists': 409,
  'set.changed': 412,
  'plan.unknown': 404,
  'plan.invalid': 400,
} as const;

const alertErrors = {
  'alert.unknown': 404,
  'alert.not_standing': 409,
  'alert.changed': 412,
  'alert.until_past': 400,
  'alert.until_far': 400,
  'alert.never_aside': 409,
  'alert.still_standing': 409,
  'alert.link_unknown': 404,
  'roster.changed': 412,
  'roster.person_unfit': 400,
} as const;

const timetableErrors = {
  'timetable.unknown': 404,
  'timetable.too_large': 413,
  'timetable.not_a_zip': 422,
  'timetable.file_missing': 400,
  'timetable.not_ready': 409,
  'timetable.station_unknown': 400,
  'timetable.station_twice': 400,
  'timetable.terminal_twice': 400,
  'timetable.not_newest': 409,
  'timetable.nothing_before': 409,
} as const;

const historyErrors = {
  'history.import_unknown': 404,
  'history.file_missing': 400,
  'history.too_large': 413,
  'history.not_a_table': 422,
  'history.range': 400,
} as const;

const demoErrors = {
  'demo.off': 404,
} as const;

/** Status of every code; the one place where a code gets its status. */
export const ERROR_STATUSES = {
  ...requestErrors,
  ...sessionErrors,
  ...peopleErrors,
  ...terminalErrors,
  ...turnErrors,
  ...alertErrors,
  ...timetableErrors,
  ...historyErrors,
  ...demoErrors,
} as const;

/** A dotted `area.reason` code of a refusal. */
export type ErrorCode = keyof typeof ERROR_STATUSES;

/** Whether a text is one of our codes. */
export function isErrorCode(text: string): text is ErrorCode {
  return Object.hasOwn(ERROR_STATUSES, text);
}
