import { z } from 'zod';
import { CORRECTION_STATES } from '../turn/corrections';
import { CREW_ROLES, DEFECT_CAUSES, ENTRY_SOURCES, TIE_UP_CHECKS } from '../turn/entry';
import { readingSchema } from './entries';

const personSchema = z.object({ personId: z.string(), name: z.string() });

const accountSchema = z.object({
  entryId: z.string(),
  at: z.string(),
  source: z.enum(ENTRY_SOURCES),
  by: z.string().nullable(),
  saidBy: z.string().nullable(),
});

const objectionSchema = z.object({
  entryId: z.string(),
  target: z.string(),
  at: z.string(),
  by: z.string().nullable(),
  reason: z.string(),
});

/** A change of the record asked for after the departure: old and new side by side, and what was decided. */
export const turnCorrectionSchema = z.object({
  entryId: z.string(),
  target: z.string(),
  kind: z.enum(['corrected', 'withdrawn']),
  /** Key of the step that the target tells of, else the kind of the target. */
  what: z.string(),
  oldAt: z.string(),
  newAt: z.string().nullable(),
  oldReading: readingSchema.nullable(),
  newReading: readingSchema.nullable(),
  by: personSchema.nullable(),
  reason: z.string(),
  askedAt: z.string(),
  state: z.enum(CORRECTION_STATES),
  decidedBy: personSchema.nullable().optional(),
  decidedAt: z.string().optional(),
  declinedBecause: z.string().optional(),
});

/** What people still have to settle about a turn, and what they reported. Each field is absent when there is none. */
export const turnMattersFields = {
  /** Things on which a person has to rule. The account that counts comes first. */
  inQuestion: z
    .array(
      z.object({
        step: z.string(),
        accounts: z.array(accountSchema),
        /** Who does not agree with which account; absent when nobody objects. */
        objections: z.array(objectionSchema).optional(),
      }),
    )
    .optional(),
  /** Steps by radio that the crew has not yet said anything to. */
  asksAgreement: z
    .array(
      z.object({
        entryId: z.string(),
        step: z.string(),
        at: z.string(),
        saidBy: z.string().nullable(),
        by: z.string().nullable(),
      }),
    )
    .optional(),
  corrections: z.array(turnCorrectionSchema).optional(),
  defects: z
    .array(
      z.object({
        entryId: z.string(),
        at: z.string(),
        by: z.string().nullable(),
        car: z.string().nullable(),
        cause: z.enum(DEFECT_CAUSES),
        note: z.string().optional(),
      }),
    )
    .optional(),
  tiedUp: z
    .object({
      entryId: z.string(),
      at: z.string(),
      by: z.string().nullable(),
      handbrakes: z.object({ count: z.number().int(), cars: z.array(z.string()) }),
      checks: z.array(z.enum(TIE_UP_CHECKS)),
      offAir: z.boolean().optional(),
      reason: z.string().optional(),
    })
    .nullable()
    .optional(),
  /** Ids of the people who recorded the safety briefing. */
  briefedBy: z.array(z.string()).optional(),
  reliefs: z
    .array(
      z.object({
        entryId: z.string(),
        at: z.string(),
        as: z.enum(CREW_ROLES),
        out: personSchema,
        in: personSchema.nullable(),
        faceToFace: z.boolean(),
        /** Whose word that it was face to face is missing. */
        awaits: z.string().nullable(),
      }),
    )
    .optional(),
};

export type WireTurnMatters = z.infer<z.ZodObject<typeof turnMattersFields>>;
export type WireCorrection = z.infer<typeof turnCorrectionSchema>;
