import { z } from 'zod';
import { ROLES } from '../access/roles';

/** Whether the service is well. `schema` is the name of the newest migration that was run. */
export const healthSchema = z.object({
  status: z.enum(['ok', 'unwell']),
  version: z.string(),
  schema: z.string(),
  lastSweepAt: z.string().nullable(),
  /** What is not well, in words; absent when all is. */
  problems: z.array(z.string()).optional(),
});
export type WireHealth = z.infer<typeof healthSchema>;

/** Seconds without an alert sweep until the service calls itself unwell, also after a start. */
export const sweepSilenceSeconds = 90;

/** Whether this is a demo, how far it is filled, and who can be signed in with one click. */
export const demoSchema = z.object({
  demo: z.boolean(),
  state: z.enum(['filling', 'ready']).optional(),
  message: z.string().optional(),
  people: z
    .array(z.object({ id: z.string(), name: z.string(), role: z.enum(ROLES), terminal: z.string() }))
    .optional(),
});
export type WireDemo = z.infer<typeof demoSchema>;

/** One-click sign-in as one of the demo's people. */
export const demoSessionSchema = z.strictObject({ personId: z.string().min(1) });
export type DemoSessionRequest = z.infer<typeof demoSessionSchema>;
