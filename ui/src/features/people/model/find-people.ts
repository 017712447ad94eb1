import type { WirePerson } from '@stubpost/shared';
import { rolesInWords } from './role-words';

/** People whose name, e-mail or roles hold every word of a text, by name. */
export function findPeople(people: readonly WirePerson[], text: string): WirePerson[] {
  const words = text.toLowerCase().split(/\s+/).filter(Boolean);
  return people
    .filter((person) => {
      const facts = `${person.name} ${person.email} ${rolesInWords(person.roles)}`.toLowerCase();
      return words.every((word) => facts.includes(word));
    })
    .sort((one, other) => one.name.localeCompare(other.name));
}
