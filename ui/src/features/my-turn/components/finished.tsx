import { Link } from 'react-router-dom';
import { SafetyCaution } from '../../../components/caution';
import { ActLines } from './act-lines';
import type { ActWays } from './act-ways';
import { AskedOfMe } from './asked-of-me';
import styles from './phone-parts.module.css';
import { useTurnScene } from './turn-context';
import { UnsentNotice } from './unsent-notice';
import { nextHeadingId } from './use-places';

/** Nothing is left to record: says why, what else there is to do, and the caution that this is no word about the train. */
export function Finished({ ways }: { ways: ActWays }) {
  const { turn } = useTurnScene();
  const stays = turn.outbound === null && turn.annulled === null;
  return (
    <>
      <UnsentNotice />
      <AskedOfMe ways={ways} />
      <section className={styles.next} aria-label="Next step">
        <h2 id={nextHeadingId} tabIndex={-1}>
          {turn.annulled === null ? 'Nothing left to record' : 'Annulled'}
        </h2>
        {turn.annulled !== null && <p>{turn.annulled.reason}</p>}
        {stays && (
          <Link className={`${styles.button} ${styles.wide}`} to={`/my/tie-up?turn=${turn.id}`}>
            Tie up {turn.set === null ? 'the set' : `set ${turn.set}`}
          </Link>
        )}
      </section>
      <ActLines act={{ kind: 'nothing', why: 'all-recorded' }} ways={ways} />
      <div className={styles.buttons}>
        <button type="button" className={styles.button} onClick={() => ways.onGo({ kind: 'defect' })}>
          Defect
        </button>
        <button type="button" className={styles.button} onClick={() => ways.onGo({ kind: 'note' })}>
          Desk
        </button>
        <button type="button" className={styles.button} onClick={() => ways.onGo({ kind: 'relief' })}>
          Hand over
        </button>
      </div>
      <SafetyCaution />
    </>
  );
}
