import { formatServiceDate } from '../lib/zone-time';
import { measureOnTime, type Departure, type OnTimeFigures, type OnTimeRule } from './on-time';

/** What on-time figures can be split by. */
export const GROUPINGS = ['none', 'hour', 'weekday', 'date', 'train'] as const;
export type Grouping = (typeof GROUPINGS)[number];

/** On-time figures of one group. */
export interface OnTimeGroup extends OnTimeFigures {
  /** Sorts the groups and names them in links: `17`, `1` (Monday), `2026-03-03`, `1742`. */
  key: string;
  /** For the screen: `17:00`, `Monday`, `Tue 3 Mar`, `1742`. */
  label: string;
}

const weekdays = ['Sunday', 'Monday', 'Tuesday', 'Wednesday', 'Thursday', 'Friday', 'Saturday'];

/** Hours since the service day began, so that 00:30 after midnight stays with its evening as hour 24. */
function serviceHour(departure: Departure, zone: string): number {
  const parts = new Intl.DateTimeFormat('en-CA', {
    timeZone: zone,
    hourCycle: 'h23',
    year: 'numeric',
    month: '2-digit',
    day: '2-digit',
    hour: '2-digit',
  }).formatToParts(departure.scheduledDepartureAt);
  const part = (type: string): string => parts.find((each) => each.type === type)?.value ?? '';
  const date = `${part('year')}-${part('month')}-${part('day')}`;
  const days =
    (Date.parse(`${date}T12:00:00Z`) - Date.parse(`${departure.serviceDate}T12:00:00Z`)) / 86_400_000;
  return Number(part('hour')) + 24 * Math.round(days);
}

function nameOf(departure: Departure, grouping: Grouping, zone: string): { key: string; label: string } {
  switch (grouping) {
    case 'hour': {
      const hour = serviceHour(departure, zone);
      const face = `${String(((hour % 24) + 24) % 24).padStart(2, '0')}:00`;
      return { key: String(hour).padStart(2, '0'), label: hour >= 24 ? `${face} next day` : face };
    }
    case 'weekday': {
      const day = new Date(`${departure.serviceDate}T12:00:00Z`).getUTCDay();
      // Monday first, Sunday last.
      return { key: String(day === 0 ? 7 : day), label: weekdays[day] ?? '' };
    }
    case 'date':
      return { key: departure.serviceDate, label: formatServiceDate(departure.serviceDate) };
    case 'train':
      return { key: departure.train, label: departure.train };
    case 'none':
      return { key: 'all', label: 'All' };
  }
}

/**
 * The figures of each group, sorted by key. Hours are those of the scheduled departure on the terminal's clock;
 * weekdays are those of the service date. `none` gives no groups.
 */
export function groupOnTime(
  departures: readonly Departure[],
  rule: OnTimeRule,
  grouping: Grouping,
  zone: string,
): OnTimeGroup[] {
  if (grouping === 'none') return [];
  const groups = new Map<string, { label: string; departures: Departure[] }>();
  for (const departure of departures) {
    const { key, label } = nameOf(departure, grouping, zone);
    const group = groups.get(key) ?? { label, departures: [] };
    group.departures.push(departure);
    groups.set(key, group);
  }
  return [...groups]
    .sort(([a], [b]) => a.localeCompare(b, 'en', { numeric: true }))
    .map(([key, group]) => ({ key, label: group.label, ...measureOnTime(group.departures, rule) }));
}
