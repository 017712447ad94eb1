import { z } from 'zod';
import { PROBLEM_SEVERITIES } from '../timetable/problem';
import { parseRouteTypes } from '../timetable/route-types';
import { dateSchema, terminalCodeSchema, textSchema } from './primitives';

/** Life of one imported timetable. */
export const TIMETABLE_STATES = ['reading', 'ready', 'refused', 'active', 'retired'] as const;
export type TimetableState = (typeof TIMETABLE_STATES)[number];

/** Form fields beside the file of an upload. */
export const uploadFieldsSchema = z.object({
  routeTypes: z
    .string()
    .optional()
    .refine((text) => text === undefined || text.trim() === '' || parseRouteTypes(text) !== null, {
      message: 'route types are numbers or ranges, such as 2,100-117',
    }),
});
export type UploadFields = z.infer<typeof uploadFieldsSchema>;

/** Answer to an upload. */
export const uploadReceiptSchema = z.object({ id: z.string(), state: z.literal('reading') });
export type UploadReceipt = z.infer<typeof uploadReceiptSchema>;

/** One problem of an import; `line` is the line in the file, the header being line 1. */
export const importProblemSchema = z.object({
  severity: z.enum(PROBLEM_SEVERITIES),
  file: z.string().nullable(),
  line: z.number().int().nullable(),
  code: z.string(),
  message: z.string(),
});
export type WireImportProblem = z.infer<typeof importProblemSchema>;

/** A station at which trains begin, end or turn. */
const stationSummarySchema = z.object({
  stationId: z.string(),
  name: z.string(),
  /** Turns on all days; guessed ones are counted apart. */
  turns: z.number().int(),
  guessedTurns: z.number().int(),
  medianLayoverSeconds: z.number().nullable(),
  /** Turns whose layover is below the shortest turn of the default plan. */
  shortByDesign: z.number().int(),
  /** Labels of the tracks that its platforms suggest. */
  platforms: z.array(z.string()),
  turnsOnBusiestDay: z.number().int(),
  /** Turns of the busiest day by whole minutes of layover. */
  layovers: z.array(z.object({ minutes: z.number().int(), turns: z.number().int() })),
});
export type WireStationSummary = z.infer<typeof stationSummarySchema>;

/** What an import holds, once read. */
export const timetableSummarySchema = z.object({
  trips: z.number().int(),
  blocks: z.number().int(),
  turns: z.number().int(),
  guessedTurns: z.number().int(),
  firstDate: z.string().nullable(),
  lastDate: z.string().nullable(),
  busiestDate: z.string().nullable(),
  zone: z.string(),
  agency: z.string(),
  stations: z.array(stationSummarySchema),
  /** Where trains change stations without running: one real place, or an empty run. */
  gaps: z.array(z.object({ fromStationId: z.string(), toStationId: z.string(), pairs: z.number().int() })),
});
export type WireTimetableSummary = z.infer<typeof timetableSummarySchema>;

/** A terminal and the stations of the timetable it is made of. */
export const terminalChoiceSchema = z.strictObject({
  code: terminalCodeSchema,
  name: textSchema(80),
  stationIds: z.array(z.string().min(1)).min(1).max(200),
});
export type WireTerminalChoice = z.infer<typeof terminalChoiceSchema>;

/** An imported timetable in lists. */
export const timetableHeadSchema = z.object({
  id: z.string(),
  state: z.enum(TIMETABLE_STATES),
  fileName: z.string(),
  fileBytes: z.number().int(),
  routeTypes: z.string(),
  uploadedAt: z.string(),
  uploadedBy: z.string().nullable(),
  /** When reading it ended, well or not. */
  readAt: z.string().nullable(),
  /** While reading: what is being done and how far, 0 to 1. */
  progress: z.object({ stage: z.string(), share: z.number() }).nullable(),
  /** First and last service date for which it was or will be the running one; open at the end when null. */
  activeFrom: z.string().nullable(),
  activeUntil: z.string().nullable(),
  firstDate: z.string().nullable(),
  lastDate: z.string().nullable(),
});
export type WireTimetableHead = z.infer<typeof timetableHeadSchema>;

/** One imported timetable as the routes give it. */
export const timetableSchema = timetableHeadSchema.extend({
  problems: z.array(importProblemSchema),
  summary: timetableSummarySchema.nullable(),
  /** Terminals chosen at its last activation. */
  terminals: z.array(terminalChoiceSchema),
  /** Whether guessed pairs were taken as turns at its last activation. */
  acceptGuesses: z.boolean(),
  /** The timetable that one action would bring back; null when there is none before this one. */
  rollBackTo: z.object({ id: z.string(), fileName: z.string() }).nullable(),
});
export type WireTimetable = z.infer<typeof timetableSchema>;

/** Query of the derived turns of a timetable. */
export const derivedTurnsQuerySchema = z.object({ serviceDate: dateSchema });
export type DerivedTurnsQuery = z.infer<typeof derivedTurnsQuerySchema>;

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
  terminals: z.array(terminalChoiceSchema).min(1).max(200),
  /** Take the pairs guessed for trips without a block as turns. */
  acceptGuesses: z.boolean().optional(),
});
export type ActivationRequest = z.infer<typeof activationSchema>;

/** Days compared when the question names none: a week. */
export const comparedDays = 7;

/** Query of the difference to the running timetable. */
export const differenceQuerySchema = z.object({
  /** First date compared; today when absent. */
  from: dateSchema.optional(),
  days: z.coerce.number().int().min(1).max(31).default(comparedDays),
});
export type DifferenceQuery = z.infer<typeof differenceQuerySchema>;

const comparedTurnSchema = z.object({
  inboundTrain: z.string(),
  arrivalAt: z.string(),
  outboundTrain: z.string(),
  departureAt: z.string(),
  layoverSeconds: z.number().int(),
});
export type WireComparedTurn = z.infer<typeof comparedTurnSchema>;

/** What would change on each date at each terminal if a timetable took over. */
export const timetableDifferenceSchema = z.object({
  /** The timetable that runs on the first compared date; null when none does, and there is nothing to compare. */
  against: z.object({ id: z.string(), fileName: z.string() }).nullable(),
  dates: z.array(
    z.object({
      serviceDate: z.string(),
      /** Date of the running timetable that was looked at: the same, or a like weekday where it does not reach. */
      againstDate: z.string().nullable(),
      terminal: z.string(),
      added: z.number().int(),
      removed: z.number().int(),
      moved: z.number().int(),
      same: z.number().int(),
    }),
  ),
  turns: z.array(
    z.object({
      serviceDate: z.string(),
      terminal: z.string(),
      change: z.enum(['added', 'removed', 'moved']),
      before: comparedTurnSchema.nullable(),
      after: comparedTurnSchema.nullable(),
    }),
  ),
});
export type WireTimetableDifference = z.infer<typeof timetableDifferenceSchema>;
