import { shippedHoldTimes, type AlertHoldTimes } from '../lateness/alert-life';
import { shippedLatenessSettings, type LatenessSettings } from '../lateness/settings';
import { formatClock } from '../lib/zone-time';
import type { TerminalThresholds } from './terminals';

type RuleThresholds = Pick<TerminalThresholds, 'runningTestMinutes' | 'noWordMinutes'>;
type HoldThresholds = Pick<TerminalThresholds, 'raiseHoldSeconds' | 'clearHoldSeconds' | 'clearSlackSeconds'>;

/** What `assess` needs, from a terminal's thresholds and its IANA zone; shipped values for the rest. */
export function latenessSettingsOf(thresholds: RuleThresholds, zone: string): LatenessSettings {
  return {
    ...shippedLatenessSettings,
    runningTestSeconds: thresholds.runningTestMinutes * 60,
    noWordSeconds: thresholds.noWordMinutes * 60,
    formatTime: (instant) => formatClock(instant, zone),
    formatExactTime: (instant) => formatClock(instant, zone, { seconds: true }),
  };
}

/** The hold times of a late departure from a terminal's thresholds. */
export function holdTimesOf(thresholds: HoldThresholds): AlertHoldTimes {
  const { raiseHoldSeconds, clearHoldSeconds, clearSlackSeconds } = thresholds;
  return { ...shippedHoldTimes, raiseHoldSeconds, clearHoldSeconds, clearSlackSeconds };
}
