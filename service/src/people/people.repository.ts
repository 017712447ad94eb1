import { Injectable } from '@nestjs/common';
import { ALL_TERMINALS, type Role, type RoleGrant, type UpdatePersonRequest } from '@stubpost/shared';
import { Clock } from '../common/clock';
import { Refusal } from '../common/refusal';
import { Reader } from '../database/reader';
import type { Transaction } from '../database/unit-of-work';
import { PersonRoleRow } from './person-role.entity';
import { PersonRow } from './person.entity';

/** What a new row needs. */
export interface NewPerson {
  id: string;
  email: string;
  name: string;
  passwordHash: string | null;
  badge: string | null;
  phone: string | null;
  roles: readonly RoleGrant[];
}

/** Rows of people and their roles: the writing side. */
@Injectable()
export class PeopleRepository {
  constructor(
    private readonly reader: Reader,
    private readonly clock: Clock,
  ) {}

  async find(id: string): Promise<PersonRow> {
    const person = await this.reader.manager.findOneBy(PersonRow, { id });
    return person ?? refuseUnknown();
  }

  async require(transaction: Transaction, id: string): Promise<PersonRow> {
    const person = await transaction.manager.findOneBy(PersonRow, { id });
    return person ?? refuseUnknown();
  }

  async rolesOf(transaction: Transaction, personId: string): Promise<RoleGrant[]> {
    const rows = await transaction.manager.findBy(PersonRoleRow, { personId });
    return rows.map(({ role, terminal }) => ({ role: role as Role, terminal }));
  }

  isTaken(transaction: Transaction, email: string): Promise<boolean> {
    return transaction.manager.existsBy(PersonRow, { email });
  }

  /** Whether somebody else has that badge. */
  async isBadgeTaken(transaction: Transaction, badge: string, exceptId: string | null): Promise<boolean> {
    const holder = await transaction.manager.findOneBy(PersonRow, { badge });
    return holder !== null && holder.id !== exceptId;
  }

  isAnybodyThere(transaction: Transaction): Promise<boolean> {
    return transaction.manager.exists(PersonRow);
  }

  async isAnAdministratorLeft(transaction: Transaction): Promise<boolean> {
    const rows = await transaction.query<unknown[]>(
      `SELECT p.id FROM person p JOIN person_role r ON r.person_id = p.id
       WHERE p.active = ? AND r.role = 'administrator' AND r.terminal = ? LIMIT 1`,
      [true, ALL_TERMINALS],
    );
    return rows.length > 0;
  }

  async unknownTerminals(transaction: Transaction, roles: readonly RoleGrant[]): Promise<string[]> {
    const rows = await transaction.query<{ code: string }[]>('SELECT code FROM terminal');
    const known = new Set([ALL_TERMINALS, ...rows.map((row) => row.code)]);
    return [...new Set(roles.map((grant) => grant.terminal))].filter((code) => !known.has(code));
  }

  async insert(transaction: Transaction, person: NewPerson): Promise<void> {
    await transaction.manager.insert(PersonRow, {
      id: person.id,
      version: 1,
      email: person.email,
      name: person.name,
      passwordHash: person.passwordHash,
      badge: person.badge,
      pinHash: null,
      phone: person.phone,
      active: true,
      createdAt: this.clock.now(),
    });
    await this.putRoles(transaction, person.id, person.roles);
  }

  async update(transaction: Transaction, person: PersonRow, change: UpdatePersonRequest): Promise<void> {
    const changed = await transaction.manager.update(
      PersonRow,
      { id: person.id, version: person.version },
      {
        name: change.name ?? person.name,
        active: change.active ?? person.active,
        badge: change.badge === undefined ? person.badge : change.badge,
        // A PIN without a badge opens nothing, and one that waits for the next badge would surprise.
        pinHash: change.badge === null ? null : person.pinHash,
        phone: change.phone === undefined ? person.phone : change.phone,
        version: person.version + 1,
      },
    );
    if (changed.affected !== 1) throw new Error(`person ${person.id} changed inside its own transaction`);
    if (change.roles === undefined) return;
    await transaction.manager.delete(PersonRoleRow, { personId: person.id });
    await this.putRoles(transaction, person.id, change.roles);
  }

  async setPassword(transaction: Transaction, id: string, passwordHash: string): Promise<void> {
    await transaction.execute('UPDATE person SET password_hash = ?, version = version + 1 WHERE id = ?', [
      passwordHash,
      id,
    ]);
  }

  private async putRoles(
    transaction: Transaction,
    personId: string,
    roles: readonly RoleGrant[],
  ): Promise<void> {
    const distinct = new Map(roles.map((grant) => [`${grant.role} ${grant.terminal}`, grant]));
    for (const { role, terminal } of distinct.values()) {
      await transaction.manager.insert(PersonRoleRow, { personId, role, terminal });
    }
  }
}

function refuseUnknown(): never {
  throw new Refusal({ code: 'people.unknown', message: 'there is no such person' });
}
