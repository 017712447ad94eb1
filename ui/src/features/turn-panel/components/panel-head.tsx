import { Button } from '@blueprintjs/core';
import { BlueSignalFlag } from '../../../components/flags';
import { TURN_STATE_WORDS } from '../../../components/words';
import { formatLateness, formatRelative } from '../../../lib/time-display';
import { healthFlag } from '../../../lib/turn/health-flag';
import { clockText, timeText } from '../../../lib/turn/time-text';
import type { TurnNow } from '../../../lib/turn/turn-now';
import { arrivalOf, departureOf, isOver } from '../../../lib/turn/turn-times';
import styles from './turn-panel.module.css';

export interface PanelHeadProps {
  turn: TurnNow;
  now: number;
  titleId: string;
  /** Opens the turn as a page of its own; absent where it is one. */
  onFullPage?: (() => void) | undefined;
  onClose: () => void;
}

/** Train, track, how it stands, when it leaves, and who has it. */
export function PanelHead({ turn, now, titleId, onFullPage, onClose }: PanelHeadProps) {
  const health = healthFlag(turn, now);
  return (
    <header className={styles.head}>
      <div className={styles.headRow}>
        <h2 className={styles.train} id={titleId} tabIndex={-1}>
          Train {turn.train}
        </h2>
        <span className={styles.large}>{turn.track === null ? 'No track yet' : `Track ${turn.track}`}</span>
        {health !== null && <span className={`flag ${turn.health} ${styles.flag}`}>{health}</span>}
        {turn.blueSignal !== null && !isOver(turn) && <BlueSignalFlag />}
        <span className={styles.large}>{leavesWords(turn, now)}</span>
        <span className={styles.headActs}>
          {onFullPage !== undefined && <Button onClick={onFullPage}>Full page</Button>}
          <Button onClick={onClose} aria-keyshortcuts="Escape">
            Close
          </Button>
        </span>
      </div>
      <p className={styles.crew}>
        {TURN_STATE_WORDS[turn.state]}.{' '}
        {turn.crew.map((member) => (
          <span key={member.as}>
            <span className="muted">{member.as === 'conductor' ? 'Conductor' : 'Engineer'}</span>{' '}
            {member.name}.{' '}
          </span>
        ))}
        {turn.crew.length === 0 && <span className="muted">No crew recorded. </span>}
        {turn.lastHeardAt !== null && <span>Last heard {clockText(turn.lastHeardAt, turn.zone)}.</span>}
      </p>
    </header>
  );
}

function leavesWords(turn: TurnNow, now: number): string {
  const { zone } = turn;
  if (turn.annulled !== null) return `annulled: ${turn.annulled.reason}`;
  if (turn.departedAt !== null) {
    const late = Math.round((turn.departedAt - (turn.scheduledDepartureAt ?? turn.departedAt)) / 1000);
    return `left ${clockText(turn.departedAt, zone)}, ${formatLateness(late)}`;
  }
  const leaves = departureOf(turn);
  if (leaves === null) {
    const arrives = arrivalOf(turn);
    return turn.arrivedAt !== null || arrives === null
      ? 'ties up here'
      : `arrives ${timeText(arrives, zone)}, ties up`;
  }
  if (leaves <= now) return `was to leave ${timeText(leaves, zone)}`;
  const held = turn.heldUntil !== null && turn.heldUntil === leaves ? 'held to' : 'leaves';
  return `${held} ${timeText(leaves, zone)}, ${formatRelative(leaves, now)}`;
}
