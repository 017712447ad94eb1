import { carList } from '../model/act-form';
import { shortCountTitle, type HandbrakeView } from '../model/handbrake-view';
import { OpenSign } from './phone-icons';
import styles from './phone-parts.module.css';

/** Fewer handbrakes released than set: kept, the step stays open, and it is said which car is left. */
export function OpenCount({
  count,
  onTellDesk,
}: {
  count: NonNullable<HandbrakeView['shortCount']>;
  onTellDesk: (words: string) => void;
}) {
  const title = shortCountTitle(count);
  const left = leftWords(count);
  return (
    <>
      <section className={styles.refused} role="status">
        <h2>
          <OpenSign size={26} />
          {title}
        </h2>
        <p>{left} The entry is kept, the step stays open.</p>
      </section>
      <button
        type="button"
        className={`${styles.button} ${styles.wide}`}
        onClick={() => onTellDesk(`${title}. ${left}`)}
      >
        Send to desk
      </button>
    </>
  );
}

function leftWords({ released, set, carsStillSet }: NonNullable<HandbrakeView['shortCount']>): string {
  if (carsStillSet.length > 0)
    return `${carsStillSet.length === 1 ? 'Car' : 'Cars'} ${carList(carsStillSet)} still ${carsStillSet.length === 1 ? 'stands' : 'stand'} as set.`;
  return `${set - released} still ${set - released === 1 ? 'stands' : 'stand'} as set.`;
}
