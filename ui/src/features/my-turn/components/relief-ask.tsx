import type { WireTurn } from '@stubpost/shared';
import type { ActWays } from './act-ways';
import styles from './phone-parts.module.css';
import { Standing } from './standing';
import { useTurnScene } from './turn-context';

/** A relief that waits for this person's word: face to face counts once both have said so. */
export function ReliefAsk({
  relief,
  ways,
}: {
  relief: NonNullable<WireTurn['reliefs']>[number];
  ways: ActWays;
}) {
  const { me } = useTurnScene();
  const isIncoming = relief.in?.personId === me.id;
  const other = (isIncoming ? relief.out.name : relief.in?.name) ?? 'somebody';
  return (
    <section className={styles.said} aria-label="Relief">
      <h2>Face to face?</h2>
      <p>
        {isIncoming
          ? `${other} hands over to you as ${relief.as}.`
          : `${other} took over from you as ${relief.as}.`}{' '}
        It counts as face to face once both have said so.
      </p>
      {isIncoming && <Standing />}
      <div className={styles.choices}>
        <button
          type="button"
          className={`${styles.button} ${styles.wide}`}
          onClick={() =>
            ways.onRecord({ kind: 'agreed', target: relief.entryId }, `Face to face with ${other}`, null)
          }
        >
          Yes, face to face
        </button>
        <button
          type="button"
          className={`${styles.button} ${styles.wide}`}
          onClick={() =>
            ways.onRecord(
              { kind: 'disagreed', target: relief.entryId, reason: 'Not face to face' },
              `Not face to face with ${other}`,
              null,
            )
          }
        >
          No, not face to face
        </button>
      </div>
    </section>
  );
}
