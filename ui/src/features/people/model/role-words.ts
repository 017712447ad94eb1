import { ALL_TERMINALS, ROLES, type Role, type RoleGrant } from '@stubpost/shared';
import { ROLE_WORDS } from '../../../components/words';

/** Roles in words, those of one kind together: "Conductor at HBR, CAM; Supervisor everywhere". */
export function rolesInWords(grants: readonly RoleGrant[]): string {
  const byRole = new Map<Role, string[]>();
  for (const { role, terminal } of grants) byRole.set(role, [...(byRole.get(role) ?? []), terminal]);
  const words = ROLES.filter((role) => byRole.has(role)).map((role) => {
    const terminals = byRole.get(role) ?? [];
    const where = terminals.includes(ALL_TERMINALS) ? 'everywhere' : `at ${terminals.sort().join(', ')}`;
    return `${ROLE_WORDS[role]} ${where}`;
  });
  return words.length === 0 ? 'No role' : words.join('; ');
}

/** The same grants without doubles, and without single terminals of a role that is held everywhere. */
export function tidyGrants(grants: readonly RoleGrant[]): RoleGrant[] {
  const everywhere = new Set(
    grants.filter(({ terminal }) => terminal === ALL_TERMINALS).map(({ role }) => role),
  );
  const seen = new Set<string>();
  return grants.filter(({ role, terminal }) => {
    const key = `${role} ${terminal}`;
    const isCovered = everywhere.has(role) && terminal !== ALL_TERMINALS;
    if (isCovered || seen.has(key)) return false;
    seen.add(key);
    return true;
  });
}
