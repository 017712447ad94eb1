import { z } from 'zod';
import { parseInstant } from '../lib/instant';

/** An instant on the wire: ISO 8601 with a zone; the service always writes `Z`. */
export const instantSchema = z
  .string()
  .refine((text) => parseInstant(text) !== null, { message: 'not an ISO 8601 instant with a zone' });

/** A calendar day `YYYY-MM-DD` that exists. */
export const dateSchema = z.iso.date();

/** Ids made by the client or the service: any UUID. */
export const idSchema = z.uuid();

/** A terminal's code: 1 to 12 letters, digits or dashes. */
export const terminalCodeSchema = z
  .string()
  .trim()
  .regex(/^[A-Za-z0-9][A-Za-z0-9-]{0,11}$/, 'a code is 1 to 12 letters, digits or dashes');

const halfOfPair = /\p{Surrogate}/u;

/** Free text that a person writes; blanks round it are dropped. Half of a surrogate pair is no text. */
export const textSchema = (longest: number) =>
  z
    .string()
    .trim()
    .min(1)
    .max(longest)
    .refine((text) => !halfOfPair.test(text), { message: 'not a text' });
