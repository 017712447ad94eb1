import type { TurnNow } from '../../../lib/turn/turn-now';
import { reportedLines } from '../model/reported-words';
import styles from './turn-panel.module.css';

/** What people reported about the turn beside its steps. Nothing where nothing is. */
export function Reported({ turn }: { turn: TurnNow }) {
  const lines = reportedLines(turn);
  if (lines.length === 0) return null;
  return (
    <section aria-label="Reported">
      <h3 className={styles.heading}>Reported</h3>
      <ul className={styles.findings}>
        {lines.map(({ id, words }) => (
          <li key={id}>{words}</li>
        ))}
      </ul>
    </section>
  );
}
