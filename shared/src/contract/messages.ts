import { z } from 'zod';
import { MESSAGE_CHANNELS } from '../duty/roster';
import { PRIORITIES } from '../lateness/finding';

/** What has become of an outgoing message. */
export const MESSAGE_STATES = ['waiting', 'claimed', 'sent', 'given-up'] as const;
export type MessageState = (typeof MESSAGE_STATES)[number];

/** What came of one try to send. */
export const SEND_OUTCOMES = ['accepted', 'failed', 'found-accepted', 'cut-off'] as const;
export type SendOutcome = (typeof SEND_OUTCOMES)[number];

/** An outgoing message with everything that was tried. */
export const messageSchema = z.object({
  id: z.string(),
  channel: z.enum(MESSAGE_CHANNELS),
  to: z.string(),
  name: z.string(),
  terminal: z.string().nullable(),
  alertId: z.string().nullable(),
  subject: z.string(),
  state: z.enum(MESSAGE_STATES),
  createdAt: z.string(),
  sentAt: z.string().nullable(),
  nextAt: z.string().nullable(),
  tries: z.array(z.object({ at: z.string(), outcome: z.enum(SEND_OUTCOMES), detail: z.string() })),
});
export type WireMessage = z.infer<typeof messageSchema>;

/** A message that lies in one of the local boxes: where no real service is set up, everything ends here. */
export const boxItemSchema = z.object({
  id: z.string(),
  channel: z.enum(MESSAGE_CHANNELS),
  to: z.string(),
  subject: z.string(),
  text: z.string(),
  receivedAt: z.string(),
});
export type WireBoxItem = z.infer<typeof boxItemSchema>;

/** The outgoing messages of late, and the local boxes. */
export const messageBoxesSchema = z.object({
  /** Which ways end in a local box for want of a real service. */
  local: z.array(z.enum(MESSAGE_CHANNELS)),
  messages: z.array(messageSchema),
  items: z.array(boxItemSchema),
});
export type WireMessageBoxes = z.infer<typeof messageBoxesSchema>;

/** What the link in a message shows before its button is pressed. */
export const takingSchema = z.object({
  name: z.string(),
  terminal: z.string(),
  zone: z.string(),
  priority: z.enum(PRIORITIES),
  subject: z.string(),
  text: z.string(),
  action: z.string(),
  raisedAt: z.string(),
  /** When the condition went away; taking it is no longer needed then. */
  clearedAt: z.string().nullable(),
  takenBy: z.string().nullable(),
  takenAt: z.string().nullable(),
  expiresAt: z.string(),
});
export type WireTaking = z.infer<typeof takingSchema>;
