import { Button } from '@blueprintjs/core';
import type { WireAlert } from '@stubpost/shared';
import { PriorityMark } from '../../../components/flags';
import { errorText } from '../../../lib/error-texts';
import { useMay, usePerson } from '../../../lib/session';
import { formatClock } from '../../../lib/time-display';
import type { TurnNow } from '../../../lib/turn/turn-now';
import { isStanding } from '../../../lib/turn/turn-times';
import { useTakeAlert } from '../api/alert-acts';
import { stripHolder } from '../model/alert-words';
import { groupAlerts } from '../model/group-alerts';
import styles from './turn-alert-bar.module.css';

export interface TurnAlertBarProps {
  turn: TurnNow;
  onSetAside: (alert: WireAlert) => void;
}

/** Standing alerts of one turn, one line each, with what can be done about them. */
export function TurnAlertBar({ turn, onSetAside }: TurnAlertBarProps) {
  const standing = groupAlerts(turn.alerts.filter(isStanding)).flatMap((group) => group.alerts);
  if (standing.length === 0) return null;
  return (
    <ul className={styles.bars}>
      {standing.map((alert) => (
        <AlertLine key={alert.id} alert={alert} turn={turn} onSetAside={onSetAside} />
      ))}
    </ul>
  );
}

function AlertLine({ alert, turn, onSetAside }: TurnAlertBarProps & { alert: WireAlert }) {
  const take = useTakeAlert();
  const me = usePerson().name;
  const mayAct = useMay('alerts.act', turn.terminal);
  const isUntaken = alert.state === 'raised';
  const holder = isUntaken ? 'nobody has it' : stripHolder(alert, turn.zone, me);
  return (
    <li className={isUntaken ? styles.untaken : undefined}>
      <PriorityMark priority={alert.priority} />
      <span className={styles.words}>
        <b>{alert.text}.</b> {take.error === null ? alert.action : errorText(take.error)}{' '}
        <span className="muted">
          Raised {formatClock(alert.raisedAt, turn.zone)}, {holder}.
        </span>
      </span>
      {mayAct && (
        <span className={styles.acts}>
          {alert.state !== 'set-aside' && <Button onClick={() => onSetAside(alert)}>Set aside</Button>}
          {alert.state !== 'taken' && (
            <Button
              intent={isUntaken ? 'primary' : 'none'}
              loading={take.isPending}
              onClick={() => take.mutate(alert)}
            >
              {isUntaken ? 'Take' : 'Bring back'}
            </Button>
          )}
        </span>
      )}
    </li>
  );
}
