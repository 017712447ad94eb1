import { Button } from '@blueprintjs/core';
import type { WireAlert } from '@stubpost/shared';
import { formatTime } from '../../../lib/time-display';
import { useTurnAt } from '../../../lib/turn/use-turn-at';
import { useNow } from '../../../lib/use-now';
import { alertStory } from '../model/alert-words';
import styles from './alert-side.module.css';
import { CloseForm } from './close-form';
import { SetAsideForm } from './set-aside-form';
import { leavesWords } from './turn-standing';

export interface AlertSideProps {
  alert: WireAlert;
  zone: string;
  me: string;
  mayAct: boolean;
  isTaking: boolean;
  formId: string;
  onTake: () => void;
  onOpen: (turnId: string) => void;
}

/** The picked alert: what happened to it so far, and what can be done. */
export function AlertSide({ alert, zone, me, mayAct, isTaking, formId, onTake, onOpen }: AlertSideProps) {
  const { turnId } = alert;
  const isStanding = alert.state === 'raised' || alert.state === 'taken' || alert.state === 'set-aside';
  return (
    <section>
      <h2>{alert.subject}</h2>
      {turnId !== null && <TurnSentence turnId={turnId} />}
      <ol>
        {alertStory(alert, zone, me).map(({ clock, words }) => (
          <li key={clock + words}>
            <span>{clock}</span>
            <span>{words}</span>
          </li>
        ))}
        {alert.state === 'set-aside' && alert.setAsideUntil !== null && (
          <li className={styles.next}>
            <span>{formatTime(alert.setAsideUntil, zone)}</span>
            <span>comes back; {alert.setAsideReason}</span>
          </li>
        )}
      </ol>
      <div className={styles.acts}>
        {mayAct && isStanding && alert.state !== 'taken' && (
          <Button intent="primary" loading={isTaking} onClick={onTake}>
            {alert.state === 'set-aside' ? 'Bring back and take' : 'Take'}
          </Button>
        )}
        {mayAct && alert.state === 'taken' && alert.takenBy !== me && (
          <Button loading={isTaking} onClick={onTake}>
            Take over
          </Button>
        )}
        {turnId !== null && <Button onClick={() => onOpen(turnId)}>Open turn</Button>}
      </div>
      {mayAct && isStanding && alert.state !== 'set-aside' && (
        <>
          <h3>Set aside</h3>
          <SetAsideForm key={alert.id} alert={alert} zone={zone} firstId={formId} />
        </>
      )}
      {mayAct && alert.state === 'cleared' && (
        <>
          <h3>Name the cause</h3>
          <CloseForm key={alert.id} alert={alert} firstId={formId} />
        </>
      )}
    </section>
  );
}

function TurnSentence({ turnId }: { turnId: string }) {
  const { turn } = useTurnAt(turnId);
  const now = useNow();
  if (turn === undefined) return null;
  const isOpen =
    turn.departedAt === null && turn.annulled === null && turn.readyAt !== null && turn.health !== 'no-word';
  const ready = isOpen && turn.readyAt !== null ? `Ready about ${formatTime(turn.readyAt, turn.zone)}, ` : '';
  const words = leavesWords(turn, now);
  return <p>{ready === '' ? `${words.charAt(0).toUpperCase()}${words.slice(1)}.` : `${ready}${words}.`}</p>;
}
