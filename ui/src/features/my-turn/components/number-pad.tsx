import { useEffect, useRef } from 'react';
import { fieldWords, type ActForm, type NumberField } from '../model/act-form';
import { EraseSign } from './phone-icons';
import styles from './phone-input.module.css';

const digits = ['1', '2', '3', '4', '5', '6', '7', '8', '9'];

export interface NumberPadProps {
  /** Fields to fill, in order. Nothing stands in them at first. */
  fields: readonly NumberField[];
  form: ActForm;
  /** The field the keys write into. */
  active: NumberField;
  onField: (field: NumberField) => void;
  onDigit: (digit: string) => void;
  onErase: () => void;
  onNone: () => void;
}

/** Boxes for what is read off or counted, and keys large enough for gloves. */
export function NumberPad(props: NumberPadProps) {
  const { fields, form, active, onDigit, onErase, onNone } = props;
  const pad = useRef<HTMLDivElement>(null);
  useEffect(() => {
    // On a short phone the lower keys would lie behind the bar.
    pad.current?.scrollIntoView({ block: 'nearest' });
  }, []);
  const noneWord = active === 'count' ? 'No count' : 'No reading';
  return (
    <>
      <div className={styles.readings}>
        {fields.map((field) => (
          <ReadingBox
            key={field}
            field={field}
            form={form}
            isActive={field === active}
            onField={props.onField}
          />
        ))}
      </div>
      <div
        className={styles.pad}
        ref={pad}
        role="group"
        aria-label={`Number pad for ${fieldWords[active].name.toLowerCase()}`}
      >
        {digits.map((digit) => (
          <button key={digit} type="button" className={styles.key} onClick={() => onDigit(digit)}>
            {digit}
          </button>
        ))}
        <button
          type="button"
          className={`${styles.key} ${styles.word}`}
          aria-pressed={form.none.includes(active)}
          onClick={onNone}
        >
          {noneWord}
        </button>
        <button type="button" className={styles.key} onClick={() => onDigit('0')}>
          0
        </button>
        <button type="button" className={styles.key} aria-label="Erase" onClick={onErase}>
          <EraseSign size={32} />
        </button>
      </div>
    </>
  );
}

interface ReadingBoxProps {
  field: NumberField;
  form: ActForm;
  isActive: boolean;
  onField: (field: NumberField) => void;
}

function ReadingBox({ field, form, isActive, onField }: ReadingBoxProps) {
  const { name, unit } = fieldWords[field];
  const value = form.none.includes(field) ? 'none' : (form.typed[field] ?? '');
  return (
    <button type="button" className={styles.reading} aria-pressed={isActive} onClick={() => onField(field)}>
      <span>{name}</span>
      <span className={`${styles.box} ${isActive ? styles.at : ''}`}>
        <b>{value === '' ? <span className="unseen">nothing yet</span> : value}</b> <span>{unit}</span>
      </span>
    </button>
  );
}
