import type { INestApplicationContext } from '@nestjs/common';
import type { PersonAccess, Role } from '@stubpost/shared';
import { PeopleService, Reader } from '@stubpost/service';
import { demoPeople, type DemoPerson } from '../railroad/people';

/** A person of the demo as the service knows them. */
export interface CastMember extends PersonAccess {
  name: string;
}

/** The people of the demo by their keys, and by role in the order in which they were invented. */
export interface Cast {
  byKey: ReadonlyMap<string, CastMember>;
  withRole(role: Role): Array<CastMember & { key: string }>;
}

/** Crews have badges, so that a visitor who signs in as one can try a PIN. */
const badgeOf = ({ role }: DemoPerson, at: number): { badge?: string } =>
  role === 'conductor' || role === 'engineer' ? { badge: String(4401 + at) } : {};

/** The desk and whoever stands behind it can be reached by text message; the numbers are of those kept for stories. */
const phoneOf = ({ role }: DemoPerson, at: number): { phone?: string } =>
  role === 'dispatcher' || role === 'supervisor'
    ? { phone: `+1555010${String(100 + at).padStart(4, '0')}` }
    : {};

const emailOf = (person: DemoPerson): string => `${person.key}@ostrel-valley.example`;

/** Adds the people who are not there yet. They have no password: the demo's sign-in page lets visitors in. */
export async function gatherCast(app: INestApplicationContext): Promise<Cast> {
  const rows = await app.get(Reader).query<{ id: string; email: string }>('SELECT id, email FROM person');
  const idOf = new Map(rows.map((row) => [row.email, row.id]));
  const byKey = new Map<string, CastMember & { key: string; role: Role }>();
  for (const [at, person] of demoPeople.entries()) {
    const roles = [{ role: person.role, terminal: person.terminal }];
    const email = emailOf(person);
    const id =
      idOf.get(email) ??
      (
        await app.get(PeopleService).add({
          ...{ email, name: person.name, roles },
          ...badgeOf(person, at),
          ...phoneOf(person, at),
        })
      ).id;
    byKey.set(person.key, { id, name: person.name, roles, key: person.key, role: person.role });
  }
  return {
    byKey,
    withRole: (role) => [...byKey.values()].filter((member) => member.role === role),
  };
}
