import { z } from 'zod';
import { DUTIES, MESSAGE_CHANNELS, RUNGS } from '../duty/roster';
import { PRIORITIES } from '../lateness/finding';
import { instantSchema } from './primitives';

const clockSchema = z.string().regex(/^([01]\d|2[0-3]):[0-5]\d$/, 'a time of day such as 22:00');

/** Longest time on duty in one piece, in hours. Our choice: a mistyped date must not last for weeks. */
export const longestShiftHours = 24;

/** Somebody's time on duty; the end is not included. */
export const dutyShiftSchema = z
  .strictObject({
    personId: z.string().min(1),
    as: z.enum(DUTIES),
    from: instantSchema,
    until: instantSchema,
  })
  .refine(({ from, until }) => Date.parse(from) < Date.parse(until), {
    path: ['until'],
    message: 'ends before it begins',
  })
  .refine(({ from, until }) => Date.parse(until) - Date.parse(from) <= longestShiftHours * 3_600_000, {
    path: ['until'],
    message: `lasts longer than ${longestShiftHours} h`,
  });
export type WireDutyShift = z.infer<typeof dutyShiftSchema>;

/** Somebody's quiet hours in the terminal's zone. */
export const quietHoursSchema = z.strictObject({
  personId: z.string().min(1),
  from: clockSchema,
  until: clockSchema,
});

/** One step of the escalation at a terminal. */
export const escalationStepSchema = z.strictObject({
  priority: z.enum(PRIORITIES),
  afterSeconds: z.number().int().min(0).max(7200),
  rung: z.enum(RUNGS),
  channels: z.array(z.enum(MESSAGE_CHANNELS)).min(1).max(2),
});

/** Somebody who may stand on the roster: whoever may act on alerts there. */
export const dutyPersonSchema = z.object({
  id: z.string(),
  name: z.string(),
  isSupervisor: z.boolean(),
  hasPhone: z.boolean(),
  quiet: z.object({ from: z.string(), until: z.string() }).nullable(),
});

/** The roster of a terminal; version 0 stands for the shipped one, which is empty. */
export const dutyRosterSchema = z.object({
  terminal: z.string(),
  zone: z.string(),
  version: z.number().int(),
  shifts: z.array(dutyShiftSchema),
  people: z.array(dutyPersonSchema),
  steps: z.array(escalationStepSchema),
  changedAt: z.string().nullable(),
  changedBy: z.string().nullable(),
});
export type WireDutyRoster = z.infer<typeof dutyRosterSchema>;

/** A new roster; `version` is the one that was seen. */
export const updateDutyRosterSchema = z.strictObject({
  version: z.number().int(),
  shifts: z.array(dutyShiftSchema).max(1000),
  quietHours: z.array(quietHoursSchema).max(500),
  steps: z.array(escalationStepSchema).max(40),
});
export type UpdateDutyRosterRequest = z.infer<typeof updateDutyRosterSchema>;
