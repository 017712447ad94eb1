import { createHash } from 'node:crypto';
import type { MessageChannel } from '@stubpost/shared';
import { linkTokenLength } from '../auth/link-tokens';

/** Stands in a body where the token of its link goes, as long as a token is. */
export const TOKEN_MARK = '*'.repeat(linkTokenLength);

/** A message that is to go out. */
export interface NewMessage {
  channel: MessageChannel;
  address: string;
  person: { id: string; name: string };
  terminalCode: string | null;
  alertId: string | null;
  /** What about the alert, or about the service, it tells. */
  occasion: string;
  /** Told apart from others of the same occasion, where there can be several. */
  instance?: string;
  subject: string;
  body: string;
  linkPurpose: string | null;
}

/** The id of a message: the same for the same news to the same person by the same way, so that it is written once. */
export function messageIdOf(message: NewMessage): string {
  const { channel, person, alertId, occasion, instance = '' } = message;
  const about = [alertId ?? '', occasion, instance, person.id, channel].join('\n');
  return createHash('sha256').update(about).digest('hex').slice(0, 32);
}

/** A message as a channel takes it, with everything filled in. */
export interface Sendable {
  id: string;
  address: string;
  name: string;
  subject: string;
  text: string;
  /** The alert whose messages make one thread; null for one that stands alone. */
  thread: string | null;
}
