import { z } from 'zod';
import { pinPattern } from '../access/pin';
import { ALL_TERMINALS, ROLES } from '../access/roles';
import { terminalCodeSchema, textSchema } from './primitives';

/** A role at one terminal, or at all of them (`*`). */
export const roleGrantSchema = z.strictObject({
  role: z.enum(ROLES),
  terminal: z.union([z.literal(ALL_TERMINALS), terminalCodeSchema]),
});

/** Any text as a password; whether it is good enough is judged by the service with a code of its own. */
export const passwordTextSchema = z.string().min(1).max(1024);

/** Mail address as the name somebody signs in with; upper and lower case are one. */
export const emailSchema = z
  .string()
  .trim()
  .max(254)
  .transform((text) => text.toLowerCase())
  .pipe(z.email());

/**
 * Number on a person's badge: 2 to 12 letters, digits or dashes; small letters count as large ones. Length is our choice.
 * Example: `c-4471` is read as `C-4471`.
 */
export const badgeSchema = z
  .string()
  .trim()
  .transform((text) => text.toUpperCase())
  .pipe(z.string().regex(/^[A-Z0-9][A-Z0-9-]{1,11}$/));

/**
 * Number of a telephone for text messages, with its country code; blanks, dashes and brackets are dropped (E.164).
 * Example: `+1 (555) 010-4471` is read as `+15550104471`.
 */
export const phoneSchema = z
  .string()
  .max(40)
  .transform((text) => text.replace(/[\s().-]/g, ''))
  .pipe(z.string().regex(/^\+[1-9]\d{6,14}$/));

/** A PIN as it is typed: digits only. Whether it is too simple is judged by `judgePin`. */
const pinSchema = z.string().regex(pinPattern);

/** Something typed where a PIN belongs; a wrong one is answered as any other wrong pair. */
const typedPinSchema = z.string().min(1).max(40);
const typedBadgeSchema = z.string().trim().min(1).max(40);

/** Signing in. The address need not look like one: a wrong one is answered as any other wrong pair. */
const signInByEmailSchema = z.strictObject({
  email: z.string().trim().min(1).max(254),
  password: passwordTextSchema,
});

/** Signing in by address and password, or by badge with PIN or password, as on phones that a crew shares. */
export const signInSchema = z.union([
  signInByEmailSchema,
  z.strictObject({ badge: typedBadgeSchema, pin: typedPinSchema }),
  z.strictObject({ badge: typedBadgeSchema, password: passwordTextSchema }),
]);
export type SignInRequest = z.infer<typeof signInSchema>;

/** Who is signed in. */
export const signedInPersonSchema = z.object({
  id: z.string(),
  name: z.string(),
  roles: z.array(z.object({ role: z.enum(ROLES), terminal: z.string() })),
});
export type SignedInPerson = z.infer<typeof signedInPersonSchema>;

/** Answer of signing in and of asking who is signed in. */
export const sessionSchema = z.object({ person: signedInPersonSchema });
export type SessionAnswer = z.infer<typeof sessionSchema>;

/** A new password of one's own. All other sessions end with it. */
export const changePasswordSchema = z.strictObject({
  current: passwordTextSchema,
  password: passwordTextSchema,
});
export type ChangePasswordRequest = z.infer<typeof changePasswordSchema>;

/** A PIN of one's own, or none; the password shows who is there. Absent for a person who has no password. */
export const changePinSchema = z.strictObject({
  current: passwordTextSchema.optional(),
  pin: pinSchema.nullable(),
});
export type ChangePinRequest = z.infer<typeof changePinSchema>;

/** One's own badge, and whether there is a PIN to go with it. */
export const ownBadgeSchema = z.object({
  badge: z.string().nullable(),
  hasPin: z.boolean(),
  hasPassword: z.boolean(),
});
export type OwnBadge = z.infer<typeof ownBadgeSchema>;

/** One of a person's own sessions. */
export const ownSessionSchema = z.object({
  id: z.string(),
  startedAt: z.string(),
  lastSeenAt: z.string(),
  endsAt: z.string(),
  /** What the browser called itself when it signed in. */
  device: z.string(),
  /** The session this question came with. */
  current: z.boolean(),
});
export type OwnSession = z.infer<typeof ownSessionSchema>;

/** What a one-time link shows before it is used. */
export const linkSchema = z.object({ name: z.string(), email: z.string(), expiresAt: z.string() });
export type WireLink = z.infer<typeof linkSchema>;

/** A password set through a one-time link. */
export const useLinkSchema = z.strictObject({ password: passwordTextSchema });
export type UseLinkRequest = z.infer<typeof useLinkSchema>;

/** Whether this installation still waits for its first administrator. */
export const setupSchema = z.object({ needed: z.boolean() });
export type SetupAnswer = z.infer<typeof setupSchema>;

/** The first administrator of an empty installation. */
export const firstAdministratorSchema = z.strictObject({
  email: emailSchema,
  name: textSchema(80),
  password: passwordTextSchema,
});
export type FirstAdministratorRequest = z.infer<typeof firstAdministratorSchema>;
