import { z } from 'zod';
import { ROLES } from '../access/roles';
import { textSchema } from './primitives';
import { badgeSchema, emailSchema, passwordTextSchema, phoneSchema, roleGrantSchema } from './session';

/** A person as an administrator sees them. */
export const personSchema = z.object({
  id: z.string(),
  version: z.number().int(),
  email: z.string(),
  name: z.string(),
  active: z.boolean(),
  hasPassword: z.boolean(),
  /** Number to sign in with on shared phones; null where none was given out. */
  badge: z.string().nullable(),
  hasPin: z.boolean(),
  /** Where text messages reach the person; null when no number is known. */
  phone: z.string().nullable(),
  roles: z.array(z.object({ role: z.enum(ROLES), terminal: z.string() })),
  /** Sessions that stand now. */
  sessions: z.number().int(),
  lastSeenAt: z.string().nullable(),
});
export type WirePerson = z.infer<typeof personSchema>;

/** A link that sets a password once. The address is shown this one time only. */
export const oneTimeLinkSchema = z.object({ url: z.string(), expiresAt: z.string() });
export type OneTimeLink = z.infer<typeof oneTimeLinkSchema>;

/** A new person. Without a password the answer carries a one-time link. */
export const createPersonSchema = z.strictObject({
  email: emailSchema,
  name: textSchema(80),
  password: passwordTextSchema.optional(),
  badge: badgeSchema.optional(),
  phone: phoneSchema.optional(),
  roles: z.array(roleGrantSchema).max(200),
});
export type CreatePersonRequest = z.infer<typeof createPersonSchema>;

/** Answer to a new person. */
export const createdPersonSchema = personSchema.extend({ link: oneTimeLinkSchema.optional() });
export type CreatedPerson = z.infer<typeof createdPersonSchema>;

/** What an administrator may change about a person; what is absent stays. `version` is the one that was seen. */
export const updatePersonSchema = z.strictObject({
  version: z.number().int().optional(),
  name: textSchema(80).optional(),
  active: z.boolean().optional(),
  /** Null takes the badge away, and the PIN with it. */
  badge: badgeSchema.nullable().optional(),
  phone: phoneSchema.nullable().optional(),
  roles: z.array(roleGrantSchema).max(200).optional(),
});
export type UpdatePersonRequest = z.infer<typeof updatePersonSchema>;

/** A password given to a person by an administrator. All their sessions end with it. */
export const givePasswordSchema = z.strictObject({ password: passwordTextSchema });
export type GivePasswordRequest = z.infer<typeof givePasswordSchema>;

/** A member of the crews of a terminal, for picking. */
export const crewMemberSchema = z.object({
  id: z.string(),
  name: z.string(),
  as: z.array(z.enum(['conductor', 'engineer'])),
  /** Absent for somebody without one. */
  badge: z.string().optional(),
});
export type CrewMember = z.infer<typeof crewMemberSchema>;
