import type { NestExpressApplication } from '@nestjs/platform-express';
import type { Role } from '@stubpost/shared';
import supertest from 'supertest';
import { SignInService } from '../../src/auth/sign-in.service';
import { SessionCookie } from '../../src/auth/session-cookie';
import { PeopleService } from '../../src/people/people.service';

/** A caller with a cookie, and whose it is. */
export interface SignedInAgent {
  agent: ReturnType<typeof supertest.agent>;
  personId: string;
  name: string;
}

let running = 0;

/** Adds a person with one role and gives back a caller signed in as that person. The terminal must exist, or be `*`. */
export async function signInAs(
  app: NestExpressApplication,
  role: Role | null,
  terminal = '*',
): Promise<SignedInAgent> {
  running += 1;
  const name = `${role ?? 'nobody'} ${running}`;
  const { id } = await app.get(PeopleService).add({
    email: `${role ?? 'nobody'}-${running}@example.org`,
    name,
    roles: role === null ? [] : [{ role, terminal }],
  });
  return { agent: await agentFor(app, id), personId: id, name };
}

/** A caller signed in as the person of `signInAs`, when only the caller matters. */
export async function signIn(
  app: NestExpressApplication,
  role: Role | null,
  terminal = '*',
): Promise<ReturnType<typeof supertest.agent>> {
  return (await signInAs(app, role, terminal)).agent;
}

/** A caller with a fresh session of a person who is already there. */
export async function agentFor(
  app: NestExpressApplication,
  personId: string,
): Promise<ReturnType<typeof supertest.agent>> {
  const { token } = await app.get(SignInService).openFor(personId, 'test');
  const agent = supertest.agent(app.getHttpServer());
  void agent.set('Cookie', `${app.get(SessionCookie).name}=${token}`);
  return agent;
}
