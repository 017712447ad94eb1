import { ALL_TERMINALS, grantCovers, ROLES, type PersonAccess, type Role } from './roles';

const crew = ['conductor', 'engineer'] as const;

/**
 * Which roles have which permission: the whole policy in one table (our choice, after the product's list of roles).
 */
const policy = {
  session: ROLES,
  'people.manage': ['administrator'],
  'terminals.read': ROLES,
  'terminals.manage': ['administrator'],
  'settings.read': ROLES,
  'settings.edit': ['supervisor'],
  'plans.read': ROLES,
  'plans.edit': ['supervisor'],
  'timetables.read': ['administrator', 'planner', 'analyst', 'supervisor', 'dispatcher', 'auditor'],
  'timetables.import': ['administrator'],
  'board.read': ROLES,
  'entries.read': ROLES,
  'entries.record': [...crew, 'dispatcher', 'supervisor', 'inspector'],
  'corrections.read': ['supervisor', 'dispatcher', 'auditor'],
  'turns.create': ['dispatcher'],
  'alerts.read': ROLES,
  'alerts.act': ['dispatcher', 'supervisor'],
  'crew.read': [...crew, 'dispatcher', 'supervisor'],
  'history.read': ['supervisor', 'planner', 'analyst', 'auditor', 'dispatcher', 'inspector', 'administrator'],
  'records.read': ['supervisor', 'auditor', 'administrator'],
  'history.import': ['administrator', 'analyst'],
  'sets.read': ROLES,
  'sets.edit': ['dispatcher', 'inspector', 'administrator'],
  'roster.read': ['dispatcher', 'supervisor', 'administrator'],
  'roster.edit': ['supervisor'],
  'messages.read': ['administrator'],
  'demo.leave': ['administrator'],
} as const satisfies Record<string, readonly Role[]>;

/** A right to do one kind of thing; `session` only asks for somebody who is signed in. */
export type Permission = keyof typeof policy;

/** Every permission, in the order of the policy table. */
export const PERMISSIONS = Object.keys(policy) as Permission[];

/** The roles that have a permission. */
export function rolesWith(permission: Permission): readonly Role[] {
  return policy[permission];
}

/** Whether a text names a permission. */
export function isPermission(text: string): text is Permission {
  return Object.hasOwn(policy, text);
}

/**
 * Whether a person may do a thing at a terminal. Without a terminal the question is whether they may do it
 * anywhere at all, which is right for things that belong to no terminal (people, imports). Someone without any
 * role has only `session`.
 *
 * `may({ id: 'p', roles: [{ role: 'dispatcher', terminal: 'HBR' }] }, 'turns.create', 'CAM')` is `false`.
 */
export function may(person: PersonAccess, permission: Permission, terminal?: string): boolean {
  if (permission === 'session') return true;
  const allowed: readonly Role[] = policy[permission];
  return person.roles.some(
    (grant) => allowed.includes(grant.role) && (terminal === undefined || grantCovers(grant, terminal)),
  );
}

/**
 * Whether a person may do a thing at every terminal, present and future: needed for what touches all of them
 * at once, such as giving somebody a role everywhere or importing a timetable.
 */
export function mayEverywhere(person: PersonAccess, permission: Permission): boolean {
  return may(person, permission, ALL_TERMINALS);
}

/** Codes of the terminals at which a person may do a thing; `*` alone when it is all of them. */
export function terminalsWhere(person: PersonAccess, permission: Permission): string[] {
  const allowed: readonly Role[] = policy[permission];
  const codes = person.roles.filter((grant) => allowed.includes(grant.role)).map((grant) => grant.terminal);
  return codes.includes(ALL_TERMINALS) ? [ALL_TERMINALS] : [...new Set(codes)];
}
