import { z } from 'zod';
import { dateSchema, terminalCodeSchema, textSchema } from './primitives';

/** Life of one imported timetable. */
export const TIMETABLE_STATES = ['reading', 'ready', 'refused', 'active', 'retired'] as const;
export type TimetableState = (typeof TIMETABLE_STATES)[number];
/** How bad a problem in an import is: the file is refused, a part is left out, or something is only remarked. */
export const PROBLEM_SEVERITIES = ['refused', 'left-out', 'note'] as const;
export type ProblemSeverity = (typeof PROBLEM_SEVERITIES)[number];

/** One problem of an import; `line` is the line in the file, the header being line 1. */
export const importProblemSchema = z.object({
  severity: z.enum(PROBLEM_SEVERITIES),
  file: z.string().nullable(),
  line: z.number().int().nullable(),
  code: z.string(),
  message: z.string(),
});
export type ImportProblem = z.infer<typeof importProblemSchema>;

/** What an import holds, once read. */
export const timetableSummarySchema = z.object({
  trips: z.number().int(),
  blocks: z.number().int(),
  turns: z.number().int(),
  firstDate: z.string().nullable(),
  lastDate: z.string().nullable(),
  zone: z.string(),
  agency: z.string(),
  stations: z.array(
    z.object({
      stationId: z.string(),
      name: z.string(),
      turns: z.number().int(),
      medianLayoverSeconds: z.number().nullable(),
      /** Turns whose layover is below the shortest turn of the default plan. */
      shortByDesign: z.number().int(),
      platforms: z.array(z.string()),
    }),
  ),
});
export type TimetableSummary = z.infer<typeof timetableSummarySchema>;

/** One imported timetable as the routes give it. */
export const timetableSchema = z.object({
  id: z.string(),
  state: z.enum(TIMETABLE_STATES),
  fileName: z.string(),
  uploadedAt: z.string(),
  uploadedBy: z.string().nullable(),
  /** While reading: what is being done and how far, 0 to 1. */
  progress: z.object({ stage: z.string(), share: z.number() }).nullable(),
  activeFrom: z.string().nullable(),
  problems: z.array(importProblemSchema),
  summary: timetableSummarySchema.nullable(),
  terminals: z.array(z.object({ code: z.string(), name: z.string(), stationIds: z.array(z.string()) })),
});
export type WireTimetable = z.infer<typeof timetableSchema>;

/** One derived pair of trains at one station on one service date. */
export const derivedTurnSchema = z.object({
  serviceDate: z.string(),
  stationId: z.string(),
  blockId: z.string().nullable(),
  inboundTripId: z.string(),
  arrivalAt: z.string(),
  outboundTripId: z.string(),
  departureAt: z.string(),
  layoverSeconds: z.number().int(),
  reverses: z.boolean(),
  guessed: z.boolean(),
});
export type WireDerivedTurn = z.infer<typeof derivedTurnSchema>;

/** Make a timetable the running one from a service date on, for the named terminals. */
export const activationSchema = z.strictObject({
  from: dateSchema,
  terminals: z
    .array(
      z.strictObject({
        code: terminalCodeSchema,
        name: textSchema(80),
        stationIds: z.array(z.string().min(1)).min(1),
      }),
    )
    .min(1),
  /** Take the pairs guessed for trips without a block as turns. */
  acceptGuesses: z.boolean().optional(),
});
export type ActivationRequest = z.infer<typeof activationSchema>;

/** What would change at a terminal on one service date if a timetable took over. */
export const timetableDifferenceSchema = z.object({
  against: z.string().nullable(),
  dates: z.array(
    z.object({
      serviceDate: z.string(),
      added: z.number().int(),
      removed: z.number().int(),
      moved: z.number().int(),
      same: z.number().int(),
    }),
  ),
  turns: z.array(
    z.object({
      serviceDate: z.string(),
      change: z.enum(['added', 'removed', 'moved']),
      stationId: z.string(),
      before: z.string().nullable(),
      after: z.string().nullable(),
    }),
  ),
});
export type TimetableDifference = z.infer<typeof timetableDifferenceSchema>;
