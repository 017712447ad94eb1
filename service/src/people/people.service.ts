import { randomUUID } from 'node:crypto';
import { Injectable, Logger } from '@nestjs/common';
import {
  ALL_TERMINALS,
  type CreatePersonRequest,
  type OneTimeLink,
  type PersonAccess,
  type RoleGrant,
  type UpdatePersonRequest,
} from '@stubpost/shared';
import { OneTimeLinks } from '../auth/one-time-links.service';
import { Passwords } from '../auth/passwords';
import { SessionsService } from '../auth/sessions.service';
import { Access } from '../common/access';
import { Refusal } from '../common/refusal';
import { type Transaction, UnitOfWork } from '../database/unit-of-work';
import { PeopleRepository } from './people.repository';
import type { PersonRow } from './person.entity';

/** A person who was just added, with the link that lets them choose a password where none was given. */
export interface AddedPerson {
  id: string;
  link: OneTimeLink | null;
}

/** Adds people, changes what they may do, and gives or takes away their ways in. */
@Injectable()
export class PeopleService {
  private readonly logger = new Logger('people');

  constructor(
    private readonly unitOfWork: UnitOfWork,
    private readonly people: PeopleRepository,
    private readonly access: Access,
    private readonly passwords: Passwords,
    private readonly links: OneTimeLinks,
    private readonly sessions: SessionsService,
  ) {}

  /** Adds a person. Without an actor it is the installation itself that does. */
  async add(request: CreatePersonRequest, actor?: PersonAccess): Promise<AddedPerson> {
    this.requireReach(actor, request.roles);
    const passwordHash = await this.hashOf(request);
    return this.unitOfWork.run(async (transaction) => {
      const id = await this.insert(transaction, request, passwordHash);
      const link = passwordHash === null ? await this.links.make(transaction, id) : null;
      return { id, link };
    });
  }

  /** The first administrator; refused once there is anybody at all, also when two ask at once. */
  async addFirstAdministrator(request: { email: string; name: string; password: string }): Promise<string> {
    const grants: RoleGrant[] = [{ role: 'administrator', terminal: ALL_TERMINALS }];
    const passwordHash = await this.hashOf({ ...request });
    return this.unitOfWork.run(async (transaction) => {
      if (await this.people.isAnybodyThere(transaction)) {
        throw new Refusal({ code: 'setup.done', message: 'this installation has its people already' });
      }
      return this.insert(transaction, { ...request, roles: grants }, passwordHash);
    });
  }

  async update(id: string, request: UpdatePersonRequest, actor: PersonAccess): Promise<void> {
    await this.unitOfWork.run(async (transaction) => {
      const person = await this.requireWithin(transaction, id, actor);
      this.requireReach(actor, request.roles ?? []);
      if (request.version !== undefined && request.version !== person.version) {
        throw new Refusal({ code: 'people.changed', message: 'somebody changed this person meanwhile' });
      }
      if (request.roles !== undefined) await this.requireTerminals(transaction, request.roles);
      await this.requireFreeBadge(transaction, request.badge, id);
      await this.people.update(transaction, person, request);
      await this.requireAnAdministrator(transaction);
      this.sessions.personChanges(transaction, id);
      if (request.active === false) await this.sessions.endAllOf(transaction, id);
    });
  }

  makeLink(id: string, actor: PersonAccess): Promise<OneTimeLink> {
    return this.unitOfWork.run(async (transaction) => {
      await this.requireWithin(transaction, id, actor);
      return this.links.make(transaction, id);
    });
  }

  async givePassword(id: string, password: string, actor: PersonAccess): Promise<void> {
    const person = await this.people.find(id);
    this.passwords.require(password, person);
    const passwordHash = await this.passwords.hash(password);
    await this.unitOfWork.run(async (transaction) => {
      await this.requireWithin(transaction, id, actor);
      await this.people.setPassword(transaction, id, passwordHash);
      await this.sessions.endAllOf(transaction, id);
    });
  }

  async endSessions(id: string, actor: PersonAccess): Promise<void> {
    await this.unitOfWork.run(async (transaction) => {
      await this.requireWithin(transaction, id, actor);
      await this.sessions.endAllOf(transaction, id);
    });
  }

  /** An administrator of some terminals does nothing to people who hold roles elsewhere. */
  private async requireWithin(transaction: Transaction, id: string, actor: PersonAccess): Promise<PersonRow> {
    const person = await this.people.require(transaction, id);
    this.requireReach(actor, await this.people.rolesOf(transaction, id));
    transaction.afterCommit(() => this.logger.log(`person ${id} was changed by ${actor.id}`));
    return person;
  }

  /** An administrator of some terminals gives and takes roles there only; least of all roles everywhere. */
  private requireReach(actor: PersonAccess | undefined, roles: readonly RoleGrant[]): void {
    if (actor === undefined) return;
    for (const { terminal } of roles) this.access.require(actor, 'people.manage', terminal);
  }

  private async hashOf(owner: {
    email: string;
    name: string;
    password?: string | undefined;
  }): Promise<string | null> {
    if (owner.password === undefined) return null;
    this.passwords.require(owner.password, owner);
    return this.passwords.hash(owner.password);
  }

  private async insert(
    transaction: Transaction,
    request: CreatePersonRequest,
    passwordHash: string | null,
  ): Promise<string> {
    if (await this.people.isTaken(transaction, request.email)) {
      throw new Refusal({
        code: 'people.exists',
        message: 'there is somebody with this address',
        facts: { email: request.email },
      });
    }
    await this.requireTerminals(transaction, request.roles);
    await this.requireFreeBadge(transaction, request.badge, null);
    const id = randomUUID();
    await this.people.insert(transaction, {
      id,
      email: request.email,
      name: request.name,
      passwordHash,
      badge: request.badge ?? null,
      phone: request.phone ?? null,
      roles: request.roles,
    });
    return id;
  }

  private async requireFreeBadge(
    transaction: Transaction,
    badge: string | null | undefined,
    exceptId: string | null,
  ): Promise<void> {
    if (badge === undefined || badge === null) return;
    if (!(await this.people.isBadgeTaken(transaction, badge, exceptId))) return;
    throw new Refusal({
      code: 'people.badge_taken',
      message: 'somebody else has this badge',
      facts: { badge },
    });
  }

  private async requireTerminals(transaction: Transaction, roles: readonly RoleGrant[]): Promise<void> {
    const unknown = await this.people.unknownTerminals(transaction, roles);
    if (unknown.length === 0) return;
    throw new Refusal({
      code: 'people.terminal_unknown',
      message: `there is no terminal ${unknown.join(', ')}`,
      facts: { terminals: unknown },
    });
  }

  /** Nobody may lock the last administrator out, also not themselves. */
  private async requireAnAdministrator(transaction: Transaction): Promise<void> {
    if (await this.people.isAnAdministratorLeft(transaction)) return;
    throw new Refusal({
      code: 'people.last_administrator',
      message: 'one administrator of all terminals must stay able to sign in',
    });
  }
}
