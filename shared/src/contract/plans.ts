import { z } from 'zod';
import { ANCHORS, DOERS, PLACES, READINGS, STEP_KINDS } from '../plan/step-plan';
import { dateSchema, textSchema } from './primitives';

/** Characters of an instruction at most. */
export const longestInstruction = 2000;

/** One step of a plan on the wire; the same shape as in the core. */
export const planStepSchema = z.strictObject({
  key: z.string().regex(/^[a-z][a-z0-9-]{0,39}$/, 'a key is small letters, digits and dashes'),
  label: textSchema(120),
  shortLabel: textSchema(30),
  kind: z.enum(STEP_KINDS),
  doer: z.enum(DOERS),
  place: z.enum(PLACES),
  anchor: z.enum(ANCHORS),
  offsetSeconds: z.number().int().min(-14400).max(14400),
  shortSeconds: z.number().int().min(0).max(7200),
  typicalSeconds: z.number().int().min(0).max(7200),
  longSeconds: z.number().int().min(0).max(14400),
  after: z.array(z.string()),
  notBeforeSeconds: z.number().int().min(-14400).max(0).nullable(),
  toleranceSeconds: z.number().int().min(0).max(3600),
  holdsDeparture: z.boolean(),
  reads: z.array(z.enum(READINGS)),
  /** The railroad's own words on how the step is done. Plain text; absent when there are none. */
  instruction: textSchema(longestInstruction).optional(),
  /** Whether it is recorded from the controlling cab; where absent, `place` says so. */
  inCab: z.boolean().optional(),
});

/** A step plan version on the wire. */
export const stepPlanSchema = z.object({
  id: z.string(),
  key: z.string(),
  name: z.string(),
  version: z.number().int(),
  effectiveFrom: z.string(),
  steps: z.array(planStepSchema),
  terminal: z.string(),
  createdAt: z.string(),
  createdBy: z.string().nullable(),
});
export type WireStepPlan = z.infer<typeof stepPlanSchema>;

/** A new version of a terminal's plan, in force from a service date on. */
export const createPlanSchema = z.strictObject({
  key: z.string().regex(/^[a-z][a-z0-9-]{0,39}$/),
  name: textSchema(80),
  effectiveFrom: dateSchema,
  steps: z.array(planStepSchema).min(1).max(30),
});
export type CreatePlanRequest = z.infer<typeof createPlanSchema>;
