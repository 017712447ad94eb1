import type { WireComparedTurn, WireTimetableDifference } from '@stubpost/shared';
import { formatDuration, formatTime } from '../../../lib/time-display';
import { formatCount } from '../model/timetable-words';
import styles from './timetables.module.css';

const CHANGE_WORDS = { added: 'added', removed: 'removed', moved: 'moved' } as const;

function turnWords(turn: WireComparedTurn | null, zone: string): string {
  if (turn === null) return '–';
  const arrival = `${turn.inboundTrain} in ${formatTime(turn.arrivalAt, zone)}`;
  const departure = `${turn.outboundTrain} out ${formatTime(turn.departureAt, zone)}`;
  return `${arrival}, ${departure}, ${formatDuration(turn.layoverSeconds)}`;
}

/** Every turn of a date that is not in both timetables alike. */
export function TurnDifferences({ turns, zone }: { turns: WireTimetableDifference['turns']; zone: string }) {
  if (turns.length === 0) return null;
  return (
    <details className={styles.twin}>
      <summary>List all {formatCount(turns.length)}</summary>
      <div className={styles.rows} tabIndex={0} role="group" aria-label="Differing turns, table">
        <table className="sp-table">
          <thead>
            <tr>
              <th scope="col">Terminal</th>
              <th scope="col">Change</th>
              <th scope="col">In the running one</th>
              <th scope="col">In this one</th>
            </tr>
          </thead>
          <tbody>
            {turns.map((turn, index) => (
              <tr key={index}>
                <td>{turn.terminal}</td>
                <td>{CHANGE_WORDS[turn.change]}</td>
                <td>{turnWords(turn.before, zone)}</td>
                <td>{turnWords(turn.after, zone)}</td>
              </tr>
            ))}
          </tbody>
        </table>
      </div>
    </details>
  );
}
