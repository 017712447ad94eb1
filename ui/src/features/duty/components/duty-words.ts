import type { Duty, MessageChannel, Rung } from '@stubpost/shared';

export const DUTY_WORDS: Record<Duty, string> = { desk: 'On the desk', deputy: 'Deputy' };

export const RUNG_WORDS: Record<Rung, string> = {
  desk: 'the desk',
  deputy: 'the deputies',
  supervisor: 'the supervisors',
};

export const CHANNEL_WORDS: Record<MessageChannel, string> = { 'e-mail': 'e-mail', sms: 'text message' };
