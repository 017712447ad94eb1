/** Every role a person can have. One person may hold several, each at named terminals or at all of them. */
export const ROLES = [
  'conductor',
  'engineer',
  'dispatcher',
  'supervisor',
  'inspector',
  'planner',
  'analyst',
  'auditor',
  'administrator',
] as const;
export type Role = (typeof ROLES)[number];

/** Stands for every terminal, present and future, in a role grant. */
export const ALL_TERMINALS = '*';

/** One role at one terminal (its code) or at all of them (`*`). */
export interface RoleGrant {
  role: Role;
  terminal: string;
}

/** What the policy needs to know about a person. */
export interface PersonAccess {
  id: string;
  roles: readonly RoleGrant[];
}

/** Whether a grant reaches a terminal. `{ terminal: '*' }` reaches every one. */
export function grantCovers(grant: RoleGrant, terminal: string): boolean {
  return grant.terminal === ALL_TERMINALS || grant.terminal === terminal;
}

/** The roles a person holds at a terminal, without doubles. */
export function rolesAt(person: PersonAccess, terminal: string): Role[] {
  return [
    ...new Set(person.roles.filter((grant) => grantCovers(grant, terminal)).map((grant) => grant.role)),
  ];
}

/** Whether a text names a role. */
export function isRole(text: string): text is Role {
  return (ROLES as readonly string[]).includes(text);
}
