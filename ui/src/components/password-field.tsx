import { Button, FormGroup, InputGroup } from '@blueprintjs/core';
import { useState } from 'react';

export interface PasswordFieldProps {
  id: string;
  label: string;
  value: string;
  onChange: (value: string) => void;
  /** `new-password` (default) or `current-password`. */
  autoComplete?: 'new-password' | 'current-password';
  /** Under the field: what is asked of the password. */
  hint?: string;
  /** What is wrong with it, in words. */
  problem?: string | undefined;
}

/** A password that can be pasted, filled in by a manager, and looked at. */
export function PasswordField(props: PasswordFieldProps) {
  const { id, label, value, onChange, autoComplete = 'new-password', hint, problem } = props;
  const [isShown, setShown] = useState(false);
  return (
    <FormGroup
      label={label}
      labelFor={id}
      helperText={problem ?? hint}
      intent={problem === undefined ? 'none' : 'danger'}
    >
      <InputGroup
        id={id}
        type={isShown ? 'text' : 'password'}
        autoComplete={autoComplete}
        required
        value={value}
        onValueChange={onChange}
        aria-invalid={problem !== undefined}
        rightElement={
          <Button
            variant="minimal"
            size="small"
            aria-pressed={isShown}
            aria-label={`Show ${label.toLowerCase()}`}
            onClick={() => setShown(!isShown)}
          >
            {isShown ? 'Hide' : 'Show'}
          </Button>
        }
      />
    </FormGroup>
  );
}
