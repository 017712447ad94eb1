import { Injectable } from '@nestjs/common';
import {
  ALL_TERMINALS,
  CREW_ROLES,
  type CrewMember,
  type CrewRole,
  formatInstant,
  type Role,
  type WirePerson,
} from '@stubpost/shared';
import { sessionIdleMilliseconds } from '../auth/sessions.service';
import { Clock } from '../common/clock';
import { Refusal } from '../common/refusal';
import { Reader } from '../database/reader';

interface PersonWithSessionsRow {
  id: string;
  version: number;
  email: string;
  name: string;
  active: number | boolean;
  has_password: number | boolean;
  badge: string | null;
  phone: string | null;
  has_pin: number | boolean;
  sessions: number;
  last_seen_at: number | null;
}

interface RoleRow {
  person_id: string;
  role: Role;
  terminal: string;
}

/** A name and the jobs it may be put down for. */
interface CrewRow {
  id: string;
  name: string;
  badge: string | null;
  role: CrewRole;
}

/** People as the administrator's page and the pickers of the desk show them. */
@Injectable()
export class PeopleReadModel {
  constructor(
    private readonly reader: Reader,
    private readonly clock: Clock,
  ) {}

  async all(): Promise<WirePerson[]> {
    return this.people('', []);
  }

  async one(id: string): Promise<WirePerson> {
    const [person] = await this.people('WHERE p.id = ?', [id]);
    if (person === undefined)
      throw new Refusal({ code: 'people.unknown', message: 'there is no such person' });
    return person;
  }

  /** Whether anybody at all can sign in; an installation without people still has to be set up. */
  async isAnybodyThere(): Promise<boolean> {
    const rows = await this.reader.query('SELECT id FROM person LIMIT 1');
    return rows.length > 0;
  }

  /** Conductors and engineers of a terminal by name. */
  async crewOf(terminal: string): Promise<CrewMember[]> {
    const rows = await this.reader.query<CrewRow>(
      `SELECT DISTINCT p.id, p.name, p.badge, r.role FROM person p JOIN person_role r ON r.person_id = p.id
       WHERE p.active = ? AND r.terminal IN (?, ?) AND r.role IN (?, ?) ORDER BY p.name, p.id`,
      [true, terminal, ALL_TERMINALS, ...CREW_ROLES],
    );
    const members = new Map<string, CrewMember>();
    for (const row of rows) {
      const badge = row.badge === null ? {} : { badge: row.badge };
      const member = members.get(row.id) ?? { id: row.id, name: row.name, as: [], ...badge };
      member.as.push(row.role);
      members.set(row.id, member);
    }
    return [...members.values()];
  }

  /** The name of an active person, for entries that put somebody on a turn; null when there is no such person. */
  async nameOf(id: string): Promise<string | null> {
    const [row] = await this.reader.query<{ name: string }>(
      'SELECT name FROM person WHERE id = ? AND active = ?',
      [id, true],
    );
    return row?.name ?? null;
  }

  private async people(where: string, parameters: unknown[]): Promise<WirePerson[]> {
    const now = this.clock.now();
    const rows = await this.reader.query<PersonWithSessionsRow>(
      `SELECT p.id, p.version, p.email, p.name, p.active, p.password_hash IS NOT NULL AS has_password,
       p.badge, p.phone, p.pin_hash IS NOT NULL AS has_pin,
       (SELECT COUNT(*) FROM session s WHERE s.person_id = p.id AND s.ended_at IS NULL AND s.ends_at > ?
        AND s.last_seen_at > ?) AS sessions,
       (SELECT MAX(s.last_seen_at) FROM session s WHERE s.person_id = p.id) AS last_seen_at
       FROM person p ${where} ORDER BY p.name, p.id`,
      [now, now - sessionIdleMilliseconds, ...parameters],
    );
    const roles = await this.reader.query<RoleRow>(
      'SELECT person_id, role, terminal FROM person_role ORDER BY terminal, role',
    );
    return rows.map((row) => toWirePerson(row, roles));
  }
}

function toWirePerson(row: PersonWithSessionsRow, roles: readonly RoleRow[]): WirePerson {
  return {
    id: row.id,
    version: row.version,
    email: row.email,
    name: row.name,
    active: Boolean(row.active),
    hasPassword: Boolean(row.has_password),
    badge: row.badge,
    hasPin: Boolean(row.has_pin),
    phone: row.phone,
    roles: roles
      .filter((grant) => grant.person_id === row.id)
      .map((grant) => ({ role: grant.role, terminal: grant.terminal })),
    sessions: Number(row.sessions),
    lastSeenAt: row.last_seen_at === null ? null : formatInstant(Number(row.last_seen_at)),
  };
}
