import { z } from 'zod';
import { textSchema } from './primitives';

/** Kinds of vehicle. */
export const UNIT_KINDS = ['locomotive', 'coach', 'cab-car', 'multiple-unit'] as const;
export type UnitKind = (typeof UNIT_KINDS)[number];

/** One vehicle of a set. Length in feet, weight in short tons, handbrake holding force in pounds. */
export const unitSchema = z.strictObject({
  number: textSchema(20),
  kind: z.enum(UNIT_KINDS),
  lengthFeet: z.number().positive().max(500).nullable().optional(),
  tons: z.number().positive().max(1000).nullable().optional(),
  handbrakePounds: z.number().positive().max(1_000_000).nullable().optional(),
});
export type WireUnit = z.infer<typeof unitSchema>;

/** An equipment set; `units` in order from the end at the bumping post. */
export const setSchema = z.object({
  id: z.string(),
  version: z.number().int(),
  label: z.string(),
  units: z.array(unitSchema),
  /** Number of the unit that leads on leaving; null while unknown. */
  leadingUnit: z.string().nullable(),
  /** Since when the set has been off air; null while it is on air. */
  offAirSince: z.string().nullable(),
});
export type WireSet = z.infer<typeof setSchema>;

/** What a set is made of. `version` is the one that was seen; absent for a new set. */
export const putSetSchema = z
  .strictObject({
    version: z.number().int().min(0).optional(),
    units: z.array(unitSchema).max(40),
    leadingUnit: textSchema(20).nullable().optional(),
  })
  .refine((set) => new Set(set.units.map((unit) => unit.number)).size === set.units.length, {
    path: ['units'],
    message: 'a unit stands in a set once',
  });
export type PutSetRequest = z.infer<typeof putSetSchema>;
