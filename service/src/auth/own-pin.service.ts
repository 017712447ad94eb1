import { Injectable, Logger } from '@nestjs/common';
import { type ChangePinRequest, judgePin, type OwnBadge } from '@stubpost/shared';
import { Refusal } from '../common/refusal';
import { Reader } from '../database/reader';
import { UnitOfWork } from '../database/unit-of-work';
import { Passwords } from './passwords';
import { SignInThrottle } from './sign-in-throttle';

interface BadgeRow {
  email: string;
  badge: string | null;
  pin_hash: string | null;
  password_hash: string | null;
}

/** One's own PIN: hashed and throttled as a password is, and of use only together with a badge. */
@Injectable()
export class OwnPin {
  private readonly logger = new Logger('sign-in');

  constructor(
    private readonly unitOfWork: UnitOfWork,
    private readonly reader: Reader,
    private readonly passwords: Passwords,
    private readonly throttle: SignInThrottle,
  ) {}

  async look(personId: string): Promise<OwnBadge> {
    const row = await this.rowOf(personId);
    return {
      badge: row.badge,
      hasPin: row.pin_hash !== null,
      hasPassword: row.password_hash !== null,
    };
  }

  /** Sets the PIN, or takes it away. The password shows that it is not just whoever found the phone unlocked. */
  async change(who: { personId: string; address: string }, change: ChangePinRequest): Promise<void> {
    const row = await this.rowOf(who.personId);
    await this.requirePassword(row, who.address, change.current);
    if (change.pin !== null && row.badge === null) {
      throw new Refusal({ code: 'pin.no_badge', message: 'a PIN goes with a badge, and there is none' });
    }
    if (change.pin !== null && judgePin(change.pin) !== 'good') {
      throw new Refusal({ code: 'pin.too_simple', message: 'this PIN is among the first that are tried' });
    }
    const pinHash = change.pin === null ? null : await this.passwords.hash(change.pin);
    await this.unitOfWork.run((transaction) =>
      transaction.execute('UPDATE person SET pin_hash = ?, version = version + 1 WHERE id = ?', [
        pinHash,
        who.personId,
      ]),
    );
    this.logger.log(`person ${who.personId} ${pinHash === null ? 'took away' : 'set'} their PIN`);
  }

  /** People of a demo have no password: there is nothing to show. */
  private async requirePassword(row: BadgeRow, address: string, current: string | undefined): Promise<void> {
    if (row.password_hash === null) return;
    const attempt = { account: row.email, address };
    await this.throttle.admit(attempt);
    if (!(await this.passwords.verify(row.password_hash, current ?? ''))) {
      throw new Refusal({ code: 'session.wrong_password', message: 'the current password is wrong' });
    }
    await this.unitOfWork.run((transaction) => this.throttle.forget(transaction, attempt));
  }

  private async rowOf(personId: string): Promise<BadgeRow> {
    const [row] = await this.reader.query<BadgeRow>(
      'SELECT email, badge, pin_hash, password_hash FROM person WHERE id = ?',
      [personId],
    );
    if (row === undefined) throw new Refusal({ code: 'session.missing', message: 'nobody is signed in' });
    return row;
  }
}
