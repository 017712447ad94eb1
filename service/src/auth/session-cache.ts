import { Injectable } from '@nestjs/common';
import type { Instant } from '@stubpost/shared';
import type { CurrentPersonFacts } from '../common/signed-in';

/** A session as it was read, with what decides whether it still stands. */
export interface ReadSession {
  person: CurrentPersonFacts;
  lastSeenAt: Instant;
  endsAt: Instant;
}

/**
 * A read session is good for this long without asking the table. Endings and changes of people in this process drop
 * it at once; the limit is for changes made by another one.
 */
const freshMilliseconds = 5000;
const mostSessions = 5000;

/**
 * Sessions read a moment ago: a board that is asked for every second need not join three tables each time. What was
 * read before something was dropped is not kept, however late it comes.
 */
@Injectable()
export class SessionCache {
  private readonly kept = new Map<string, { session: ReadSession; readAt: Instant }>();
  private drops = 0;

  /** To be taken before reading and handed to `keep` afterwards. */
  get mark(): number {
    return this.drops;
  }

  find(sessionId: string, now: Instant): ReadSession | null {
    const found = this.kept.get(sessionId);
    if (found === undefined || now < found.readAt || now - found.readAt >= freshMilliseconds) return null;
    return found.session;
  }

  keep(session: ReadSession, readAt: Instant, mark: number): void {
    if (mark !== this.drops) return;
    if (this.kept.size >= mostSessions) this.kept.clear();
    this.kept.set(session.person.sessionId, { session, readAt });
  }

  drop(sessionId: string): void {
    this.drops += 1;
    this.kept.delete(sessionId);
  }

  dropPerson(personId: string): void {
    this.drops += 1;
    for (const [id, { session }] of this.kept) {
      if (session.person.id === personId) this.kept.delete(id);
    }
  }
}
