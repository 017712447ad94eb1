import { Button } from '@blueprintjs/core';
import type { WireAlert, WireTerminal } from '@stubpost/shared';
import { useQuery } from '@tanstack/react-query';
import { Link } from 'react-router-dom';
import { PriorityMark } from '../../../components/flags';
import { errorText } from '../../../lib/error-texts';
import { useMay, usePerson } from '../../../lib/session';
import { standingAlertsQuery } from '../../../lib/standing-alerts';
import { formatTimeWithDay } from '../../../lib/time-display';
import { useTurnAt } from '../../../lib/turn/use-turn-at';
import { useNow } from '../../../lib/use-now';
import { useTakeAlert } from '../api/alert-acts';
import { stripHolder } from '../model/alert-words';
import { stripOf } from '../model/group-alerts';
import styles from './alert-strip.module.css';
import { leavesAndReady, TurnFlag } from './turn-standing';

export interface AlertStripProps {
  terminal: WireTerminal;
  /** A panel covers the right half: the list of the others and the buttons are not drawn under it. */
  isHalf: boolean;
  onOpen: (turnId: string) => void;
}

const mostOthers = 3;

/** Alerts above the board: the one nobody has gets the room, the others one line each. Its height never changes. */
export function AlertStrip({ terminal, isHalf, onOpen }: AlertStripProps) {
  const { data, isError } = useQuery(standingAlertsQuery(terminal.code));
  const { foremost, others } = stripOf(data ?? []);
  return (
    <section className={styles.strip} aria-label="Open alerts">
      {foremost === null ? (
        <p className={styles.quiet}>{quietWords(data, isError)}</p>
      ) : (
        <Foremost key={foremost.id} alert={foremost} terminal={terminal} isHalf={isHalf} onOpen={onOpen} />
      )}
      {!isHalf && (
        <ul className={styles.others}>
          {others.slice(0, others.length > mostOthers ? mostOthers - 1 : mostOthers).map((alert) => (
            <OtherAlert key={alert.id} alert={alert} zone={terminal.zone} onOpen={onOpen} />
          ))}
          {others.length > mostOthers && (
            <li className={styles.more}>
              <Link to="/alerts">and {others.length - mostOthers + 1} more</Link>
            </li>
          )}
        </ul>
      )}
    </section>
  );
}

function quietWords(alerts: readonly WireAlert[] | undefined, isError: boolean): string {
  if (alerts === undefined) return isError ? 'Alerts cannot be read now.' : 'Loading alerts';
  return alerts.length === 0 ? 'No alert stands.' : 'Every alert has somebody.';
}

function Foremost({ alert, terminal, isHalf, onOpen }: AlertStripProps & { alert: WireAlert }) {
  const now = useNow();
  const { turn } = useTurnAt(alert.turnId);
  const take = useTakeAlert();
  const mayAct = useMay('alerts.act', terminal.code);
  const { turnId } = alert;
  return (
    <div className={styles.foremost} data-priority={alert.priority}>
      <div className={styles.head}>
        <PriorityMark priority={alert.priority} />
        <span>{formatTimeWithDay(alert.raisedAt, terminal.zone, now)}</span>
        <span>{alert.subject}</span>
        {turn !== undefined && <TurnFlag turn={turn} now={now} />}
        {turn !== undefined && <span className={styles.leaves}>{leavesAndReady(turn, now)}</span>}
      </div>
      <p className={styles.what}>{alert.text}</p>
      <p className={styles.action}>
        {take.error === null ? `${alert.action} ` : errorText(take.error)}
        {take.error === null && <span className="muted">{alert.actor}</span>}
      </p>
      {!isHalf && (
        <div className={styles.acts}>
          {turnId !== null && <Button onClick={() => onOpen(turnId)}>Open turn</Button>}
          {mayAct && (
            <Button intent="primary" loading={take.isPending} onClick={() => take.mutate(alert)}>
              Take
            </Button>
          )}
        </div>
      )}
    </div>
  );
}

function OtherAlert({
  alert,
  zone,
  onOpen,
}: {
  alert: WireAlert;
  zone: string;
  onOpen: (turnId: string) => void;
}) {
  const me = usePerson().name;
  const now = useNow();
  const { turnId } = alert;
  const isUntaken = alert.state === 'raised';
  const words = `${alert.subject.replace(', train ', ', ')}. ${alert.text}`;
  return (
    <li className={isUntaken ? styles.untaken : undefined}>
      <PriorityMark priority={alert.priority} />
      <span>{formatTimeWithDay(alert.raisedAt, zone, now)}</span>
      <span className={styles.words}>
        {turnId === null ? (
          words
        ) : (
          <button type="button" onClick={() => onOpen(turnId)} title={words}>
            {words}
          </button>
        )}
      </span>
      <span className={isUntaken ? styles.owed : styles.holder}>{stripHolder(alert, zone, me)}</span>
    </li>
  );
}
