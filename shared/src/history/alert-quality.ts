import type { Instant } from '../lib/instant';
import {
  type Burst,
  type InstantRange,
  countByPeriod,
  findBursts,
  spansByPeriod,
} from '../lateness/alert-load';
import {
  type RepeaterFigures,
  type UntakenFigures,
  isStale,
  measureRepeaters,
  measureUntaken,
} from './alert-attention';
import {
  type CountedShare,
  type PrecisionFigures,
  type WatchedDeparture,
  measurePrecision,
  measureWarned,
} from './alert-precision';
import { type PriorityPart, type TopSources, priorityMix, topSources } from './alert-sources';
import { type WarningFigures, measureWarning } from './alert-warning';
import { type DeskLoad, measureLoad } from './load-figures';
import type { PastAlert, PastDepartureOfTurn } from './past-alert';

/** A turn while alerts could be raised on it. */
export interface WatchedTurnSpan {
  /** While it stood at the terminal, or should have, and was known to the service. */
  span: InstantRange;
  /** Null for a tie-up. */
  departure: PastDepartureOfTurn | null;
  /** When its first alert of a late departure was raised; null without one. */
  firstAlertAt: Instant | null;
}

/** What the quality of a desk's alerts is worked out from. */
export interface AlertQualityFacts {
  /** Those raised in the range. */
  alerts: readonly PastAlert[];
  /** Those whose span touches the range. */
  turns: readonly WatchedTurnSpan[];
  range: InstantRange;
  /** Seconds past the scheduled departure that are still on time at this terminal. */
  thresholdSeconds: number;
  now: Instant;
}

/** How useful the alerts of a desk were; every share with what it was counted from. */
export interface AlertQuality {
  watchedTurns: number;
  alerts: number;
  load: DeskLoad;
  bursts: Burst[];
  priorities: PriorityPart[];
  sources: TopSources;
  repeaters: RepeaterFigures;
  /** Alerts of the range that stood, or stand, for more than 24 h. */
  stale: number;
  untaken: UntakenFigures;
  precision: PrecisionFigures;
  warning: WarningFigures;
  /** Of the watched trains that left late, those of which it was said before. */
  warned: CountedShare;
}

/** Everything about the alerts of one desk in a range of instants, from facts alone. */
export function measureAlertQuality(facts: AlertQualityFacts): AlertQuality {
  const { alerts, turns, range, thresholdSeconds, now } = facts;
  const counts = countByPeriod(
    alerts.map(({ raisedAt }) => raisedAt),
    range,
  );
  const turnsOnHand = spansByPeriod(
    turns.map(({ span }) => span),
    range,
  );
  const bursts = findBursts(counts);
  return {
    watchedTurns: turns.length,
    alerts: alerts.length,
    load: measureLoad({ alerts: counts, turnsOnHand, bursts }),
    bursts,
    priorities: priorityMix(alerts),
    sources: topSources(alerts),
    repeaters: measureRepeaters(alerts),
    stale: alerts.filter((alert) => isStale(alert, now)).length,
    untaken: measureUntaken(alerts),
    precision: measurePrecision(alerts, thresholdSeconds),
    warning: measureWarning(alerts),
    warned: measureWarned(turns.flatMap(watchedDeparture), thresholdSeconds),
  };
}

function watchedDeparture({ departure, firstAlertAt }: WatchedTurnSpan): WatchedDeparture[] {
  return departure === null ? [] : [{ departure, firstAlertAt }];
}
