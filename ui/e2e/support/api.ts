import { randomUUID } from 'node:crypto';
import { administrator } from './server';

/** Talks to the service as one signed-in person, the way a program would: no browser headers. */
export class ApiPerson {
  private constructor(
    private readonly url: string,
    private readonly cookie: string,
  ) {}

  static async signIn(
    url: string,
    email = administrator.email,
    password = administrator.password,
  ): Promise<ApiPerson> {
    const answer = await fetch(`${url}/api/session`, {
      method: 'POST',
      headers: { 'content-type': 'application/json' },
      body: JSON.stringify({ email, password }),
    });
    if (!answer.ok) throw new Error(`sign-in of ${email}: ${answer.status} ${await answer.text()}`);
    return new ApiPerson(url, answer.headers.getSetCookie()[0]?.split(';')[0] ?? '');
  }

  async send<Answer>(method: string, path: string, body?: unknown): Promise<Answer> {
    const answer = await fetch(`${this.url}${path}`, {
      method,
      headers: { cookie: this.cookie, 'content-type': 'application/json' },
      ...(body === undefined ? {} : { body: JSON.stringify(body) }),
    });
    const text = await answer.text();
    if (!answer.ok) throw new Error(`${method} ${path}: ${answer.status} ${text}`);
    return JSON.parse(text === '' ? 'null' : text) as Answer;
  }

  /** Appends an entry to a turn, observed now unless told otherwise. */
  record(turnId: string, kind: string, fields: Record<string, unknown> = {}): Promise<unknown> {
    const observedAt = new Date().toISOString();
    return this.send('POST', `/api/turns/${turnId}/entries`, {
      id: randomUUID(),
      kind,
      observedAt,
      source: 'by-hand',
      ...fields,
    });
  }
}

/** A password good enough for everybody in these tests. */
export const crewPassword = 'five o clock to the coast';

/** Adds a person with one role and answers their e-mail. */
export async function addPerson(admin: ApiPerson, role: string, terminal: string): Promise<string> {
  const email = `${role}@example.test`;
  await admin.send('POST', '/api/people', {
    email,
    name: `${role[0]?.toUpperCase()}. ${role}son`,
    password: crewPassword,
    roles: [{ role, terminal }],
  });
  return email;
}
