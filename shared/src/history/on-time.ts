import { secondsBetween, type CalendarDate, type Instant } from '../lib/instant';
import { mean } from './moments';
import { quantileOfSorted } from './quantile';
import { wilsonInterval, type ShareInterval } from './wilson';

/** One scheduled departure and what became of it. */
export interface Departure {
  serviceDate: CalendarDate;
  train: string;
  scheduledDepartureAt: Instant;
  /** Null when it was annulled or when nobody recorded that it left. */
  actualDepartureAt: Instant | null;
  annulled: boolean;
}

/** What counts as on time. Two figures made by different rules must not be compared; so the rule is always shown. */
export interface OnTimeRule {
  /** Largest lateness that is still on time, in whole seconds. */
  thresholdSeconds: number;
  /** Whether exactly the threshold is still on time. */
  inclusive: boolean;
  /** Whether a train that left before its time is on time. */
  early: 'on-time' | 'not-on-time';
  /** Whether an annulled train is left out of the share or counts as not on time. */
  annulled: 'left-out' | 'not-on-time';
}

/** On-time figures of a set of departures. */
export interface OnTimeFigures {
  /** All departures asked about. */
  scheduled: number;
  /** Those that the share is of. */
  counted: number;
  onTime: number;
  annulled: number;
  /** Neither annulled nor recorded as having left: they count neither way, and their number is shown. */
  noRecord: number;
  /** onTime ÷ counted, 0 to 1; null when nothing was counted. */
  share: number | null;
  interval: ShareInterval | null;
  /** Of the departures with a record, early ones as negative seconds. */
  delaySeconds: { mean: number | null; p50: number | null; p80: number | null; p95: number | null };
}

/**
 * Seconds after the SCHEDULED departure, negative when early; holds do not move it. Cut to whole seconds towards the
 * past, so that 59.9 s late is 59; null without a record.
 */
export function delaySecondsOf(departure: Departure): number | null {
  if (departure.actualDepartureAt === null || departure.annulled) return null;
  return Math.floor(secondsBetween(departure.scheduledDepartureAt, departure.actualDepartureAt));
}

/** Whether a delay in whole seconds is on time by a rule. `isOnTime(60, { thresholdSeconds: 59, … })` is false. */
export function isOnTime(delaySeconds: number, rule: OnTimeRule): boolean {
  if (delaySeconds < 0) return rule.early === 'on-time';
  return rule.inclusive ? delaySeconds <= rule.thresholdSeconds : delaySeconds < rule.thresholdSeconds;
}

/** Whether a departure counts and, if so, as what: null when it is left out of the share. */
export function verdictOf(departure: Departure, rule: OnTimeRule): boolean | null {
  if (departure.annulled) return rule.annulled === 'not-on-time' ? false : null;
  const delaySeconds = delaySecondsOf(departure);
  return delaySeconds === null ? null : isOnTime(delaySeconds, rule);
}

/** Measures departures by a rule. */
export function measureOnTime(departures: readonly Departure[], rule: OnTimeRule): OnTimeFigures {
  const verdicts = departures
    .map((departure) => verdictOf(departure, rule))
    .filter((verdict) => verdict !== null);
  const delays = departures
    .map(delaySecondsOf)
    .filter((delay) => delay !== null)
    .sort((a, b) => a - b);
  const onTime = verdicts.filter(Boolean).length;
  const annulled = departures.filter((departure) => departure.annulled).length;
  return {
    scheduled: departures.length,
    counted: verdicts.length,
    onTime,
    annulled,
    noRecord: departures.length - annulled - delays.length,
    share: verdicts.length === 0 ? null : onTime / verdicts.length,
    interval: wilsonInterval(onTime, verdicts.length),
    delaySeconds: {
      mean: mean(delays),
      p50: quantileOfSorted(delays, 0.5),
      p80: quantileOfSorted(delays, 0.8),
      p95: quantileOfSorted(delays, 0.95),
    },
  };
}

/** The rule in words, for beside every figure: "left within 0:59 of schedule; early is on time; annulled left out". */
export function nameOfRule(rule: OnTimeRule): string {
  const minutes = Math.floor(rule.thresholdSeconds / 60);
  const limit = `${minutes}:${String(rule.thresholdSeconds % 60).padStart(2, '0')}`;
  return [
    rule.inclusive ? `left within ${limit} of schedule` : `left less than ${limit} after schedule`,
    rule.early === 'on-time' ? 'early is on time' : 'early is not on time',
    rule.annulled === 'left-out' ? 'annulled left out' : 'annulled not on time',
  ].join('; ');
}
