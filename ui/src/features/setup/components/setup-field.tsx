import { FormGroup, HTMLSelect, InputGroup, TextArea, type HTMLInputProps } from '@blueprintjs/core';
import type { ReactNode } from 'react';
import styles from './setup.module.css';

interface FieldProps {
  id: string;
  label: string;
  /** Below the field: what is meant, in which unit. */
  hint?: string;
  /** What is wrong with the field; stands beside it. */
  problem?: string | undefined;
  children: ReactNode;
}

/** Label above, field, hint or what is wrong below. */
export function SetupField({ id, label, hint, problem, children }: FieldProps) {
  return (
    <FormGroup
      label={label}
      labelFor={id}
      helperText={
        <span id={`${id}-help`} className={problem === undefined ? undefined : styles.wrong}>
          {problem ?? hint}
        </span>
      }
    >
      <div className={problem === undefined ? undefined : styles.wrongField}>{children}</div>
    </FormGroup>
  );
}

type TextProps = Omit<FieldProps, 'children'> & {
  value: string;
  onChange: (text: string) => void;
  disabled?: boolean;
  /** Unit behind the field. */
  unit?: string;
} & Pick<HTMLInputProps, 'inputMode' | 'type' | 'maxLength'>;

/** One line of text or one number. */
export function TextField({
  id,
  label,
  hint,
  problem,
  value,
  onChange,
  disabled = false,
  unit,
  inputMode,
  type,
  maxLength,
}: TextProps) {
  return (
    <SetupField id={id} label={label} problem={problem} {...(hint === undefined ? {} : { hint })}>
      <InputGroup
        id={id}
        value={value}
        onValueChange={onChange}
        disabled={disabled}
        autoComplete="off"
        aria-invalid={problem !== undefined}
        aria-describedby={`${id}-help`}
        {...(unit === undefined
          ? {}
          : {
              rightElement: (
                <span className="muted" style={{ padding: '5px 8px' }}>
                  {unit}
                </span>
              ),
            })}
        {...(inputMode === undefined ? {} : { inputMode })}
        {...(type === undefined ? {} : { type })}
        {...(maxLength === undefined ? {} : { maxLength })}
      />
    </SetupField>
  );
}

interface LongTextProps extends Omit<FieldProps, 'children'> {
  value: string;
  onChange: (text: string) => void;
}

/** Several lines of plain text. */
export function LongTextField({ id, label, hint, problem, value, onChange }: LongTextProps) {
  return (
    <SetupField id={id} label={label} problem={problem} {...(hint === undefined ? {} : { hint })}>
      <TextArea
        id={id}
        fill
        rows={5}
        value={value}
        aria-invalid={problem !== undefined}
        aria-describedby={`${id}-help`}
        onChange={(event) => onChange(event.currentTarget.value)}
      />
    </SetupField>
  );
}

interface SelectProps<Value extends string> extends Omit<FieldProps, 'children'> {
  value: Value;
  options: readonly { value: Value; label: string }[];
  onChange: (value: Value) => void;
}

/** One of a closed list. */
export function SelectField<Value extends string>({
  id,
  label,
  hint,
  problem,
  value,
  options,
  onChange,
}: SelectProps<Value>) {
  return (
    <SetupField id={id} label={label} problem={problem} {...(hint === undefined ? {} : { hint })}>
      <HTMLSelect
        id={id}
        fill
        value={value}
        options={[...options]}
        aria-invalid={problem !== undefined}
        aria-describedby={`${id}-help`}
        onChange={(event) => {
          const chosen = options.find((option) => option.value === event.currentTarget.value);
          if (chosen !== undefined) onChange(chosen.value);
        }}
      />
    </SetupField>
  );
}
