import styles from './phone-input.module.css';

export interface CarBox {
  car: string;
  /** Words under the number: "set", "released". */
  word: string;
  pressed: boolean;
  /** A car that cannot be touched: no handbrake of it stands set, or it is released already. */
  disabled: boolean;
  /** Its handbrake still stands set while others are off. */
  stillSet: boolean;
}

/** Cars of the set as boxes to touch, in the order of the set. */
export function CarBoxes({
  name,
  boxes,
  onTouch,
}: {
  name: string;
  boxes: readonly CarBox[];
  onTouch: (car: string) => void;
}) {
  return (
    <ol className={styles.cars} aria-label={name}>
      {boxes.map(({ car, word, pressed, disabled, stillSet }) => (
        <li key={car}>
          <button
            type="button"
            className={`${styles.car} ${stillSet && !pressed ? styles.stillSet : ''}`}
            aria-pressed={pressed}
            disabled={disabled}
            onClick={() => onTouch(car)}
          >
            <b>{car}</b>
            {word !== '' && <span>{word}</span>}
          </button>
        </li>
      ))}
    </ol>
  );
}
