import type { Sendable } from './outgoing';

/** One way out. Whoever implements it knows a provider; nobody else does. */
export interface Channel {
  /** Resolves once the other side has accepted the message; says what it answered. */
  send(message: Sendable): Promise<string>;
  /** Whether a message, whose sending was cut off, had been accepted; null where that cannot be asked. */
  wasAccepted(message: Sendable): Promise<boolean | null>;
}
