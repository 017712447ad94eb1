import { z } from 'zod';
import { dateSchema } from './primitives';

/** Which part of the log: days of receipt in UTC, both included. Without them the whole of it. */
export const logQuerySchema = z
  .strictObject({ from: dateSchema.optional(), to: dateSchema.optional() })
  .refine(({ from, to }) => from === undefined || to === undefined || from <= to, {
    path: ['to'],
    message: 'the last day must not be before the first',
  });
export type LogQuery = z.infer<typeof logQuerySchema>;

/** The last entry of a day of receipt in UTC. */
export const dailyHeadSchema = z.object({
  date: z.string(),
  sequence: z.number().int(),
  hash: z.string(),
  /** Entries since the head before. */
  entries: z.number().int(),
  /** When it was published; null for the day that is still running, whose head moves on with every entry. */
  publishedAt: z.string().nullable(),
});
export type WireDailyHead = z.infer<typeof dailyHeadSchema>;

/** What the last check of the server's own log came to; `waiting` until one has come to its end. */
export const CHAIN_STATES = ['waiting', 'whole', 'broken'] as const;

/** The state of the log in the server's own database. */
export const logStateSchema = z.object({
  chain: z.object({
    state: z.enum(CHAIN_STATES),
    /** The last entry that check has seen, from no. 1 on. */
    checkedTo: z.number().int(),
    /** When it was last at the end of the log; what it cannot know is what came in later. */
    checkedAt: z.string().nullable(),
    /** Working time of that check from no. 1 on, what it has read later included. */
    tookMilliseconds: z.number().int().nullable(),
    /** What is wrong, in words, the first first. */
    faults: z.array(z.object({ sequence: z.number().int().nullable(), words: z.string() })),
    faultCount: z.number().int(),
    /** How far a check has come that is running now; null when none is. */
    runningTo: z.number().int().nullable(),
  }),
  entries: z.number().int(),
  /** The newest entry: whoever notes it down can later see whether the log up to it is still the same. */
  head: z.object({ sequence: z.number().int(), hash: z.string(), receivedAt: z.string() }).nullable(),
});
export type WireLogState = z.infer<typeof logStateSchema>;

/** Asks for the state; `again` starts a check from no. 1 unless one is running. */
export const logStateQuerySchema = z.strictObject({ again: z.enum(['true', 'false']).optional() });
export type LogStateQuery = z.infer<typeof logStateQuerySchema>;
