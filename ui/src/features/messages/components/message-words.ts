import type { MessageChannel, MessageState, SendOutcome, WireMessage } from '@stubpost/shared';
import { formatClock } from '../../../lib/time-display';

export const CHANNEL_WORDS: Record<MessageChannel, string> = { 'e-mail': 'E-mail', sms: 'Text message' };

export const MESSAGE_STATE_WORDS: Record<MessageState, string> = {
  waiting: 'Waiting',
  claimed: 'Being sent',
  sent: 'Sent',
  'given-up': 'Given up',
};

export const SEND_OUTCOME_WORDS: Record<SendOutcome, string> = {
  accepted: 'accepted',
  failed: 'failed',
  'found-accepted': 'had been accepted',
  'cut-off': 'cut off',
};

/** How it stands with a message: "Sent 17:20:06", "Waiting, next try 17:25:36". */
export function stateWords(message: WireMessage, zone: string): string {
  const word = MESSAGE_STATE_WORDS[message.state];
  if (message.sentAt !== null) return `${word} ${formatClock(message.sentAt, zone)}`;
  if (message.nextAt !== null && message.tries.length > 0)
    return `${word}, next try ${formatClock(message.nextAt, zone)}`;
  return word;
}
