import { z } from 'zod';
import { GROUPINGS } from '../history/grouping';
import { dateSchema, terminalCodeSchema } from './primitives';

/** Question for the on-time history; the named rule is answered back with the figures. */
export const onTimeQuerySchema = z.strictObject({
  terminal: terminalCodeSchema,
  from: dateSchema,
  to: dateSchema,
  thresholdSeconds: z.coerce.number().int().min(0).max(86_400).default(59),
  inclusive: z.stringbool().default(true),
  early: z.enum(['on-time', 'not-on-time']).default('on-time'),
  annulled: z.enum(['left-out', 'not-on-time']).default('left-out'),
  groupBy: z.enum(GROUPINGS).default('none'),
});
export type OnTimeQuery = z.infer<typeof onTimeQuerySchema>;

const intervalSchema = z.object({ low: z.number(), high: z.number(), confidence: z.number() });
const delaySchema = z.object({
  mean: z.number().nullable(),
  p50: z.number().nullable(),
  p80: z.number().nullable(),
  p95: z.number().nullable(),
});
const figuresShape = {
  scheduled: z.number().int(),
  counted: z.number().int(),
  onTime: z.number().int(),
  annulled: z.number().int(),
  /** Departures of the past that nobody recorded; they count neither way. */
  noRecord: z.number().int(),
  share: z.number().nullable(),
  interval: intervalSchema.nullable(),
  delaySeconds: delaySchema,
};

/** On-time figures with the rule they were made by, their n and a Wilson interval. */
export const onTimeSchema = z.object({
  rule: z.object({
    name: z.string(),
    thresholdSeconds: z.number().int(),
    inclusive: z.boolean(),
    early: z.enum(['on-time', 'not-on-time']),
    annulled: z.enum(['left-out', 'not-on-time']),
    point: z.string(),
  }),
  ...figuresShape,
  groups: z.array(z.object({ key: z.string(), label: z.string(), ...figuresShape })),
});
export type OnTimeAnswer = z.infer<typeof onTimeSchema>;

/** One import of past departures. */
export const historyImportSchema = z.object({
  id: z.string(),
  state: z.enum(['reading', 'loaded', 'refused']),
  fileName: z.string(),
  rows: z.number().int(),
  problems: z.array(z.object({ line: z.number().int().nullable(), message: z.string() })),
});
export type WireHistoryImport = z.infer<typeof historyImportSchema>;

/** One departure behind a figure. */
export const departureRowSchema = z.object({
  serviceDate: z.string(),
  terminal: z.string(),
  train: z.string(),
  track: z.string().nullable(),
  set: z.string().nullable(),
  scheduledDepartureAt: z.string(),
  actualDepartureAt: z.string().nullable(),
  annulled: z.boolean(),
  delaySeconds: z.number().int().nullable(),
  onTime: z.boolean().nullable(),
  origin: z.enum(['recorded', 'imported']),
  turnId: z.string().nullable(),
});
export type DepartureRow = z.infer<typeof departureRowSchema>;
