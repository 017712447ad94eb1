import { Link } from 'react-router-dom';
import { ErrorState, LoadingRows } from '../../../components/page-states';
import { formatClock } from '../../../lib/time-display';
import { turnsToTieUp } from '../model/tie-up';
import listStyles from './my-turns.module.css';
import styles from './phone-parts.module.css';
import { useMyTurns } from './use-my-turns';

/** Which set is to be left: those of one's own turns that stand here. */
export function TieUpChoice() {
  const { turns, isLoading, error, retry } = useMyTurns();
  const standing = turnsToTieUp([...turns.mine, ...turns.mineOver]);
  return (
    <div className={styles.main}>
      <div>
        <h1>Tie-up</h1>
        <p>Which set is left?</p>
      </div>
      {standing.length === 0 && isLoading && (
        <LoadingRows what="your sets" rows={2} rowHeight={72} onRetry={retry} />
      )}
      {standing.length === 0 && error !== null && <ErrorState error={error} onRetry={retry} />}
      {standing.length === 0 && !isLoading && error === null && (
        <p>No set of yours stands here. A set is tied up from the turn you have with it.</p>
      )}
      <ol className={listStyles.list} aria-label="Sets that stand here">
        {standing.map((turn) => (
          <li key={turn.id}>
            <Link className={listStyles.item} to={`/my/tie-up?turn=${turn.id}`}>
              <span className={listStyles.row}>
                <b>{turn.set === null ? 'Set not known' : `Set ${turn.set}`}</b>
                <span>{turn.track === null ? 'no track' : `Track ${turn.track}`}</span>
              </span>
              <span className={listStyles.row}>
                <span>
                  {turn.inbound === null ? 'first train out' : `came in as ${turn.inbound.train}`}
                  {turn.inbound === null || turn.inbound.actualArrivalAt === null
                    ? ''
                    : ` at ${formatClock(turn.inbound.actualArrivalAt, turn.zone)}`}
                </span>
                {turn.outbound !== null && <span>leaves as {turn.outbound.train}</span>}
              </span>
            </Link>
          </li>
        ))}
      </ol>
    </div>
  );
}
