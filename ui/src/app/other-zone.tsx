import type { WireTerminal } from '@stubpost/shared';
import { formatClock, formatZoneLetters } from '../lib/time-display';
import { useNow } from '../lib/use-now';

const ownZone = Intl.DateTimeFormat().resolvedOptions().timeZone;

export interface OtherZoneProps {
  terminal: Pick<WireTerminal, 'name' | 'zone'>;
  /** Zone of the device; its own by default. */
  deviceZone?: string;
}

/** One line for somebody whose device goes by another clock: times are never converted. */
export function OtherZone({ terminal, deviceZone = ownZone }: OtherZoneProps) {
  const now = useNow(60);
  if (formatClock(now, terminal.zone) === formatClock(now, deviceZone)) return null;
  return (
    <span>
      All times are those of {terminal.name} ({formatZoneLetters(now, terminal.zone)}). This device goes by{' '}
      {formatZoneLetters(now, deviceZone)}.
    </span>
  );
}
