import { handbrakesLeft, shortCountTitle, type HandbrakeView } from '../model/handbrake-view';
import { OpenSign } from './phone-icons';
import styles from './phone-parts.module.css';

/** Fewer handbrakes released than set: kept, the step stays open, and it is said which car is left. */
export function OpenCount({
  count,
  onRelease,
  onTellDesk,
}: {
  count: NonNullable<HandbrakeView['shortCount']>;
  /** To the second touch of what is left; absent while what is left is not known by its cars. */
  onRelease?: () => void;
  onTellDesk: (words: string) => void;
}) {
  const title = shortCountTitle(count);
  const left = handbrakesLeft(count);
  return (
    <>
      <section className={styles.refused} role="status">
        <h2>
          <OpenSign size={26} />
          {title}
        </h2>
        <p>{left} The entry is kept, the step stays open.</p>
      </section>
      <div className={styles.pairs}>
        {onRelease !== undefined && (
          <button type="button" className={styles.button} onClick={onRelease}>
            Release it
          </button>
        )}
        <button type="button" className={styles.button} onClick={() => onTellDesk(`${title}. ${left}`)}>
          Send to desk
        </button>
      </div>
    </>
  );
}
