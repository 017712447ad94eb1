import { z } from 'zod';
import { ANCHORS, DOERS, PLACES, STEP_KINDS } from '../plan/step-plan';
import { CREW_ROLES, ENTRY_SOURCES } from '../turn/entry';
import { HEALTHS, STEP_STATES, TURN_KINDS, TURN_STATES } from '../turn/turn';
import { alertSchema } from './alerts';
import { readingSchema } from './entries';
import { dateSchema, instantSchema, terminalCodeSchema, textSchema } from './primitives';
import { turnMattersFields } from './turn-matters';

const stepSchema = z.object({
  key: z.string(),
  label: z.string(),
  shortLabel: z.string(),
  kind: z.enum(STEP_KINDS),
  doer: z.enum(DOERS),
  place: z.enum(PLACES),
  anchor: z.enum(ANCHORS),
  dueAt: z.string().nullable(),
  latestFinishAt: z.string().nullable(),
  /** Recorded time when done, else the forecast finish. */
  forecastFinishAt: z.string().nullable(),
  state: z.enum(STEP_STATES),
  doneAt: z.string().nullable(),
  source: z.enum(ENTRY_SOURCES).nullable(),
  by: z.string().nullable(),
  saidBy: z.string().nullable(),
  reading: readingSchema.nullable(),
  /** The entry that counts for this step. */
  entryId: z.string().nullable(),
  /** Words for what is open about the step: "1 of 2 handbrakes released", "cannot do: …", two times. */
  remarks: z.array(z.string()),
  holdsDeparture: z.boolean(),
});

/** A turn as every route gives it. Instants are ISO 8601 with `Z`, durations whole seconds. */
export const turnSchema = z.object({
  id: z.string(),
  version: z.number().int(),
  kind: z.enum(TURN_KINDS),
  terminal: z.string(),
  zone: z.string(),
  serviceDate: z.string(),
  state: z.enum(TURN_STATES),
  health: z.enum(HEALTHS),
  /** True for a turn entered by hand. */
  extra: z.boolean(),
  reverses: z.boolean().nullable(),
  track: z.string().nullable(),
  /** The track it was planned on, when it was changed since. */
  plannedTrack: z.string().nullable(),
  set: z.string().nullable(),
  /** Cars of the set in order from the bumping post, when the set is known. */
  cars: z.array(z.string()),
  crew: z.array(z.object({ as: z.enum(CREW_ROLES), personId: z.string(), name: z.string() })),
  planId: z.string(),
  inbound: z
    .object({
      train: z.string(),
      scheduledArrivalAt: z.string(),
      expectedArrivalAt: z.string().nullable(),
      actualArrivalAt: z.string().nullable(),
    })
    .nullable(),
  outbound: z
    .object({
      train: z.string(),
      scheduledDepartureAt: z.string(),
      heldUntil: z.string().nullable(),
      holdReason: z.string().nullable(),
      expectedDepartureAt: z.string().nullable(),
      actualDepartureAt: z.string().nullable(),
    })
    .nullable(),
  steps: z.array(stepSchema),
  forecast: z.object({
    readyAt: z.string().nullable(),
    readyAtNineInTen: z.string().nullable(),
    chanceOnTime: z.number().nullable(),
    slackSeconds: z.number().int().nullable(),
    criticalSteps: z.array(z.string()),
  }),
  alerts: z.array(alertSchema),
  blueSignal: z.object({ since: z.string(), by: z.string() }).nullable(),
  annulled: z.object({ at: z.string(), reason: z.string() }).nullable(),
  /** What the handbrake records add up to, and since when nobody is at the train with none standing set. */
  securement: z
    .object({
      set: z.number().int().nullable(),
      released: z.number().int().nullable(),
      carsStillSet: z.array(z.string()),
      unsecuredSince: z.string().nullable(),
    })
    .optional(),
  /** Scheduled layover shorter than the plan's shortest turn. */
  shortByDesign: z.boolean(),
  /** Newest instant at which anything was heard about the turn; null before the first entry. */
  lastHeardAt: z.string().nullable(),
  /** What is wrong with entries, in words: out of order, smaller count than set, two times for one step. */
  findings: z.array(z.string()),
  noteCount: z.number().int(),
  ...turnMattersFields,
  /** Instant at which forecast, health and step states were computed. */
  computedAt: z.string(),
});
export type WireTurn = z.infer<typeof turnSchema>;
export type WireStep = z.infer<typeof stepSchema>;
export type WireSecurement = NonNullable<WireTurn['securement']>;

/** Answer of the board route. */
export const boardSchema = z.object({ now: z.string(), terminal: z.string(), turns: z.array(turnSchema) });
export type WireBoard = z.infer<typeof boardSchema>;

const inboundRequestSchema = z.strictObject({ train: textSchema(20), scheduledArrivalAt: instantSchema });
const outboundRequestSchema = z.strictObject({ train: textSchema(20), scheduledDepartureAt: instantSchema });

/** An extra turn entered by hand. Needs an inbound or an outbound train, or both. */
export const createTurnSchema = z
  .strictObject({
    terminal: terminalCodeSchema,
    serviceDate: dateSchema,
    track: textSchema(12).optional(),
    set: textSchema(20).optional(),
    inbound: inboundRequestSchema.optional(),
    outbound: outboundRequestSchema.optional(),
  })
  .refine((turn) => turn.inbound !== undefined || turn.outbound !== undefined, {
    message: 'a turn needs an inbound or an outbound train',
  });
export type CreateTurnRequest = z.infer<typeof createTurnSchema>;

/** Answer to a recorded entry: its place in the sealed log and the turn as it now stands. */
export const entryReceiptSchema = z.object({
  sequence: z.number().int(),
  hash: z.string(),
  turn: turnSchema,
});
export type EntryReceipt = z.infer<typeof entryReceiptSchema>;

/** Found turns, best first. */
export const foundTurnSchema = z.object({
  turnId: z.string(),
  terminal: z.string(),
  serviceDate: z.string(),
  text: z.string(),
  matched: z.enum(['train', 'set', 'car', 'person', 'track']),
  at: z.string(),
});
export type FoundTurn = z.infer<typeof foundTurnSchema>;

/** Which turns of a terminal: a half-open range of instants, or one service day. */
export const boardQuerySchema = z
  .strictObject({
    terminal: terminalCodeSchema,
    from: instantSchema.optional(),
    to: instantSchema.optional(),
    serviceDate: dateSchema.optional(),
  })
  .refine(
    (query) => query.serviceDate === undefined || (query.from === undefined && query.to === undefined),
    {
      path: ['serviceDate'],
      message: 'either a service date or a range',
    },
  );
export type BoardQuery = z.infer<typeof boardQuerySchema>;

/** The board shows turns from this long before now unless asked otherwise. Our choice. */
export const boardBackMinutes = 20;
/** The board shows turns to this long after now unless asked otherwise. Our choice. */
export const boardAheadMinutes = 240;

/** What to look for at a terminal: part of a train number, set, car, person or track. */
export const findQuerySchema = z.strictObject({ terminal: terminalCodeSchema, q: textSchema(40) });
export type FindQuery = z.infer<typeof findQuerySchema>;
