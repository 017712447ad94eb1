import { z } from 'zod';
import { terminalCodeSchema } from './primitives';

/** Names of the events on the live stream. `reload` says that the asked-for place in the change table is gone. */
export const LIVE_EVENTS = ['turn', 'alert', 'beat', 'reload'] as const;
export type LiveEvent = (typeof LIVE_EVENTS)[number];

/** Which terminal to listen to, and the last event that was seen when the header cannot be sent. */
export const liveQuerySchema = z.strictObject({
  terminal: terminalCodeSchema,
  lastEventId: z.string().max(30).optional(),
});
export type LiveQuery = z.infer<typeof liveQuerySchema>;
