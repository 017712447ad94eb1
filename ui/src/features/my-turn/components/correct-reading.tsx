import { useId } from 'react';
import { fieldWords, withCar, type ActForm, type NumberField } from '../model/act-form';
import { CarBoxes } from './car-boxes';
import styles from './phone-parts.module.css';
import { useTurnScene } from './turn-context';

/** What was read off or counted, as it should be. Nothing stands in it: what is left empty stays as it was. */
export function CorrectReading({
  fields,
  asksCars,
  form,
  onForm,
}: {
  fields: readonly NumberField[];
  asksCars: boolean;
  form: ActForm;
  onForm: (form: ActForm) => void;
}) {
  const { turn } = useTurnScene();
  return (
    <>
      {asksCars && (
        <>
          <p>Cars, if they are wrong</p>
          <CarBoxes
            name="Cars as they should be"
            boxes={turn.cars.map((car) => ({
              car,
              pressed: form.cars.includes(car),
              word: '',
              disabled: false,
              stillSet: false,
            }))}
            onTouch={(car) => onForm(withCar(form, car, turn.cars))}
          />
        </>
      )}
      {fields.map((field) => (
        <NumberInput
          key={field}
          field={field}
          value={form.typed[field] ?? ''}
          onValue={(text) => onForm({ ...form, typed: { ...form.typed, [field]: text } })}
        />
      ))}
    </>
  );
}

function NumberInput({
  field,
  value,
  onValue,
}: {
  field: NumberField;
  value: string;
  onValue: (text: string) => void;
}) {
  const id = useId();
  const { name, unit } = fieldWords[field];
  return (
    <div className={styles.field}>
      <label htmlFor={id}>
        {name}, if it is wrong{unit === '' ? '' : `, in ${unit}`}
      </label>
      <input
        id={id}
        inputMode="numeric"
        autoComplete="off"
        maxLength={4}
        value={value}
        onChange={(event) => onValue(event.target.value.replace(/\D/g, ''))}
      />
    </div>
  );
}
