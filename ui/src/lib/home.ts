import type { Role, SignedInPerson } from '@stubpost/shared';

const HOMES: Record<Role, string> = {
  dispatcher: '/board',
  supervisor: '/board',
  inspector: '/board',
  conductor: '/my',
  engineer: '/my',
  planner: '/history',
  analyst: '/history',
  auditor: '/records',
  administrator: '/people',
};

/** Name of each home page, as the page names and the sign-in list call it. */
export const HOME_NAMES: Record<string, string> = {
  '/board': 'Board',
  '/my': 'My turns',
  '/history': 'History',
  '/records': 'Records',
  '/people': 'People',
};

/** Where a role starts: the page it works with. `/board` leads on to the board of the person's terminal. */
export function homeOfRole(role: Role): string {
  return HOMES[role];
}

/** Where a person starts. With several roles the one nearest to the trains counts; without any, help. */
export function homeOf(person: Pick<SignedInPerson, 'roles'>): string {
  const held = new Set(person.roles.map(({ role }) => role));
  const first = (Object.keys(HOMES) as Role[]).find((role) => held.has(role));
  return first === undefined ? '/help' : HOMES[first];
}
