import { addSeconds, type Instant } from '../lib/instant';
import type { PastAlert, PastDepartureOfTurn } from './past-alert';
import { wilsonInterval, type ShareInterval } from './wilson';

/**
 * What the record says about an alert of a late departure, once its train has left: it `left-late`; it left on time
 * after somebody held it (`held`) or had taken the alert (`taken`), so that nobody can know what would have been; or it
 * left on time and nobody did anything about the alert (`needless`). Otherwise why nothing can be said.
 */
export const PRECISION_VERDICTS = [
  'left-late',
  'held',
  'taken',
  'needless',
  'annulled',
  'no-departure',
] as const;
export type PrecisionVerdict = (typeof PRECISION_VERDICTS)[number];

/** A share with what it was counted from. */
export interface CountedShare {
  count: number;
  counted: number;
  /** 0 to 1; null when nothing was counted. */
  share: number | null;
  interval: ShareInterval | null;
}

/** How many alerts of a late departure were right, between what is sure and what is possible. */
export interface PrecisionFigures {
  verdicts: Record<PrecisionVerdict, number>;
  /** Of the judged alerts those whose train left late although it was said. */
  atLeast: CountedShare;
  /** These, and those about which somebody did something. */
  atMost: CountedShare;
}

/** A share of what was counted, with its Wilson interval. */
export function countedShare(count: number, counted: number): CountedShare {
  return {
    count,
    counted,
    share: counted === 0 ? null : count / counted,
    interval: wilsonInterval(count, counted),
  };
}

/**
 * Whether a train left more than a threshold of seconds after it was to leave: its scheduled departure, or the end of
 * its hold when that is later. Exactly the threshold is on time. Null when it has not left or was annulled.
 */
export function leftLate(departure: PastDepartureOfTurn, thresholdSeconds: number): boolean | null {
  if (departure.annulled || departure.leftAt === null) return null;
  const due = Math.max(departure.scheduledAt, departure.heldUntil ?? departure.scheduledAt);
  return departure.leftAt > addSeconds(due, thresholdSeconds);
}

/** The verdict about one alert of a late departure, by the terminal's own threshold for on time. */
export function precisionVerdict(alert: PastAlert, thresholdSeconds: number): PrecisionVerdict {
  const { departure, takenAt } = alert;
  if (departure === null) return 'no-departure';
  if (departure.annulled) return 'annulled';
  if (departure.leftAt === null) return 'no-departure';
  if (leftLate(departure, thresholdSeconds) === true) return 'left-late';
  if (departure.heldUntil !== null && departure.heldUntil > departure.scheduledAt) return 'held';
  return takenAt !== null && takenAt <= departure.leftAt ? 'taken' : 'needless';
}

/**
 * The share of the alerts of late departures that would have been late without action, as far as records tell: between
 * `left-late` alone and `left-late`, `held` and `taken` together, of all four judged verdicts. Other causes are left
 * out.
 */
export function measurePrecision(alerts: readonly PastAlert[], thresholdSeconds: number): PrecisionFigures {
  const verdicts = Object.fromEntries(PRECISION_VERDICTS.map((verdict) => [verdict, 0])) as Record<
    PrecisionVerdict,
    number
  >;
  for (const alert of alerts) {
    if (alert.cause === 'late-departure') verdicts[precisionVerdict(alert, thresholdSeconds)] += 1;
  }
  const acted = verdicts.held + verdicts.taken;
  const judged = verdicts['left-late'] + acted + verdicts.needless;
  return {
    verdicts,
    atLeast: countedShare(verdicts['left-late'], judged),
    atMost: countedShare(verdicts['left-late'] + acted, judged),
  };
}

/** A watched turn: how it left, and when its first alert of a late departure was raised; null without one. */
export interface WatchedDeparture {
  departure: PastDepartureOfTurn;
  firstAlertAt: Instant | null;
}

/** Of the watched trains that left late, those of which an alert was raised before they left. */
export function measureWarned(watched: readonly WatchedDeparture[], thresholdSeconds: number): CountedShare {
  const late = watched.filter(({ departure }) => leftLate(departure, thresholdSeconds) === true);
  const warned = late.filter(
    ({ departure, firstAlertAt }) =>
      firstAlertAt !== null && departure.leftAt !== null && firstAlertAt < departure.leftAt,
  );
  return countedShare(warned.length, late.length);
}
