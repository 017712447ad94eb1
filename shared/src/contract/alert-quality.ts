import { z } from 'zod';
import { PRECISION_VERDICTS } from '../history/alert-precision';
import { ALERT_CAUSES, PRIORITIES } from '../lateness/finding';
import { dateSchema, terminalCodeSchema } from './primitives';

/**
 * What to do with turns that were entered when they were over, such as a past that was loaded: nobody could have acted
 * on their alerts, which were looked for only when an entry came in.
 */
export const AFTERWARDS = ['left-out', 'counted'] as const;
export type Afterwards = (typeof AFTERWARDS)[number];

/** Quality of the alerts of one desk over calendar days at the terminal, both included. */
export const alertQualityQuerySchema = z.strictObject({
  terminal: terminalCodeSchema,
  from: dateSchema,
  to: dateSchema,
  afterwards: z.enum(AFTERWARDS).default('left-out'),
});
export type AlertQualityQuery = z.infer<typeof alertQualityQuerySchema>;

/** Longest range of one question, in days. */
export const longestAlertQualityDays = 400;

const count = z.number().int();
const amount = z.number().nullable();
const countedShape = {
  count,
  counted: count,
  share: amount,
  /** Wilson, 95 %. */
  interval: z.object({ low: z.number(), high: z.number(), confidence: z.number() }).nullable(),
};
const countedSchema = z.object(countedShape);
const loadSchema = z.object({
  /** Periods of 10 minutes. */
  periods: count,
  alerts: count,
  /** Periods with 0, 1, 2 … alerts. */
  histogram: z.array(count),
  mean: amount,
  median: amount,
  ninetyFifth: amount,
  most: amount,
  shareInBurst: amount,
});

/** How useful the alerts of a desk were; the targets beside the figures are named in the shared rules. */
export const alertQualitySchema = z.object({
  terminal: z.string(),
  from: z.string(),
  to: z.string(),
  afterwards: z.enum(AFTERWARDS),
  /** Up to when the figures go. */
  asOf: z.string(),
  /** Seconds past the scheduled departure that are still on time here. */
  thresholdSeconds: count,
  /** Turns that the figures are about. */
  watchedTurns: count,
  /** Turns of these days that were entered when they were over, in the figures or not. */
  unwatchedTurns: count,
  /** Alerts that were worked out from entries of such turns, at times before the turn was known; in the figures or not. */
  unseenAlerts: count,
  alerts: count,
  load: z.object({ all: loadSchema, peak: loadSchema, peakFromTurns: amount }),
  bursts: z.array(z.object({ fromAt: z.string(), toAt: z.string(), alerts: count, isOpen: z.boolean() })),
  priorities: z.array(z.object({ priority: z.enum(PRIORITIES), target: z.number(), ...countedShape })),
  sources: z.object({
    sources: z.array(
      z.object({
        cause: z.enum(ALERT_CAUSES),
        train: z.string().nullable(),
        count,
        share: z.number(),
        lastRaisedAt: z.string(),
      }),
    ),
    sourceCount: count,
    share: amount,
  }),
  repeaters: z.object({ chattering: count, cameBack: count, fleeting: count }),
  /** Alerts of these days that stood, or stand, for more than 24 h. */
  stale: count,
  /** What stands at `asOf`, whenever it was raised. */
  standing: z.object({
    count,
    untaken: count,
    /** The longest standing ones. */
    longest: z.array(
      z.object({
        id: z.string(),
        subject: z.string(),
        text: z.string(),
        raisedAt: z.string(),
        isStale: z.boolean(),
      }),
    ),
  }),
  /** Only of alerts that somebody could take. */
  untaken: z.object({
    ...countedShape,
    byPriority: z.array(z.object({ priority: z.enum(PRIORITIES), ...countedShape })),
    secondsToTake: z.object({ counted: count, median: amount, ninetyFifth: amount }),
  }),
  precision: z.object({
    verdicts: z.record(z.enum(PRECISION_VERDICTS), count),
    atLeast: countedSchema,
    atMost: countedSchema,
  }),
  warning: z.object({
    counted: count,
    median: amount,
    nineInTen: amount,
    afterDeparture: count,
    histogram: z.array(count),
  }),
  warned: countedSchema,
});
export type WireAlertQuality = z.infer<typeof alertQualitySchema>;
