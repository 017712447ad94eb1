import { Injectable } from '@nestjs/common';
import { may, type Permission, type PersonAccess } from '@stubpost/shared';
import { Refusal } from './refusal';

/** Asks the policy of `shared` and refuses in one manner. */
@Injectable()
export class Access {
  /** Refuses with 403 unless the person may do it there; without a terminal, anywhere at all. */
  require(person: PersonAccess, permission: Permission, terminalCode?: string): void {
    if (may(person, permission, terminalCode)) return;
    throw new Refusal({
      code: 'access.forbidden',
      message: terminalCode === undefined ? 'not allowed' : `not allowed at ${terminalCode}`,
      facts: { permission, ...(terminalCode === undefined ? {} : { terminal: terminalCode }) },
    });
  }
}
