import { Injectable } from '@nestjs/common';
import {
  type AlertQuality,
  type AlertQualityQuery,
  type Instant,
  type InstantRange,
  type WireAlertQuality,
  addDays,
  addSeconds,
  daysBetween,
  formatInstant,
  isStale,
  loadPeriodSeconds,
  longestAlertQualityDays,
  measureAlertQuality,
  measureUntaken,
  serviceInstant,
} from '@stubpost/shared';
import { Clock } from '../common/clock';
import { Refusal } from '../common/refusal';
import { TerminalsReadModel } from '../terminals/terminals.read-model';
import type { AlertRecord } from './alert-record';
import { AlertQualityReadModel } from './alert-quality.read-model';

/** How many of the standing alerts are named. */
const longestNamed = 10;

/** Answers how useful the alerts of a desk were: loads, asks `shared`, adds what stands now. */
@Injectable()
export class AlertQualityService {
  constructor(
    private readonly quality: AlertQualityReadModel,
    private readonly terminals: TerminalsReadModel,
    private readonly clock: Clock,
  ) {}

  async answer(query: AlertQualityQuery): Promise<WireAlertQuality> {
    const now = this.clock.now();
    requireRange(query);
    const { zone } = await this.terminals.require(query.terminal);
    const { onTimeSeconds } = await this.terminals.thresholdsOf(query.terminal);
    const range = rangeOf(query, zone, now);
    const [raised, turns, standing] = await Promise.all([
      this.quality.alertsRaised(query.terminal, range),
      this.quality.turnsOf(query.terminal, range),
      this.quality.standing(query.terminal),
    ]);
    const isAllCounted = query.afterwards === 'counted';
    const measured = measureAlertQuality({
      alerts: isAllCounted ? [...raised.seen, ...raised.unseen] : raised.seen,
      turns: isAllCounted ? [...turns.watched, ...turns.unwatched] : turns.watched,
      range,
      thresholdSeconds: onTimeSeconds,
      now,
    });
    return {
      ...query,
      asOf: formatInstant(now),
      thresholdSeconds: onTimeSeconds,
      unwatchedTurns: turns.unwatched.length,
      unseenAlerts: raised.unseen.length,
      standing: standingOf(standing, now),
      ...wireQualityOf(measured, range),
      untaken: measureUntaken(raised.seen),
    };
  }
}

function requireRange({ from, to }: AlertQualityQuery): void {
  const days = daysBetween(from, to);
  if (days < 0) throw new Refusal({ code: 'history.range', message: 'the range ends before it begins' });
  if (days > longestAlertQualityDays)
    throw new Refusal({
      code: 'history.range',
      message: `ask for at most ${longestAlertQualityDays} days at once`,
    });
}

/** Midnight to midnight on the terminal's calendar, never past now. */
function rangeOf({ from, to }: AlertQualityQuery, zone: string, now: Instant): InstantRange {
  const start = serviceInstant(from, 0, zone);
  return { from: start, to: Math.max(start, Math.min(now, serviceInstant(addDays(to, 1), 0, zone))) };
}

function standingOf(alerts: readonly AlertRecord[], now: Instant): WireAlertQuality['standing'] {
  return {
    count: alerts.length,
    untaken: alerts.filter(({ takenAt }) => takenAt === null).length,
    longest: alerts.slice(0, longestNamed).map((alert) => ({
      id: alert.id,
      subject: alert.subject,
      text: alert.text,
      raisedAt: formatInstant(alert.raisedAt),
      isStale: isStale(alert, now),
    })),
  };
}

type Measured = Omit<
  WireAlertQuality,
  keyof AlertQualityQuery | 'asOf' | 'thresholdSeconds' | 'unwatchedTurns' | 'unseenAlerts' | 'standing'
>;

function wireQualityOf(quality: AlertQuality, range: InstantRange): Measured {
  const periodStart = (period: number): Instant => addSeconds(range.from, period * loadPeriodSeconds);
  return {
    ...quality,
    bursts: quality.bursts.map(({ firstPeriod, endPeriod, alerts, isOpen }) => ({
      fromAt: formatInstant(periodStart(firstPeriod)),
      toAt: formatInstant(Math.min(range.to, periodStart(endPeriod))),
      alerts,
      isOpen,
    })),
    sources: {
      ...quality.sources,
      sources: quality.sources.sources.map((source) => ({
        cause: source.cause,
        train: source.train,
        count: source.count,
        share: source.share,
        lastRaisedAt: formatInstant(source.lastRaisedAt),
      })),
    },
  };
}
