import { Button, Dialog, DialogBody, DialogFooter, FormGroup, InputGroup } from '@blueprintjs/core';
import type { WireTerminal, WireTurn } from '@stubpost/shared';
import { useId, useState, type FormEvent } from 'react';
import { FieldSummary } from '../../../components/field-summary';
import { errorText } from '../../../lib/error-texts';
import { formatZoneLetters } from '../../../lib/time-display';
import { readNow } from '../../../lib/use-now';
import { useCreateTurn } from '../api/create-turn';
import { emptyFields, readExtraTurn, type ExtraTurnFields, type FieldFault } from '../model/extra-turn';
import styles from './extra-turn-dialog.module.css';

export interface ExtraTurnDialogProps {
  terminal: WireTerminal;
  isOpen: boolean;
  onClose: () => void;
  onDone: (turn: WireTurn) => void;
}

/** Enters a turn that is in no timetable. */
export function ExtraTurnDialog(props: ExtraTurnDialogProps) {
  return (
    <Dialog
      isOpen={props.isOpen}
      onClose={props.onClose}
      title="Extra turn"
      className={styles.dialog}
      shouldReturnFocusOnClose={false}
      transitionDuration={0}
    >
      <ExtraTurnForm {...props} />
    </Dialog>
  );
}

function ExtraTurnForm({ terminal, onClose, onDone }: ExtraTurnDialogProps) {
  const id = useId();
  const [fields, setFields] = useState(emptyFields);
  const [faults, setFaults] = useState<FieldFault[]>([]);
  const create = useCreateTurn();
  const fieldId = (field: string): string => `${id}-${field}`;

  const submit = (event: FormEvent): void => {
    event.preventDefault();
    const result = readExtraTurn(fields, terminal, readNow());
    setFaults(result.ok ? [] : result.faults);
    if (result.ok) create.mutate(result.request, { onSuccess: onDone });
  };

  const entry = (
    field: keyof ExtraTurnFields,
    label: string,
    extra: { hint?: string; list?: string; first?: boolean },
  ) => {
    const fault = faults.find((one) => one.field === field);
    return (
      <FormGroup
        label={label}
        labelFor={fieldId(field)}
        helperText={fault?.words ?? extra.hint}
        intent={fault === undefined ? 'none' : 'danger'}
      >
        <InputGroup
          id={fieldId(field)}
          value={fields[field]}
          autoFocus={extra.first === true}
          autoComplete="off"
          aria-invalid={fault !== undefined}
          {...(extra.list === undefined ? {} : { list: extra.list })}
          onValueChange={(value) => setFields({ ...fields, [field]: value })}
        />
      </FormGroup>
    );
  };

  return (
    <form onSubmit={submit} noValidate>
      <DialogBody>
        <FieldSummary
          problems={[
            ...faults.map(({ field, words }) => ({ fieldId: fieldId(field), words })),
            ...(create.error === null
              ? []
              : [{ fieldId: fieldId('inboundTrain'), words: errorText(create.error) }]),
          ]}
        />
        <p className="muted small">
          Times on the terminal’s clock, {formatZoneLetters(readNow(), terminal.zone)}. Without an inbound
          train it is a first-out, without an outbound one a tie-up.
        </p>
        <div className={styles.fields}>
          {entry('inboundTrain', 'Inbound train', { first: true })}
          {entry('arrives', 'Arrives', { hint: '17:40' })}
          {entry('outboundTrain', 'Outbound train', {})}
          {entry('leaves', 'Leaves', { hint: '17:52' })}
          {entry('track', 'Track, if known', { list: `${id}-tracks` })}
          {entry('set', 'Set, if known', {})}
        </div>
        <datalist id={`${id}-tracks`}>
          {terminal.tracks.map((track) => (
            <option key={track.label} value={track.label} />
          ))}
        </datalist>
      </DialogBody>
      <DialogFooter
        actions={
          <>
            <Button onClick={onClose}>Cancel</Button>
            <Button type="submit" intent="primary" loading={create.isPending}>
              Add turn
            </Button>
          </>
        }
      />
    </form>
  );
}
