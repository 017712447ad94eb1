import {
  comesBackSeconds,
  fleetingSeconds,
  ownLoadGoals,
  publishedAlertTargets,
  type WireAlertQuality,
} from '@stubpost/shared';
import { amount, count, percent } from './quality-words';

/** Where a target comes from. */
export type TargetSource = 'published' | 'ours';

/** One figure beside what it should be. */
export interface Yardstick {
  name: string;
  here: string;
  target: string;
  source: TargetSource;
  /** Null when nothing was counted or the target gives no limit. */
  isMet: boolean | null;
}

const atMost = (value: number | null, limit: number): boolean | null =>
  value === null ? null : value <= limit;
const below = (value: number | null, limit: number): boolean | null =>
  value === null ? null : value < limit;

/** Of fewer periods or alerts nothing is said to be within or outside. Our choice. */
export const fewestForVerdict = 30;

/** What the yardsticks look at. */
export interface MeasuredDesk extends Pick<WireAlertQuality, 'alerts' | 'stale' | 'repeaters'> {
  load: Pick<WireAlertQuality['load'], 'all' | 'peak'>;
  sources: Pick<WireAlertQuality['sources'], 'sourceCount' | 'share'>;
}

/** The figures of a desk beside the published targets and our own, in the order in which they matter. */
export function yardsticksOf(quality: MeasuredDesk): Yardstick[] {
  return [...loadRows(quality), ...sourceRows(quality), ...repeaterRows(quality)];
}

function loadRows({ load: { all, peak } }: MeasuredDesk): Yardstick[] {
  const { meanAcceptable, meanManageable, mostInPeriod, shareInBurst } = publishedAlertTargets;
  const { median, ninetyFifth } = ownLoadGoals;
  const verdict = (periods: number, isMet: boolean | null): boolean | null =>
    periods < fewestForVerdict ? null : isMet;
  return [
    {
      name: 'Half of the 10-minute periods at peak had at most',
      here: amount(peak.median),
      target: `${median}`,
      source: 'ours',
      isMet: verdict(peak.periods, atMost(peak.median, median)),
    },
    {
      name: '95 in 100 of them had at most',
      here: amount(peak.ninetyFifth),
      target: `${ninetyFifth}`,
      source: 'ours',
      isMet: verdict(peak.periods, atMost(peak.ninetyFifth, ninetyFifth)),
    },
    {
      name: 'Mean per 10 minutes at peak',
      here: amount(peak.mean),
      target: `about ${meanAcceptable}, manageable up to ${meanManageable}`,
      source: 'published',
      isMet: verdict(peak.periods, atMost(peak.mean, meanManageable)),
    },
    {
      name: 'Most in any 10 minutes',
      here: all.most === null ? '–' : count(all.most),
      target: `at most ${mostInPeriod}`,
      source: 'published',
      isMet: verdict(all.periods, atMost(all.most, mostInPeriod)),
    },
    {
      name: '10-minute periods in burst',
      here: percent(all.shareInBurst),
      target: `under ${shareInBurst * 100} %`,
      source: 'published',
      isMet: verdict(all.periods, below(all.shareInBurst, shareInBurst)),
    },
  ];
}

function sourceRows({ sources, stale, alerts }: MeasuredDesk): Yardstick[] {
  const { topTenShare, staleHours } = publishedAlertTargets;
  // With ten sources or fewer the ten busiest are all there are: the share says nothing.
  const isMet =
    sources.sourceCount <= 10 || alerts < fewestForVerdict ? null : atMost(sources.share, topTenShare);
  return [
    {
      name: 'Share of the ten busiest sources',
      here: `${percent(sources.share)} of ${count(sources.sourceCount)} sources`,
      target: `1 to ${topTenShare * 100} %`,
      source: 'published',
      isMet,
    },
    {
      name: `Stood for more than ${staleHours} h`,
      here: count(stale),
      target: 'few, and explained',
      source: 'published',
      isMet: stale === 0 ? true : null,
    },
  ];
}

function repeaterRows({ repeaters, alerts }: MeasuredDesk): Yardstick[] {
  const { chatterTimes, chatterSeconds } = publishedAlertTargets;
  const none = (name: string, value: number, source: TargetSource): Yardstick => ({
    name,
    here: count(value),
    target: '0',
    source,
    isMet: alerts === 0 ? null : value === 0,
  });
  return [
    none(
      `Raised ${chatterTimes} times on one turn within ${chatterSeconds} s`,
      repeaters.chattering,
      'published',
    ),
    none(`Came back within ${comesBackSeconds / 60} min of clearing`, repeaters.cameBack, 'ours'),
    none(`Gone within ${fleetingSeconds} s, untaken`, repeaters.fleeting, 'ours'),
  ];
}
