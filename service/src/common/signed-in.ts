import type { PersonAccess, RoleGrant } from '@stubpost/shared';

/** The person behind a request. */
export interface CurrentPersonFacts extends PersonAccess {
  name: string;
  roles: RoleGrant[];
  sessionId: string;
}
