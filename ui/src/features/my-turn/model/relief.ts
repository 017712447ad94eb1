import type { CrewMember, CrewRole } from '@stubpost/shared';

/** How many names a page of the phone shows at once. Our choice: more are scrolled past, not read. */
export const mostNames = 6;

/** Who of the terminal's crews may take a job over, by a part of the name or the badge; the person themselves is left out. */
export function whoFits(
  people: readonly CrewMember[],
  { role, typed, notId }: { role: CrewRole; typed: string; notId: string },
): { shown: CrewMember[]; words: string } {
  const wanted = typed.trim().toLowerCase();
  const fitting = people
    .filter((person) => person.id !== notId && person.as.includes(role))
    .filter((person) => textOf(person).includes(wanted))
    .sort((a, b) => a.name.localeCompare(b.name));
  const more = fitting.length - mostNames;
  const words =
    fitting.length === 0
      ? `No ${role} of this terminal fits.`
      : more > 0
        ? `${more} more: type a part of the name.`
        : '';
  return { shown: fitting.slice(0, mostNames), words };
}

const textOf = ({ name, badge = '' }: CrewMember): string => `${name} ${badge}`.toLowerCase();

/**
 * What a relief away from the train brings. Source: 49 CFR 238.317(a)(5), Class II test when an operator first takes
 * charge and was not relieved face to face; text of the current edition not confirmed by the railroad.
 */
export function reliefConsequence(role: CrewRole): string {
  return role === 'engineer'
    ? 'Not face to face asks for a Class II brake test: 49 CFR 238.317(a)(5).'
    : 'The relief of a conductor asks for no brake test.';
}
