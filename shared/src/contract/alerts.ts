import { z } from 'zod';
import { ALERT_CAUSES, ALERT_STATES, PRIORITIES } from '../lateness/finding';
import { instantSchema, terminalCodeSchema, textSchema } from './primitives';

/** An alert as every route gives it. */
export const alertSchema = z.object({
  id: z.string(),
  version: z.number().int(),
  cause: z.enum(ALERT_CAUSES),
  priority: z.enum(PRIORITIES),
  state: z.enum(ALERT_STATES),
  terminal: z.string(),
  turnId: z.string().nullable(),
  /** Where: "Track 3, train 1742". */
  subject: z.string(),
  raisedAt: z.string(),
  takenAt: z.string().nullable(),
  takenBy: z.string().nullable(),
  setAsideUntil: z.string().nullable(),
  setAsideReason: z.string().nullable(),
  clearedAt: z.string().nullable(),
  closedAt: z.string().nullable(),
  closedCause: z.string().nullable(),
  /** What is wrong, by when. */
  text: z.string(),
  action: z.string(),
  actor: z.string(),
  byWhen: z.string().nullable(),
  lines: z.array(z.string()),
  /** The cleared alert of the same cause that came back as this one. */
  previousId: z.string().nullable(),
});
export type WireAlert = z.infer<typeof alertSchema>;

/** Set aside until an instant, with a reason. */
export const setAsideSchema = z.strictObject({ until: instantSchema, reason: textSchema(300) });
/** Close a cleared alert by naming its cause. */
export const closeAlertSchema = z.strictObject({ cause: textSchema(300) });

/** Words of the `state` question: `standing` is raised, taken or set aside. */
export const ALERT_QUESTIONS = ['standing', 'all', ...ALERT_STATES] as const;

/** Which alerts; without a terminal those of every terminal the caller may see. */
export const alertsQuerySchema = z.strictObject({
  terminal: terminalCodeSchema.optional(),
  state: z.enum(ALERT_QUESTIONS).default('standing'),
});
export type AlertsQuery = z.infer<typeof alertsQuerySchema>;
export type SetAsideRequest = z.infer<typeof setAsideSchema>;
export type CloseAlertRequest = z.infer<typeof closeAlertSchema>;

/** An alert can be set aside for this long at most, then it returns by itself. */
export const longestSetAsideMinutes = 30;
