import type { WireTurn } from '@stubpost/shared';
import { Link } from 'react-router-dom';
import { StateWord } from '../../../components/flags';
import { usePerson } from '../../../lib/session';
import { asksFrom } from '../model/asks-from';
import { openWords, turnLine } from '../model/turn-line';
import listStyles from './my-turns.module.css';
import styles from './phone-parts.module.css';

/** A turn in a list: when and where, how it stands, which trains, how much is recorded. */
export function TurnItem({ turn, isHere, note }: { turn: WireTurn; isHere: boolean; note?: string }) {
  const line = turnLine(turn);
  const right = note ?? line.progress;
  const asks = asksFrom(turn, usePerson().id).length > 0;
  return (
    <Link
      to={`/my/turn/${turn.id}`}
      className={`${listStyles.item} ${isHere ? listStyles.here : ''}`}
      aria-current={isHere ? 'true' : undefined}
    >
      <span className={listStyles.row}>
        <b>{line.when}</b>
        <Standing turn={turn} isHere={isHere} />
      </span>
      <span className={listStyles.row}>
        <span>{line.trains}</span>
        {right !== '' && <span>{right}</span>}
      </span>
      {asks && (
        <span className={listStyles.row}>
          <b>Asks for your word</b>
        </span>
      )}
    </Link>
  );
}

function Standing({ turn, isHere }: { turn: WireTurn; isHere: boolean }) {
  const open = openWords(turn);
  if (open !== null) return <b className={`flag tight ${styles.flag}`}>{open}</b>;
  if (turn.health === 'short' || turn.health === 'late' || turn.health === 'tight') {
    const word = { tight: 'Tight', short: 'Short', late: 'Late' }[turn.health];
    return <b className={`flag ${turn.health} ${styles.flag}`}>{word}</b>;
  }
  return isHere ? (
    <b>
      <StateWord state={turn.state} />
    </b>
  ) : (
    <StateWord state={turn.state} />
  );
}
