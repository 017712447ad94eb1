/**
 * Header by which a request says whose it is, as a person's id. With somebody else signed in it is refused (401
 * `session.other_person`): an entry kept on a shared phone must never be recorded as the act of the next person.
 */
export const personHeader = 'stubpost-person';
