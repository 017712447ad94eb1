import { Button } from '@blueprintjs/core';
import type { WireAlert } from '@stubpost/shared';
import { PriorityMark } from '../../../components/flags';
import { formatTime, formatTimeWithDay } from '../../../lib/time-display';
import { useTurnAt } from '../../../lib/turn/use-turn-at';
import { useNow } from '../../../lib/use-now';
import { holderWords } from '../model/alert-words';
import styles from './alert-list.module.css';
import { leavesWords, TurnFlag } from './turn-standing';

export interface AlertRowProps {
  alert: WireAlert;
  zone: string;
  me: string;
  mayAct: boolean;
  isPicked: boolean;
  hasTabStop: boolean;
  onPick: () => void;
  onTake: () => void;
  onOpen: () => void;
  onName: () => void;
}

/** One alert: time, where, what is wrong, by when, what to do, who. */
export function AlertRow(props: AlertRowProps) {
  const { alert, zone, isPicked } = props;
  const isOver = alert.state === 'cleared' || alert.state === 'closed';
  const raised = formatTimeWithDay(alert.raisedAt, zone, useNow());
  const { who, small } = holderWords(alert, zone, props.me);
  const looks = [
    alert.state === 'raised' && styles.untaken,
    isOver && styles.over,
    isPicked && styles.picked,
  ];
  return (
    <tr
      className={looks.filter(Boolean).join(' ')}
      data-alert={alert.id}
      tabIndex={props.hasTabStop ? 0 : -1}
      aria-selected={isPicked}
      aria-label={rowWords(alert, raised, who)}
      onClick={props.onPick}
    >
      <td className={styles.first}>
        <PriorityMark priority={alert.priority} over={isOver} />
      </td>
      <td>{raised}</td>
      <td>
        {alert.subject}
        {!isOver && alert.turnId !== null && <Standing turnId={alert.turnId} />}
      </td>
      <th scope="row" className={styles.what}>
        <b>{alert.text}</b>
        {alert.lines.length > 0 && (
          <ul>
            {alert.lines.map((line) => (
              <li key={line}>{line}</li>
            ))}
          </ul>
        )}
      </th>
      <td>
        {isOver ? overWords(alert, zone) : alert.action}
        <small>{alert.state === 'cleared' ? 'one cause to name' : alert.actor}</small>
      </td>
      <td>
        {who === 'nobody' && !isOver ? <b>nobody</b> : who}
        {small !== '' && <small>{small}</small>}
      </td>
      <td className={styles.acts}>
        <RowAct {...props} />
      </td>
    </tr>
  );
}

function Standing({ turnId }: { turnId: string }) {
  const { turn } = useTurnAt(turnId);
  const now = useNow();
  if (turn === undefined) return null;
  return (
    <>
      <br />
      <TurnFlag turn={turn} now={now} />
      <small>{leavesWords(turn, now)}</small>
    </>
  );
}

function overWords(alert: WireAlert, zone: string): string {
  const cleared = alert.clearedAt === null ? '' : `Cleared ${formatTime(alert.clearedAt, zone)}.`;
  return alert.closedCause === null ? cleared : `${cleared} Cause: ${alert.closedCause}.`.trim();
}

function rowWords(alert: WireAlert, raised: string, who: string): string {
  const priority = { 'act-now': 'Act now', 'act-soon': 'Act soon', watch: 'Watch' }[alert.priority];
  const holder = {
    raised: 'nobody has it',
    taken: `taken by ${who}`,
    'set-aside': `set aside ${who}`,
    cleared: 'cleared, waits for a cause',
    closed: 'closed',
  };
  return `${priority}, ${raised}, ${alert.subject}. ${alert.text}. ${alert.action} ${alert.actor}. ${holder[alert.state]}.`;
}

function RowAct({ alert, mayAct, onTake, onOpen, onName }: AlertRowProps) {
  const stop = (act: () => void) => (event: React.MouseEvent) => {
    event.stopPropagation();
    act();
  };
  if (mayAct && alert.state === 'raised') {
    return (
      <Button intent="primary" tabIndex={-1} onClick={stop(onTake)}>
        Take
      </Button>
    );
  }
  if (mayAct && alert.state === 'set-aside') {
    return (
      <Button tabIndex={-1} onClick={stop(onTake)}>
        Bring back
      </Button>
    );
  }
  if (mayAct && alert.state === 'cleared') {
    return (
      <Button tabIndex={-1} onClick={stop(onName)}>
        Name cause
      </Button>
    );
  }
  if (alert.turnId === null) return null;
  return (
    <Button tabIndex={-1} onClick={stop(onOpen)}>
      Open turn
    </Button>
  );
}
