import { FormGroup, InputGroup } from '@blueprintjs/core';
import type { PlanStep } from '@stubpost/shared';
import type { ReactNode } from 'react';
import type { TurnNow } from '../../../lib/turn/turn-now';
import type { ActTarget } from '../model/entry-acts';
import type { DraftFault, DraftField, EntryDraft } from '../model/entry-draft';

/** What every field of a form is drawn from. */
export interface EntryFieldsProps {
  target: ActTarget;
  turn: TurnNow;
  steps: readonly PlanStep[];
  draft: EntryDraft;
  faults: readonly DraftFault[];
  fieldId: (field: string) => string;
  onChange: (part: Partial<EntryDraft>) => void;
}

export interface FieldProps extends EntryFieldsProps {
  field: DraftField;
  label: string;
  hint?: string;
  isFirst?: boolean;
}

/** A field with its label above and its hint, or what is wrong with it, below. */
export function Field({
  field,
  label,
  hint,
  faults,
  fieldId,
  children,
}: FieldProps & { children: ReactNode }) {
  const fault = faults.find((one) => one.field === field);
  return (
    <FormGroup
      label={label}
      labelFor={fieldId(field)}
      helperText={fault?.words ?? hint}
      intent={fault === undefined ? 'none' : 'danger'}
    >
      {children}
    </FormGroup>
  );
}

type TextFieldName = {
  [Name in DraftField]: EntryDraft[Name] extends string
    ? string extends EntryDraft[Name]
      ? Name
      : never
    : never;
}[DraftField];

/** A field that is typed. */
export function TextField(props: FieldProps & { field: TextFieldName; list?: string; isNumber?: boolean }) {
  const { field, draft, faults, fieldId, onChange, isFirst = false, list, isNumber = false } = props;
  return (
    <Field {...props}>
      <InputGroup
        id={fieldId(field)}
        value={draft[field]}
        autoFocus={isFirst}
        autoComplete="off"
        aria-invalid={faults.some((fault) => fault.field === field)}
        {...(isNumber ? { inputMode: 'numeric' as const } : {})}
        {...(list === undefined ? {} : { list })}
        onValueChange={(value) => onChange({ [field]: value })}
      />
    </Field>
  );
}
