import { Button, FormGroup, HTMLSelect, InputGroup } from '@blueprintjs/core';
import { DUTIES, type Duty, type WireDutyShift } from '@stubpost/shared';
import { useState, type FormEvent } from 'react';
import type { RosterDraft, ShiftDraft } from '../model/roster-draft';
import { shiftsOf } from '../model/roster-draft';
import { DUTY_WORDS } from './duty-words';
import styles from './duty.module.css';

interface AddShiftProps {
  people: RosterDraft['people'];
  zone: string;
  today: string;
  onAdd: (shifts: WireDutyShift[]) => void;
}

/** Puts somebody on the roster, on one day or on several in a row. */
export function AddShift({ people, zone, today, onAdd }: AddShiftProps) {
  const [draft, setDraft] = useState<ShiftDraft>({
    personId: '',
    as: 'desk',
    date: today,
    from: '06:00',
    until: '14:00',
    days: '1',
  });
  const [problem, setProblem] = useState<string | null>(null);
  const submit = (event: FormEvent): void => {
    event.preventDefault();
    const shifts = shiftsOf(draft, zone);
    setProblem(typeof shifts === 'string' ? shifts : null);
    if (typeof shifts !== 'string') onAdd(shifts);
  };
  const text = (key: 'date' | 'from' | 'until' | 'days', label: string, type = 'text') => (
    <FormGroup label={label} labelFor={`shift-${key}`}>
      <InputGroup
        id={`shift-${key}`}
        type={type}
        className={styles[key] ?? ''}
        value={draft[key]}
        onValueChange={(value) => setDraft({ ...draft, [key]: value })}
      />
    </FormGroup>
  );
  return (
    <form onSubmit={submit} noValidate aria-label="Put somebody on the roster">
      {problem !== null && (
        <p className="sp-problems" role="alert">
          {problem}
        </p>
      )}
      <div className="sp-fields">
        <FormGroup label="Who" labelFor="shift-person">
          <HTMLSelect
            id="shift-person"
            value={draft.personId}
            onChange={(event) => setDraft({ ...draft, personId: event.target.value })}
            options={[
              { value: '', label: 'Choose' },
              ...people.map(({ id, name, hasPhone }) => ({
                value: id,
                label: hasPhone ? name : `${name} (no telephone)`,
              })),
            ]}
          />
        </FormGroup>
        <FormGroup label="As" labelFor="shift-as">
          <HTMLSelect
            id="shift-as"
            value={draft.as}
            onChange={(event) => setDraft({ ...draft, as: event.target.value as Duty })}
            options={DUTIES.map((duty) => ({ value: duty, label: DUTY_WORDS[duty] }))}
          />
        </FormGroup>
        {text('date', 'First day', 'date')}
        {text('from', 'From')}
        {text('until', 'Until')}
        {text('days', 'Days in a row')}
        <FormGroup>
          <Button type="submit">Put on</Button>
        </FormGroup>
      </div>
    </form>
  );
}
