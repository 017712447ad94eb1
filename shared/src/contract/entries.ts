import { z } from 'zod';
import { CREW_ROLES, DEFECT_CAUSES, ENTRY_SOURCES, TIE_UP_CHECKS } from '../turn/entry';
import { idSchema, instantSchema, textSchema } from './primitives';

const personRefSchema = z.object({ id: z.string(), name: z.string() });

/** What was read off or counted with a step. */
export const readingSchema = z.strictObject({
  count: z.number().int().min(0).max(200).optional(),
  cars: z.array(textSchema(20)).max(200).optional(),
  brakePipePsi: z.number().min(0).max(200).optional(),
  p0: z.number().min(0).max(200).optional(),
  p1: z.number().min(0).max(200).optional(),
  seconds: z.number().min(0).max(3600).optional(),
});

export type WireReading = z.infer<typeof readingSchema>;

const entryBase = {
  id: idSchema,
  observedAt: instantSchema,
  source: z.enum(ENTRY_SOURCES),
  saidBy: textSchema(80).optional(),
  clockOffsetMilliseconds: z.number().int().optional(),
};
const reason = textSchema(300);
const stepKey = textSchema(60);
const car = textSchema(20);

/** One entry as a device sends it. Person fields are ids; the service adds the names of the day. */
export const recordEntrySchema = z.discriminatedUnion('kind', [
  z.strictObject({ ...entryBase, kind: z.literal('arrival') }),
  z.strictObject({ ...entryBase, kind: z.literal('departure') }),
  z.strictObject({ ...entryBase, kind: z.literal('expected-arrival'), expectedAt: instantSchema }),
  z.strictObject({
    ...entryBase,
    kind: z.literal('step-done'),
    step: stepKey,
    reading: readingSchema.optional(),
  }),
  z.strictObject({ ...entryBase, kind: z.literal('withdrawn'), target: idSchema, reason }),
  z.strictObject({
    ...entryBase,
    kind: z.literal('corrected'),
    target: idSchema,
    /** The time that is to stand instead; absent where only the reading is corrected. */
    observedAt: instantSchema.optional(),
    /** When the correction was made; when it came in unless given. */
    madeAt: instantSchema.optional(),
    reading: readingSchema.optional(),
    reason,
  }),
  z.strictObject({ ...entryBase, kind: z.literal('cannot-do'), step: stepKey, reason }),
  z.strictObject({
    ...entryBase,
    kind: z.literal('crew'),
    person: z.string().min(1),
    as: z.enum(CREW_ROLES),
  }),
  z.strictObject({
    ...entryBase,
    kind: z.literal('relief'),
    out: z.string().min(1),
    in: z.string().min(1).nullable().optional(),
    as: z.enum(CREW_ROLES),
    faceToFace: z.boolean(),
  }),
  z.strictObject({ ...entryBase, kind: z.literal('briefing') }),
  z.strictObject({ ...entryBase, kind: z.literal('track'), track: textSchema(12) }),
  z.strictObject({ ...entryBase, kind: z.literal('set'), set: textSchema(20) }),
  z.strictObject({ ...entryBase, kind: z.literal('hold'), until: instantSchema, reason }),
  z.strictObject({ ...entryBase, kind: z.literal('annulled'), reason }),
  z.strictObject({ ...entryBase, kind: z.literal('blue-signal-up') }),
  z.strictObject({ ...entryBase, kind: z.literal('blue-signal-down') }),
  z.strictObject({ ...entryBase, kind: z.literal('note'), note: textSchema(1000) }),
  z.strictObject({ ...entryBase, kind: z.literal('agreed'), target: idSchema }),
  z.strictObject({ ...entryBase, kind: z.literal('disagreed'), target: idSchema, reason }),
  z.strictObject({
    ...entryBase,
    kind: z.literal('ruled'),
    target: idSchema,
    considered: z.array(idSchema).max(100),
  }),
  z.strictObject({ ...entryBase, kind: z.literal('correction-approved'), target: idSchema }),
  z.strictObject({ ...entryBase, kind: z.literal('correction-declined'), target: idSchema, reason }),
  z.strictObject({
    ...entryBase,
    kind: z.literal('defect'),
    car: car.nullable(),
    cause: z.enum(DEFECT_CAUSES),
    note: textSchema(1000).optional(),
  }),
  z.strictObject({
    ...entryBase,
    kind: z.literal('tied-up'),
    handbrakes: z.strictObject({ count: z.number().int().min(0).max(200), cars: z.array(car).max(200) }),
    checks: z.array(z.enum(TIE_UP_CHECKS)).max(TIE_UP_CHECKS.length),
    offAir: z.boolean().optional(),
    reason: reason.optional(),
  }),
]);
export type RecordEntryRequest = z.infer<typeof recordEntrySchema>;

/** One entry of a turn's log as the service gives it: the request's fields with names, receipt and seal. */
export const wireEntrySchema = z.looseObject({
  sequence: z.number().int(),
  hash: z.string(),
  id: z.string(),
  kind: z.string(),
  /** When it happened by the person's account; of a correction the time it claims, absent where it claims none. */
  observedAt: z.string().optional(),
  /** Of a correction only: when it was made. */
  madeAt: z.string().optional(),
  receivedAt: z.string(),
  source: z.enum(ENTRY_SOURCES),
  by: personRefSchema.nullable(),
  saidBy: z.string().optional(),
  step: z.string().optional(),
  reading: readingSchema.optional(),
  target: z.string().optional(),
  reason: z.string().optional(),
  note: z.string().optional(),
});
export type WireEntry = z.infer<typeof wireEntrySchema>;
