import { Button, FormGroup, HTMLSelect, InputGroup } from '@blueprintjs/core';
import { formatInstant, type WireAlert } from '@stubpost/shared';
import { useId, useState, type FormEvent } from 'react';
import { errorText } from '../../../lib/error-texts';
import { useNow } from '../../../lib/use-now';
import { useSetAlertAside } from '../api/alert-acts';
import { untilChoices } from '../model/alert-words';
import styles from './alert-forms.module.css';

export interface SetAsideFormProps {
  alert: WireAlert;
  zone: string;
  /** Id of the first field, so that a key can put the focus there. */
  firstId?: string;
  onDone?: () => void;
}

/** Until when and why. The alert comes back by itself. */
export function SetAsideForm({ alert, zone, firstId, onDone }: SetAsideFormProps) {
  const id = useId();
  const untilId = firstId ?? `${id}-until`;
  const choices = untilChoices(useNow(60), zone);
  const [place, setPlace] = useState(1);
  const [reason, setReason] = useState('');
  const [isAsked, setAsked] = useState(false);
  const setAside = useSetAlertAside();
  const isMissing = isAsked && reason.trim() === '';

  const submit = (event: FormEvent): void => {
    event.preventDefault();
    setAsked(true);
    const until = choices[place];
    if (reason.trim() === '' || until === undefined) return;
    setAside.mutate(
      { alert, until: formatInstant(until.at), reason: reason.trim() },
      {
        onSuccess: () => {
          setReason('');
          setAsked(false);
          onDone?.();
        },
      },
    );
  };

  return (
    <form onSubmit={submit} noValidate>
      <div className={styles.fields}>
        <FormGroup label="Until" labelFor={untilId}>
          <HTMLSelect
            id={untilId}
            value={place}
            onChange={(event) => setPlace(Number(event.target.value))}
            fill
          >
            {choices.map((choice, index) => (
              <option key={choice.at} value={index}>
                {choice.words}
              </option>
            ))}
          </HTMLSelect>
        </FormGroup>
        <FormGroup
          label="Reason"
          labelFor={`${id}-reason`}
          intent={isMissing ? 'danger' : 'none'}
          helperText={isMissing ? 'Give the reason' : undefined}
        >
          <InputGroup
            id={`${id}-reason`}
            value={reason}
            onValueChange={setReason}
            maxLength={300}
            aria-invalid={isMissing}
          />
        </FormGroup>
        <Button type="submit" loading={setAside.isPending}>
          Set aside
        </Button>
      </div>
      <p className={styles.hint} role={setAside.error === null ? undefined : 'alert'}>
        {setAside.error === null
          ? 'At most 30 min. It comes back by itself, and at once if it grows worse.'
          : errorText(setAside.error)}
      </p>
    </form>
  );
}
