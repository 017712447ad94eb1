import { Button } from '@blueprintjs/core';
import type { WireLogState } from '@stubpost/shared';
import { ErrorState } from '../../../components/page-states';
import { formatStamp } from '../../../lib/time-display';
import { useCheckAgain } from '../api/log';
import { chainWords, formatCount } from '../model/log-words';
import styles from './check-log.module.css';

function Faults({ chain }: { chain: WireLogState['chain'] }) {
  if (chain.faults.length === 0) return null;
  const more = chain.faultCount - chain.faults.length;
  return (
    <ul className={`sp-problems ${styles.faults}`} aria-label="What is wrong">
      {chain.faults.map(({ words }, index) => (
        <li key={index}>{words}</li>
      ))}
      {more > 0 && <li>and {formatCount(more)} more</li>}
    </ul>
  );
}

/** Whether the chain in the server's own database holds, and the newest head to note down. */
export function LogState({ state, zone }: { state: WireLogState; zone: string }) {
  const again = useCheckAgain();
  const { headline, lines } = chainWords(state, zone);
  const { head } = state;
  return (
    <section className="sp-panel" aria-labelledby="log-state">
      <h2 id="log-state">The log on this server</h2>
      <div role="status" className={styles.state}>
        <p className={styles.headline}>{headline}</p>
        {lines.map((line) => (
          <p key={line}>{line}</p>
        ))}
      </div>
      <Faults chain={state.chain} />
      {head !== null && (
        <dl className={styles.head}>
          <dt>Newest head, {formatStamp(head.receivedAt, zone)}</dt>
          <dd>
            <code>
              {head.hash}@{head.sequence}
            </code>
          </dd>
        </dl>
      )}
      {again.error !== null && <ErrorState error={again.error} />}
      <div className="sp-actions">
        <Button
          onClick={() => again.mutate()}
          disabled={again.isPending || state.chain.runningTo !== null}
          text={state.chain.runningTo === null ? 'Check again' : 'Checking'}
        />
      </div>
      <footer>
        New entries are checked every minute; all of them at each start, every hour and when asked: each seal,
        each link, each column that repeats what is sealed, the published heads, and that no number is given
        out without its entry.
      </footer>
    </section>
  );
}
