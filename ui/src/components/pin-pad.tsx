import { useId, type Ref } from 'react';
import styles from './pin-pad.module.css';

const DIGITS = ['1', '2', '3', '4', '5', '6', '7', '8', '9'];

/** Keys for a PIN, large enough for a glove. The field beside it shows dots and takes a keyboard just as well. */
export function PinPad({
  value,
  onChange,
  longest,
}: {
  value: string;
  onChange: (value: string) => void;
  longest: number;
}) {
  const add = (digit: string): void => onChange((value + digit).slice(0, longest));
  return (
    <div className={styles.pad} role="group" aria-label="Number pad for the PIN">
      {DIGITS.map((digit) => (
        <button key={digit} type="button" onClick={() => add(digit)}>
          {digit}
        </button>
      ))}
      <button type="button" className={styles.small} onClick={() => onChange('')}>
        Clear
      </button>
      <button type="button" onClick={() => add('0')}>
        0
      </button>
      <button type="button" className={styles.small} onClick={() => onChange(value.slice(0, -1))}>
        Erase
      </button>
    </div>
  );
}

/** A large field with its label above. */
export function BigField({
  label,
  value,
  onChange,
  type = 'text',
  autoComplete,
  inputMode,
  inputRef,
  maxLength,
}: {
  label: string;
  value: string;
  onChange: (value: string) => void;
  type?: 'text' | 'password';
  autoComplete: string;
  inputMode?: 'text' | 'numeric' | 'none';
  inputRef?: Ref<HTMLInputElement>;
  maxLength?: number;
}) {
  const id = useId();
  return (
    <div className={styles.field}>
      <label htmlFor={id}>{label}</label>
      <input
        id={id}
        ref={inputRef}
        type={type}
        required
        value={value}
        maxLength={maxLength}
        autoComplete={autoComplete}
        autoCapitalize="characters"
        spellCheck={false}
        inputMode={inputMode}
        onChange={({ target }) => onChange(target.value)}
      />
    </div>
  );
}
