import { z } from 'zod';
import { terminalCodeSchema } from './primitives';
import { turnCorrectionSchema } from './turn-matters';

/** Which changes of the record: those that wait for a decision, or those decided too. */
export const CORRECTION_QUESTIONS = ['waiting', 'all'] as const;

/** Changes of the record at a terminal; those that wait unless asked for otherwise. */
export const correctionsQuerySchema = z.strictObject({
  terminal: terminalCodeSchema,
  state: z.enum(CORRECTION_QUESTIONS).default('waiting'),
});
export type CorrectionsQuery = z.infer<typeof correctionsQuerySchema>;

/** A change of the record with the turn it belongs to. */
export const listedCorrectionSchema = turnCorrectionSchema.extend({
  turnId: z.string(),
  terminal: z.string(),
  zone: z.string(),
  serviceDate: z.string(),
  track: z.string().nullable(),
  inboundTrain: z.string().nullable(),
  outboundTrain: z.string().nullable(),
  /** `what` in words: the step's short label, or the kind of the entry. */
  whatLabel: z.string(),
});
export type ListedCorrection = z.infer<typeof listedCorrectionSchema>;
