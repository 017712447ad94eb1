import { withCar, withDigit, emptyForm } from '../model/act-form';
import { recordedHandbrakes, leftWords, type TieUpForm } from '../model/tie-up';
import { CarBoxes } from './car-boxes';
import { NumberPad } from './number-pad';
import styles from './phone-parts.module.css';
import { useTurnScene } from './turn-context';

interface PartProps {
  form: TieUpForm;
  onForm: (form: TieUpForm) => void;
}

/** Handbrakes that stand set on a set that is left: by car, or counted where the cars are not known. */
export function TieUpHandbrakes({ form, onForm }: PartProps) {
  const { turn, steps } = useTurnScene();
  const recorded = recordedHandbrakes(turn, steps);
  const isNone = form.cars?.length === 0 || form.count === 0;
  const sayRecorded = (): void => {
    if (recorded === null) return;
    onForm(
      turn.cars.length > 0 && recorded.cars.length > 0
        ? { ...form, cars: recorded.cars }
        : { ...form, count: recorded.count },
    );
  };
  return (
    <section className={styles.next} aria-labelledby="tie-up-handbrakes">
      <h2 id="tie-up-handbrakes" className={styles.part}>
        Handbrakes left set
      </h2>
      <p>{recorded === null ? 'None on record.' : `On record: ${leftWords(recorded)}.`}</p>
      {turn.cars.length > 0 ? <Cars form={form} onForm={onForm} /> : <Count form={form} onForm={onForm} />}
      <div className={styles.pairs}>
        {recorded !== null && (
          <button type="button" className={styles.button} onClick={sayRecorded}>
            As on record
          </button>
        )}
        <button
          type="button"
          className={styles.button}
          aria-pressed={isNone}
          onClick={() => onForm(turn.cars.length > 0 ? { ...form, cars: [] } : { ...form, count: 0 })}
        >
          No handbrake
        </button>
      </div>
    </section>
  );
}

function Cars({ form, onForm }: PartProps) {
  const { turn } = useTurnScene();
  const chosen = form.cars ?? [];
  const touch = (car: string): void => {
    const { cars } = withCar({ ...emptyForm, cars: chosen }, car, turn.cars);
    onForm({ ...form, cars: cars.length === 0 ? null : cars });
  };
  return (
    <CarBoxes
      name={turn.set === null ? 'Cars of the train' : `Cars of set ${turn.set}`}
      boxes={turn.cars.map((car) => {
        const pressed = chosen.includes(car);
        return { car, pressed, word: pressed ? 'set' : '', disabled: false, stillSet: false };
      })}
      onTouch={touch}
    />
  );
}

function Count({ form, onForm }: PartProps) {
  const typed = form.count === null ? '' : String(form.count);
  const asForm = { ...emptyForm, typed: { count: typed } };
  const put = (text: string): void => onForm({ ...form, count: text === '' ? null : Number(text) });
  return (
    <NumberPad
      fields={['count']}
      form={asForm}
      active="count"
      onField={() => undefined}
      onDigit={(digit) => put(withDigit(asForm, 'count', digit).typed.count ?? '')}
      onErase={() => put(typed.slice(0, -1))}
      onNone={() => put('0')}
    />
  );
}
