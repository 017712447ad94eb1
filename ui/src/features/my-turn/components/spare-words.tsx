import type { WireTurn } from '@stubpost/shared';
import { formatRelative } from '../../../lib/time-display';
import styles from './phone-parts.module.css';

/** Minutes and seconds to spare in words: "3 min to spare", "45 s to spare", "short by 1 min". */
export function spareText(slackSeconds: number): string {
  const length = formatRelative(Math.abs(slackSeconds) * 1000, 0).replace(/^in /, '');
  if (slackSeconds === 0) return 'nothing to spare';
  return slackSeconds > 0 ? `${length} to spare` : `short by ${length}`;
}

/** How a turn stands, in the shape, word and colour of the board; on plan only the words. */
export function SpareWords({ turn }: { turn: WireTurn }) {
  const { health, forecast } = turn;
  const slack = forecast.slackSeconds;
  if (health === 'on-plan') return slack === null ? null : <b>{spareText(slack)}</b>;
  return <b className={`flag ${health} ${styles.flag}`}>{flagText(health, slack)}</b>;
}

function flagText(health: Exclude<WireTurn['health'], 'on-plan'>, slack: number | null): string {
  switch (health) {
    case 'late':
      return 'Late';
    case 'no-word':
      return 'No word';
    case 'tight':
      return slack === null ? 'Tight' : `Tight, ${spareText(slack)}`;
    case 'short':
      return slack === null || slack >= 0 ? 'Short' : spareText(slack).replace('short', 'Short');
  }
}
