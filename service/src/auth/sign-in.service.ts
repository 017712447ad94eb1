import { Injectable, Logger } from '@nestjs/common';
import type { Role, SignedInPerson, SignInRequest } from '@stubpost/shared';
import { Refusal } from '../common/refusal';
import type { Visitor } from '../common/visitor';
import { Reader } from '../database/reader';
import { UnitOfWork } from '../database/unit-of-work';
import { Passwords } from './passwords';
import { SignInThrottle } from './sign-in-throttle';
import { type OpenedSession, SessionsService } from './sessions.service';

/** Somebody who has just come in. */
export interface SignedIn extends OpenedSession {
  person: SignedInPerson;
}

interface AccountRow {
  id: string;
  email: string;
  name: string;
  password_hash: string | null;
  pin_hash: string | null;
  active: number | boolean;
}

/** Lets people in, by address or badge with a password or PIN, and lets them change the password. */
@Injectable()
export class SignInService {
  /** Who came in is told by id, never by name or address. */
  private readonly logger = new Logger('sign-in');

  constructor(
    private readonly unitOfWork: UnitOfWork,
    private readonly reader: Reader,
    private readonly passwords: Passwords,
    private readonly throttle: SignInThrottle,
    private readonly sessions: SessionsService,
  ) {}

  async signIn(credentials: SignInRequest, visitor: Visitor): Promise<SignedIn> {
    const name = signInNameOf(credentials);
    const attempt = { account: name.account, address: visitor.address };
    await this.throttle.admit(attempt);
    const [account] = await this.accountsWhere(name.column, name.value);
    const [kept, given] =
      'pin' in credentials
        ? [account?.pin_hash, credentials.pin]
        : [account?.password_hash, credentials.password];
    const matches = await this.passwords.verify(kept ?? null, given);
    if (account === undefined || !matches || !account.active) {
      throw new Refusal({ code: 'session.wrong_credentials', message: 'the two do not fit together' });
    }
    this.logger.log(`person ${account.id} signed in`);
    return this.unitOfWork.run(async (transaction) => {
      await this.throttle.forget(transaction, attempt);
      const opened = await this.sessions.open(transaction, account.id, visitor.device);
      return { ...opened, person: await this.personOf(account.id) };
    });
  }

  /** Opens a session for somebody whose right to it was shown in another way: a one-time link, the set-up, a demo. */
  openFor(personId: string, device: string): Promise<SignedIn> {
    return this.unitOfWork.run(async (transaction) => {
      const opened = await this.sessions.open(transaction, personId, device);
      return { ...opened, person: await this.personOf(personId) };
    });
  }

  async changePassword(
    who: { personId: string; sessionId: string; address: string },
    change: { current: string; password: string },
  ): Promise<void> {
    const [account] = await this.accountsWhere('id', who.personId);
    if (account === undefined) throw new Refusal({ code: 'session.missing', message: 'nobody is signed in' });
    const attempt = { account: account.email, address: who.address };
    await this.throttle.admit(attempt);
    if (!(await this.passwords.verify(account.password_hash, change.current))) {
      throw new Refusal({ code: 'session.wrong_password', message: 'the current password is wrong' });
    }
    this.passwords.require(change.password, account);
    const passwordHash = await this.passwords.hash(change.password);
    await this.unitOfWork.run(async (transaction) => {
      await this.throttle.forget(transaction, attempt);
      await transaction.execute('UPDATE person SET password_hash = ?, version = version + 1 WHERE id = ?', [
        passwordHash,
        who.personId,
      ]);
      await this.sessions.endAllOf(transaction, who.personId, who.sessionId);
    });
    this.logger.log(`person ${who.personId} changed their password`);
  }

  private accountsWhere(column: 'id' | 'email' | 'badge', value: string): Promise<AccountRow[]> {
    return this.reader.query<AccountRow>(
      `SELECT id, email, name, password_hash, pin_hash, active FROM person WHERE ${column} = ?`,
      [value],
    );
  }

  private async personOf(personId: string): Promise<SignedInPerson> {
    const rows = await this.reader.query<{ name: string; role: string | null; terminal: string | null }>(
      'SELECT p.name, r.role, r.terminal FROM person p LEFT JOIN person_role r ON r.person_id = p.id WHERE p.id = ?',
      [personId],
    );
    const roles = rows.flatMap((row) =>
      row.role === null || row.terminal === null ? [] : [{ role: row.role as Role, terminal: row.terminal }],
    );
    return { id: personId, name: rows[0]?.name ?? '', roles };
  }
}

/** The name somebody signs in with: the column it is looked for in, and what its failed tries are counted under. */
function signInNameOf(credentials: SignInRequest): {
  column: 'email' | 'badge';
  value: string;
  account: string;
} {
  if ('email' in credentials) {
    const email = credentials.email.toLowerCase();
    return { column: 'email', value: email, account: email };
  }
  const badge = credentials.badge.toUpperCase();
  return { column: 'badge', value: badge, account: `badge ${badge}` };
}
