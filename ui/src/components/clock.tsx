import { formatClock, formatServiceDate, formatZoneLetters, dateAt } from '../lib/time-display';
import { useNow } from '../lib/use-now';

/** The terminal's clock with its zone, once a second: "17:22:41 EST". */
export function Clock({ zone, className }: { zone: string; className?: string }) {
  const now = useNow();
  return (
    <span className={className}>
      <time dateTime={new Date(now).toISOString()}>{formatClock(now, zone).slice(0, 8)}</time>{' '}
      <span className="zone">{formatZoneLetters(now, zone)}</span>
    </span>
  );
}

/** The calendar day at the terminal: "Tue 3 Mar". */
export function Today({ zone }: { zone: string }) {
  const date = dateAt(useNow(60), zone);
  return <time dateTime={date}>{formatServiceDate(date)}</time>;
}
