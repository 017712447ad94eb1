import { Button, FormGroup, InputGroup } from '@blueprintjs/core';
import type { WireAlert } from '@stubpost/shared';
import { useId, useState, type FormEvent } from 'react';
import { errorText } from '../../../lib/error-texts';
import { useCloseAlert } from '../api/alert-acts';
import { commonCauses } from '../model/alert-words';
import styles from './alert-forms.module.css';

/** Names the cause of an alert that is over. */
export function CloseForm({ alert, firstId }: { alert: WireAlert; firstId: string }) {
  const id = useId();
  const [cause, setCause] = useState('');
  const [isAsked, setAsked] = useState(false);
  const close = useCloseAlert();
  const isMissing = isAsked && cause.trim() === '';

  const submit = (event: FormEvent): void => {
    event.preventDefault();
    setAsked(true);
    if (cause.trim() !== '') close.mutate({ alert, cause: cause.trim() });
  };

  return (
    <form onSubmit={submit} noValidate>
      <div className={styles.oneField}>
        <FormGroup
          label="Cause"
          labelFor={firstId}
          intent={isMissing ? 'danger' : 'none'}
          helperText={isMissing ? 'Name the cause' : undefined}
        >
          <InputGroup
            id={firstId}
            value={cause}
            onValueChange={setCause}
            list={`${id}-causes`}
            maxLength={300}
            autoComplete="off"
            aria-invalid={isMissing}
          />
        </FormGroup>
        <Button type="submit" loading={close.isPending}>
          Close with this cause
        </Button>
      </div>
      <datalist id={`${id}-causes`}>
        {commonCauses.map((common) => (
          <option key={common} value={common} />
        ))}
      </datalist>
      {close.error !== null && (
        <p className={styles.hint} role="alert">
          {errorText(close.error)}
        </p>
      )}
    </form>
  );
}
