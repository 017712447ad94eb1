import { z } from 'zod';
import { terminalCodeSchema, textSchema } from './primitives';

/**
 * Where a train of so many cars stops on a track. `direction` is given where the mark differs by running
 * direction: the end at which the locomotive stands, seen from the bumping post.
 */
export const stoppingMarkerSchema = z.strictObject({
  cars: z.number().int().min(1).max(40),
  label: textSchema(12),
  direction: z.enum(['locomotive-at-post', 'locomotive-away']).optional(),
});
export type StoppingMarker = z.infer<typeof stoppingMarkerSchema>;

/** One track of a terminal. Length is that of the platform; grade in percent, falling towards the post is positive. */
export const trackSchema = z.strictObject({
  label: textSchema(12),
  lengthFeet: z.number().int().min(1).max(10_000).optional(),
  cars: z.number().int().min(1).max(40).optional(),
  gradePercent: z.number().min(-10).max(10).optional(),
  markers: z.array(stoppingMarkerSchema).max(80).optional(),
});
export type WireTrack = z.infer<typeof trackSchema>;

/** A terminal with its tracks in the order of the board. */
export const terminalSchema = z.object({
  id: z.string(),
  version: z.number().int(),
  code: z.string(),
  name: z.string(),
  zone: z.string(),
  tracks: z.array(trackSchema),
});
export type WireTerminal = z.infer<typeof terminalSchema>;

/** A new terminal. The zone is an IANA name such as `America/New_York`. */
export const createTerminalSchema = z.strictObject({
  code: terminalCodeSchema,
  name: textSchema(80),
  zone: z.string().trim().min(1).max(60),
});
export type CreateTerminalRequest = z.infer<typeof createTerminalSchema>;

const trackListSchema = z.array(trackSchema).max(60);

/** The tracks of a terminal, all at once; the old ones are replaced. A bare list, or the list under `tracks`. */
export const replaceTracksSchema = z.union([
  trackListSchema,
  z.strictObject({ tracks: trackListSchema }).transform((body) => body.tracks),
]);
export type ReplaceTracksRequest = z.infer<typeof replaceTracksSchema>;

/**
 * What a terminal counts as late or silent. Seconds and minutes are whole; a departure up to and including the
 * threshold is on time.
 */
export const terminalThresholdsSchema = z.strictObject({
  /** Seconds past the scheduled departure that still count as on time. */
  onTimeSeconds: z.number().int().min(0).max(3600),
  /** Whether a departure exactly at the threshold is on time. */
  onTimeInclusive: z.boolean(),
  /** Minutes after departure without a running brake test until it is an alert. */
  runningTestMinutes: z.number().int().min(1).max(240),
  /** Minutes past the due time of the next step or arrival without any word until it is an alert. */
  noWordMinutes: z.number().int().min(1).max(120),
  /** Seconds that slack must be below 0 before a late departure is raised. */
  raiseHoldSeconds: z.number().int().min(0).max(600),
  /** Seconds that slack must have been enough before it is cleared. */
  clearHoldSeconds: z.number().int().min(0).max(600),
  /** Slack in seconds from which a late departure is cleared. */
  clearSlackSeconds: z.number().int().min(0).max(1800),
});
export type TerminalThresholds = z.infer<typeof terminalThresholdsSchema>;

/** Settings of a terminal as the route gives them; version 0 stands for the shipped values. */
export const terminalSettingsSchema = z.object({
  terminal: z.string(),
  version: z.number().int(),
  thresholds: terminalThresholdsSchema,
  /** Whether the phone asks for the safety briefing before what is recorded from the controlling cab. */
  briefingRequired: z.boolean(),
  changedAt: z.string().nullable(),
  changedBy: z.string().nullable(),
});
export type WireTerminalSettings = z.infer<typeof terminalSettingsSchema>;

/** New settings; `version` is the one that was seen. */
export const updateTerminalSettingsSchema = z.strictObject({
  version: z.number().int(),
  thresholds: terminalThresholdsSchema,
  /** Left as it is where absent. */
  briefingRequired: z.boolean().optional(),
});
export type UpdateTerminalSettingsRequest = z.infer<typeof updateTerminalSettingsSchema>;

/** Query of the routes that speak of one terminal. */
export const terminalQuerySchema = z.strictObject({ terminal: terminalCodeSchema });
